/** The filter that undoes a droop over a band, as far as its taps allow. */
import type { Enclosure } from '../response';
import { equiripple, type Equiripple } from './equiripple';

/**
 * Symmetric taps C that make |C|·|Q| as flat as they allow over bands: the largest |1 − C·Q| is the smallest.
 *
 * @param count odd, from 1.
 * @param bands as shares 0 … 0.5 of the rate, ascending and apart.
 * @param magnitude |Q| by share, above 0 throughout the bands.
 * @returns before its gain at a reference is made 1; its deviation is the relative error behind Q.
 * @throws RangeError for an even number of taps, or where |Q| is nothing.
 * Source: minimax approximation with a weight, as for equiripple.
 * @example inverseHold(3, [{ low: 0, high: 0.4 }], (x) => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x))).taps[1] // 1.14270873
 */
export function inverseHold(count: number, bands: readonly Enclosure[], magnitude: (share: number) => number): Equiripple {
  if (count % 2 !== 1) throw new RangeError(`A filter against the hold must have an odd number of taps, not ${count}.`);
  return equiripple(
    count,
    bands.map(({ low, high }) => ({ low, high, desired: (share: number) => 1 / magnitude(share), weight: magnitude })),
  );
}
