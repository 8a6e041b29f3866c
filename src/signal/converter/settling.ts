/** How long a sampling capacitor needs to follow a step through a resistance. */

/**
 * The time in which a full-scale step settles to a fraction of one converter step: −RC·ln(fraction/2^N).
 *
 * @param timeConstant RC in s, ≥ 0, R the source's and the switch's resistance together.
 * @param fraction what may be left, in steps of the converter, > 0; 0.5 is half a step.
 * @param bits N, ≥ 0.
 * @returns s; 0 where a whole full scale may be left.
 * Source: the step response of one pole, common practice.
 * @example settlingTime(1e-9, 0.5, 16) * 1e9 // 11.78350207
 */
export function settlingTime(timeConstant: number, fraction: number, bits: number): number {
  if (!(fraction > 0)) throw new RangeError(`What may be left of a step must be above 0, not ${fraction}.`);
  return timeConstant * Math.max(0, bits * Math.LN2 - Math.log(fraction));
}
