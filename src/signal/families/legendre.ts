/** Legendre (optimum-L) low-pass filters: the steepest edge of all that fall everywhere. */
import { complexProduct, complexScaled, complexSum, type Complex } from '../complex';
import type { Filter } from '../filter';
import { allPole } from './all-pole';
import { gaussPoints, legendrePolynomials, type GaussPoint } from './legendre-polynomials';
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
  const sum = points.reduce<Complex>(
    (total, { at, weight }) => {
      const along = { re: -1 + half.re * (1 + at), im: half.im * (1 + at) };
      return complexSum(total, complexScaled(integrand(order, along), weight));
    },
    { re: 0, im: 0 },
  );
  return complexProduct(sum, half);
}

function integrand(order: number, x: Complex): Complex {
  const k = Math.floor((order - 1) / 2);
  const odd = order % 2 === 1;
  let re = 0;
  let im = 0;
  legendrePolynomials(k, x).forEach((polynomial, i) => {
    if (!odd && (k - i) % 2 !== 0) return;
    re += (2 * i + 1) * polynomial.re;
    im += (2 * i + 1) * polynomial.im;
  });
  const sum: Complex = { re, im };
  const square = complexProduct(sum, sum);
  return odd ? square : complexProduct(square, { re: x.re + 1, im: x.im });
}
