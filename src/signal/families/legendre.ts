/** Legendre (optimum-L) low-pass filters: the steepest edge of all that fall everywhere. */
import { complexProduct, complexScaled, type Complex } from '../complex';
import type { Filter } from '../filter';
import { allPole } from './all-pole';
import { gaussPoints, type GaussPoint } from './legendre-polynomials';
import { checkFamily } from './low-pass';
import { simultaneousRoots } from './simultaneous-roots';

/**
 * A Legendre low-pass filter: |H|² = 1/(1 + L(y)), y = (f/corner)², L(y) = ∫ g over [−1, 2y − 1] divided by ∫ g over [−1, 1]. For an odd
 * order 2k + 1, g = (Σ (2i + 1)·P_i)² over i ≤ k; for an even order 2k + 2, g = (x + 1)·(Σ (2i + 1)·P_i)² over every second i from k down.
 *
 * L comes from Gauss quadrature and L′ from the recurrence of the polynomials: coefficients of order 20 would cancel all digits.
 *
 * @param order whole, ≥ 1; exact to 1e−9 up to 20.
 * @param cornerHz half-power frequency, > 0.
 * @returns gain 1 at 0 Hz; falls everywhere.
 * Source: A. Papoulis, "Optimum filters with monotonic response", Proc. IRE 46 (1958) 606–609; even orders M. Fukada (1959).
 * @example Math.exp(filterResponse(legendre(3, 1000)).logGain(2000)) // 0.081923192
 */
export function legendre(order: number, cornerHz: number): Filter {
  checkFamily(order, cornerHz);
  const points = gaussPoints(Math.ceil(order / 2));
  const whole = integral(order, points, { re: 1, im: 0 }).re;
  const roots = simultaneousRoots(
    (y) => {
      const x = { re: 2 * y.re - 1, im: 2 * y.im };
      const value = complexScaled(integral(order, points, x), 1 / whole);
      return { value: { re: 1 + value.re, im: value.im }, derivative: complexScaled(integrand(order, x), 2 / whole) };
    },
    order,
    { centre: 0.5, radius: 0.8 },
  );
  return allPole(roots, cornerHz);
}

/** ∫ g from −1 to x along the straight line. */
function integral(order: number, points: readonly GaussPoint[], x: Complex): Complex {
  const half = { re: 0.5 * (x.re + 1), im: 0.5 * x.im };
  let re = 0;
  let im = 0;
  for (const { at, weight } of points) {
    const value = integrand(order, { re: -1 + half.re * (1 + at), im: half.im * (1 + at) });
    re += weight * value.re;
    im += weight * value.im;
  }
  return complexProduct({ re, im }, half);
}

/** g, its sum of polynomials made along with their recurrence in plain numbers: a design asks for it some ten thousand times. */
function integrand(order: number, x: Complex): Complex {
  const k = Math.floor((order - 1) / 2);
  const odd = order % 2 === 1;
  let [beforeRe, beforeIm, nowRe, nowIm] = [0, 0, 1, 0];
  let re = 0;
  let im = 0;
  for (let m = 0; m <= k; m += 1) {
    if (odd || (k - m) % 2 === 0) {
      re += (2 * m + 1) * nowRe;
      im += (2 * m + 1) * nowIm;
    }
    const a = (2 * m + 1) / (m + 1);
    const b = m / (m + 1);
    const nextRe = a * (x.re * nowRe - x.im * nowIm) - b * beforeRe;
    const nextIm = a * (x.re * nowIm + x.im * nowRe) - b * beforeIm;
    beforeRe = nowRe;
    beforeIm = nowIm;
    nowRe = nextRe;
    nowIm = nextIm;
  }
  const sum: Complex = { re, im };
  const square = complexProduct(sum, sum);
  return odd ? square : complexProduct(square, { re: x.re + 1, im: x.im });
}
