/** The few operations on complex numbers that roots of polynomials and transformations of filters need. */
import type { Root } from './sections';

/** A complex number, in whatever unit its user has; a root is one. */
export type Complex = Root;

/**
 * a + b.
 *
 * @example complexSum({ re: 1, im: 2 }, { re: 3, im: 4 }).im // 6
 */
export function complexSum(a: Complex, b: Complex): Complex {
  return { re: a.re + b.re, im: a.im + b.im };
}

/**
 * a − b.
 *
 * @example complexDifference({ re: 1, im: 2 }, { re: 3, im: 4 }).im // -2
 */
export function complexDifference(a: Complex, b: Complex): Complex {
  return { re: a.re - b.re, im: a.im - b.im };
}

/**
 * a·b.
 *
 * @example complexProduct({ re: 1, im: 2 }, { re: 3, im: 4 }).re // -5
 */
export function complexProduct(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

/**
 * a·c for a real c.
 *
 * @example complexScaled({ re: 1, im: 2 }, 3).im // 6
 */
export function complexScaled(a: Complex, c: number): Complex {
  return { re: a.re * c, im: a.im * c };
}

/**
 * a/b for b ≠ 0.
 *
 * @example complexQuotient({ re: -5, im: 10 }, { re: 3, im: 4 }).im // 2
 */
export function complexQuotient(a: Complex, b: Complex): Complex {
  return complexScaled(complexProduct(a, { re: b.re, im: -b.im }), 1 / (b.re * b.re + b.im * b.im));
}

/**
 * The square root with a real part ≥ 0. The smaller of its parts comes from the larger, so that neither loses digits.
 *
 * @example complexRoot({ re: -3, im: 4 }).im // 2
 */
export function complexRoot({ re, im }: Complex): Complex {
  const size = Math.hypot(re, im);
  if (size === 0) return { re: 0, im: 0 };
  const larger = Math.sqrt(0.5 * (size + Math.abs(re)));
  const smaller = Math.abs(im) / (2 * larger);
  const sign = im < 0 ? -1 : 1;
  return re >= 0 ? { re: larger, im: sign * smaller } : { re: smaller, im: sign * larger };
}
