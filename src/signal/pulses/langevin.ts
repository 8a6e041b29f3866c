/** coth c − 1/c in the complex plane: the logarithmic derivative of sinh(c)/c, which is the spectrum of an exponential pulse. */
import { complexProduct, complexQuotient, type Complex } from '../complex';
import { cosineOfTurns, sineOfTurns } from './sinc';

/** How many levels of the continued fraction are taken for |c| < 1: the first one left out weighs less than 1e−30. */
const levels = 14;

/**
 * coth c − 1/c at c = a + jπx, without the cancellation near 0, where it is c/3.
 *
 * @param a ≥ 0.
 * @param turns x, any real number.
 * Source: Lambert's continued fraction c/(3 + c²/(5 + c²/(7 + …))); NIST DLMF 4.39.1.
 * @example langevin(2.5, 0).re // 0.6135673098
 */
export function langevin(a: number, turns: number): Complex {
  const c = { re: a, im: Math.PI * turns };
  const size = Math.hypot(c.re, c.im);
  if (size < 1) return fraction(c);
  const { re, im } = hyperbolicCotangent(a, turns);
  return { re: re - c.re / size / size, im: im + c.im / size / size };
}

/**
 * coth(a + jπx).
 *
 * @param a > 0.
 * Source: elementary.
 * @example hyperbolicCotangent(1, 0).re // 1.3130352855
 */
export function hyperbolicCotangent(a: number, turns: number): Complex {
  const sine = sineOfTurns(turns);
  const tangent = Math.tanh(a);
  return {
    re: tangent / (tangent * tangent + (sine / Math.cosh(a)) ** 2),
    im: (-sine * cosineOfTurns(turns)) / (Math.sinh(a) ** 2 + sine * sine),
  };
}

function fraction(c: Complex): Complex {
  const square = complexProduct(c, c);
  let below: Complex = { re: 2 * levels + 1, im: 0 };
  for (let odd = 2 * levels - 1; odd >= 3; odd -= 2) {
    const { re, im } = complexQuotient(square, below);
    below = { re: odd + re, im };
  }
  return complexQuotient(c, below);
}
