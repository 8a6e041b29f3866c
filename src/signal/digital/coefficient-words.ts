/** Taps as words of so many bits hold them. */

/**
 * Taps rounded to the nearest of the numbers that two's-complement words of the given length hold, all with one power of two as their
 * scale, the least at which the largest tap still fits.
 *
 * @param taps finite.
 * @param bits whole, 2 or more.
 * @throws RangeError for fewer bits, or taps that are not finite.
 * Source: common practice, no source.
 * @example coefficientWords([0.3, 0.8], 3).join() // '0.25,0.75'
 */
export function coefficientWords(taps: readonly number[], bits: number): readonly number[] {
  if (!(Number.isInteger(bits) && bits >= 2))
    throw new RangeError(`A coefficient needs a whole number of bits from 2, not ${bits}.`);
  if (!taps.every(Number.isFinite)) throw new RangeError('Taps must be finite numbers.');
  const largest = taps.reduce((most, tap) => Math.max(most, Math.abs(tap)), 0);
  if (largest === 0) return taps;
  // From a scale that is surely too small, upwards.
  let step = Math.max(2 ** (Math.floor(Math.log2(largest)) - bits + 1), Number.MIN_VALUE);
  while (!fit(taps, step, bits)) step *= 2;
  return taps.map((tap) => step * Math.round(tap / step));
}

/** Whether every tap, rounded, is within −2^(bits − 1) … 2^(bits − 1) − 1 steps. */
function fit(taps: readonly number[], step: number, bits: number): boolean {
  const half = 2 ** (bits - 1);
  return taps.every((tap) => Math.round(tap / step) >= -half && Math.round(tap / step) <= half - 1);
}
