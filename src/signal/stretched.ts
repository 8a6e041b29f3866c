/** A response whose frequency axis may be stretched by any factor of a range, taken at its worst: a corner with a tolerance. */
import type { Enclosure, Response } from './response';

/** Which extreme is wanted. */
export type Sense = 'largest' | 'smallest';

/** The worst of a stretched response at each frequency, and the factor that makes it. */
export interface StretchedResponse extends Response {
  /** The factor on the corner at which the extreme is reached at this frequency. */
  factorAt(frequencyHz: number): number;
}

export function stretched(response: Response, factors: Enclosure, sense: Sense): StretchedResponse {
  throw new RangeError(`not yet ${String(response.logGain(0))} ${String(factors.low)} ${sense}`);
}
export function stretchedRatio(response: Response, referenceHz: number, factors: Enclosure, sense: Sense): StretchedResponse {
  throw new RangeError(`not yet ${String(response.logGain(referenceHz))} ${String(factors.low)} ${sense}`);
}
