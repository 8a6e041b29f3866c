/** The largest gain over a range that may be a single frequency, which needs no search. */
import type { Enclosure, Response } from '../signal/response';
import { largestOverBands } from '../signal/search';

/** ln of the largest gain, where it is reached, and how much work that was; of a thousand harmonics that stand still one point each. */
export function largestIn(
  response: Response,
  range: Enclosure,
): { readonly logGain: number; readonly frequencyHz: number; readonly evaluations: number } {
  if (range.low === range.high) return { logGain: response.logGain(range.low), frequencyHz: range.low, evaluations: 1 };
  return largestOverBands(response, [range]) ?? { logGain: -Infinity, frequencyHz: range.low, evaluations: 0 };
}
