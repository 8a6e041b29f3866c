/** What the gain of given taps is made of: a real amplitude where they are symmetric, else the square of the gain. */
import { TrigonometricSum, type TrigonometricTerm } from './trigonometric-sum';

/** `even`: the same from both ends; `odd`: with the opposite sign. */
export type TapSymmetry = 'even' | 'odd' | 'none';

/** Taps count as symmetric where they agree to this, relative to the largest. */
const symmetrySlack = 1e-12;

/**
 * Whether taps are the same from both ends.
 *
 * @param taps at least one.
 * Source: the definition.
 * @example tapSymmetry([1, 0, -1]) // 'odd'
 */
export function tapSymmetry(taps: readonly number[]): TapSymmetry {
  const slack = symmetrySlack * taps.reduce((most, tap) => Math.max(most, Math.abs(tap)), 0);
  const agree = (sign: 1 | -1): boolean => taps.every((tap, index) => Math.abs(tap - sign * mirror(taps, index)) <= slack);
  if (agree(1)) return 'even';
  return agree(-1) ? 'odd' : 'none';
}

/**
 * The zero-phase amplitude of symmetric taps: H(f) = A(f)·e^{−jπ(n − 1)f}, and j times that where they are odd.
 *
 * @param taps even or odd.
 * Source: any text on linear phase: types I to IV.
 * @example firAmplitude([0.25, 0.5, 0.25]).at(0.25) // 0.5
 */
export function firAmplitude(taps: readonly number[]): TrigonometricSum {
  const centre = (taps.length - 1) / 2;
  const odd = tapSymmetry(taps) === 'odd';
  const terms: TrigonometricTerm[] = [];
  for (let index = 0; index <= centre; index += 1) {
    const order = centre - index;
    const tap = taps[index] ?? 0;
    const both = order === 0 ? tap : tap + (odd ? -1 : 1) * mirror(taps, index);
    terms.push(odd ? { order, cosine: 0, sine: both } : { order, cosine: both, sine: 0 });
  }
  return new TrigonometricSum(terms);
}

/**
 * |H(f)|² of any taps, from their autocorrelation.
 *
 * @param taps at least one.
 * Source: Wiener and Khinchin for finite sequences.
 * @example firPower([1, 0.5]).at(0.5) // 0.25
 */
export function firPower(taps: readonly number[]): TrigonometricSum {
  const terms = taps.map((_, lag): TrigonometricTerm => {
    const sum = taps.slice(lag).reduce((total, tap, index) => total + tap * (taps[index] ?? 0), 0);
    return { order: lag, cosine: lag === 0 ? sum : 2 * sum, sine: 0 };
  });
  return new TrigonometricSum(terms);
}

function mirror(taps: readonly number[], index: number): number {
  return taps[taps.length - 1 - index] ?? 0;
}
