/** Responses made of responses: in series, turned over, and constant. */
import type { Response } from './response';

export function product(responses: readonly Response[]): Response {
  throw new RangeError(`not yet ${String(responses.length)}`);
}
export function inverse(response: Response): Response {
  throw new RangeError(`not yet ${String(response.logGain(0))}`);
}
export function constantResponse(logGain: number): Response {
  throw new RangeError(`not yet ${String(logGain)}`);
}
