/** The rectangular pulse: an averaging aperture or a hold, as the magnitude of its spectrum. */
import type { Response } from '../response';

export function rectangleResponse(widthSeconds: number): Response {
  throw new RangeError(`not yet ${String(widthSeconds)}`);
}
