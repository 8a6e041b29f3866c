/** Which pieces of a converter's grid decimation folds onto a band. */
import type { Enclosure } from '../response';

/**
 * The intervals of 0 … rate/2 that end in a band behind decimation, ascending; each has the band's width.
 *
 * @param lowHz the band's edges at the output, 0 ≤ low ≤ high ≤ rate/2M.
 * @param highHz as above.
 * @param rateHz the converter's rate, > 0.
 * @param by M, a whole number ≥ 1; 1 gives the band itself.
 * Source: common practice.
 * @example gridPieces(1, 2, 40, 4).map(({ low, high }) => low + '-' + high).join(' ') // '1-2 8-9 11-12 18-19'
 */
export function gridPieces(lowHz: number, highHz: number, rateHz: number, by: number): readonly Enclosure[] {
  return Array.from({ length: by }, (_, half) => {
    // Every half of the output's rate holds one piece, by turns upright and mirrored.
    const middle = Math.ceil(half / 2) * (rateHz / by);
    return half % 2 === 0 ? { low: middle + lowHz, high: middle + highHz } : { low: middle - highHz, high: middle - lowHz };
  });
}
