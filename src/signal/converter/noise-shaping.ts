/** How a noise-shaping converter colours its rounding noise. */

/**
 * What the density of white noise is multiplied by: |2·sin(πf/rate)|^{2L}.
 *
 * @param frequencyHz f ≥ 0.
 * @param rateHz the modulator's rate, > 0.
 * @param order L ≥ 0; 0 leaves the noise white.
 * @returns a ratio of powers.
 * Source: common practice; |1 − e^{−j2πf/rate}|^{2L}.
 * @example shapingWeight(0.25, 1, 2) // 4
 */
export function shapingWeight(frequencyHz: number, rateHz: number, order: number): number {
  if (!(rateHz > 0 && rateHz < Infinity)) throw new RangeError(`A rate must be above 0 Hz, not ${rateHz}.`);
  return (2 * Math.sin((Math.PI * frequencyHz) / rateHz)) ** (2 * order);
}
