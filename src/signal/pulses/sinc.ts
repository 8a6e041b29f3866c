/** The one function that every pulse with real nulls is made of: ln|sinc(x)| and its slope, exact beside the nulls. */

/** A handful of roundings stand between stated values and x: closer to a whole number than this, relatively, is a null. */
const nullSlack = 1e-15;

/**
 * ln|sinc(x)|, sinc(x) = sin(πx)/(πx), by the distance to the nearest whole number, so that it is exact beside the nulls.
 *
 * @param x any real number; Infinity gives −Infinity.
 * @param roundedFrom the number whose rounding x carries, where x is a difference of larger ones.
 * Source: its definition; its series near 0.
 * @example Math.exp(logSinc(0.5)) // 0.636619772
 */
export function logSinc(x: number, roundedFrom = x): number {
  const size = Math.abs(x);
  if (size === Infinity) return -Infinity;
  if (size < 1e-3) {
    // ln sinc = −(πx)²/6 − (πx)⁴/180 − …; the next term is below 1e−19 here.
    const square = (Math.PI * size) ** 2;
    return -square * (1 / 6 + square * (1 / 180 + square / 2835));
  }
  const nearest = Math.round(size);
  const distance = Math.abs(size - nearest);
  if (nearest > 0 && distance <= nullSlack * Math.abs(roundedFrom)) return -Infinity;
  return Math.log(Math.sin(Math.PI * distance) / (Math.PI * size));
}

/**
 * d ln|sinc(x)|/dx = π·cot(πx) − 1/x inside a lobe, which it falls throughout.
 *
 * @param x within the lobe, its ends included; −1 … 1 in lobe 0.
 * @param lobe n ≥ 0: the stretch from n to n + 1.
 * @returns Infinity at a null where the lobe begins, −Infinity at one where it ends.
 * Source: by differentiation.
 * @example sincSlope(0.5, 0) // -2
 */
export function sincSlope(x: number, lobe: number): number {
  if (Math.abs(x) < 1e-3) return -(Math.PI ** 2) * x * (1 / 3 + (Math.PI * x) ** 2 / 45);
  const inLobe = x - lobe;
  if (inLobe <= nullSlack * x && lobe > 0) return Infinity;
  if (1 - inLobe <= nullSlack * x) return -Infinity;
  return Math.PI / Math.tan(Math.PI * inLobe) - 1 / x;
}

/**
 * sin(πx), exact at every whole number however large.
 *
 * @example sineOfTurns(1.5) // -1
 */
export function sineOfTurns(x: number): number {
  const nearest = Math.round(x);
  const size = Math.sin(Math.PI * (x - nearest));
  return nearest % 2 === 0 ? size : -size;
}

/**
 * cos(πx), exact at every half however large.
 *
 * @example cosineOfTurns(3) // -1
 */
export function cosineOfTurns(x: number): number {
  return sineOfTurns(0.5 - (x % 2));
}
