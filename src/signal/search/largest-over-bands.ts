/** The proved largest gain over bands of frequencies. */
import type { Enclosure, Response } from '../response';
import type { Extreme, SearchOptions } from './extreme';

export function largestOverBands(response: Response, bands: readonly Enclosure[], options?: SearchOptions): Extreme | null {
  throw new RangeError(`not yet ${String(response.logGain(0))} ${String(bands.length)} ${String(options?.gapDb)}`);
}
