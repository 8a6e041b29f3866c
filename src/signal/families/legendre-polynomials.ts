/** Legendre polynomials by their recurrence, and the Gauss quadrature that their roots give. */
import type { Complex } from '../complex';

/**
 * P_0 … P_degree at a complex point: (m + 1)·P_{m+1} = (2m + 1)·x·P_m − m·P_{m−1}.
 *
 * @param degree whole, ≥ 0.
 * Source: A. M. Legendre's polynomials, common practice.
 * @example legendrePolynomials(2, { re: 2, im: 0 })[2].re // 5.5
 */
export function legendrePolynomials(degree: number, x: Complex): readonly Complex[] {
  // In plain numbers: a design asks for these some ten thousand times.
  const all: Complex[] = [{ re: 1, im: 0 }];
  let before: Complex = { re: 0, im: 0 };
  let now: Complex = { re: 1, im: 0 };
  for (let m = 0; m < degree; m += 1) {
    const a = (2 * m + 1) / (m + 1);
    const b = m / (m + 1);
    const next: Complex = {
      re: a * (x.re * now.re - x.im * now.im) - b * before.re,
      im: a * (x.re * now.im + x.im * now.re) - b * before.im,
    };
    all.push(next);
    before = now;
    now = next;
  }
  return all;
}

/** A point of [−1, 1] and how much it counts. */
export interface GaussPoint {
  readonly at: number;
  readonly weight: number;
}

/**
 * Gauss quadrature over [−1, 1], exact for polynomials up to degree 2·count − 1.
 *
 * @param count whole, ≥ 1.
 * Source: C. F. Gauss (1814); the points by Newton's method from their asymptotic places.
 * @example gaussPoints(2)[0].at // 0.577350269
 */
export function gaussPoints(count: number): readonly GaussPoint[] {
  return Array.from({ length: count }, (_, index) => {
    let at = Math.cos((Math.PI * (index + 0.75)) / (count + 0.5));
    for (let step = 0; step < 12; step += 1) {
      const { value, slope } = legendreAt(count, at);
      at -= value / slope;
    }
    return { at, weight: 2 / ((1 - at * at) * legendreAt(count, at).slope ** 2) };
  });
}

function legendreAt(degree: number, x: number): { readonly value: number; readonly slope: number } {
  const all = legendrePolynomials(degree, { re: x, im: 0 });
  const value = all[degree]?.re ?? NaN;
  const before = all[degree - 1]?.re ?? NaN;
  return { value, slope: (degree * (before - x * value)) / (1 - x * x) };
}
