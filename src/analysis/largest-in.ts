/** The largest gain over a range that may be a single frequency, which needs no search. */
import type { Enclosure, Response } from '../signal/response';
import { largestOverBands } from '../signal/search';

/** The largest gain, where it is reached, and how much work that was. */
export interface Largest {
  readonly logGain: number;
  readonly frequencyHz: number;
  readonly evaluations: number;
}

/**
 * The largest gain over a range; of a thousand harmonics that stand still one point each.
 * @param gapDb how finely it is proved; finely enough for a value of its own unless given
 */
export function largestIn(response: Response, range: Enclosure, gapDb?: number): Largest {
  if (range.low === range.high) return { logGain: response.logGain(range.low), frequencyHz: range.low, evaluations: 1 };
  const options = gapDb === undefined ? {} : { gapDb };
  return largestOverBands(response, [range], options) ?? { logGain: -Infinity, frequencyHz: range.low, evaluations: 0 };
}
