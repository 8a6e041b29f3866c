/** What ways that differ can leave behind at most, when only the greatest difference between any two of them is known. */

/** The greatest difference between any two ways. */
export interface Spread {
  /** Of the gains, against 1. */
  readonly gain: number;
  readonly skewSeconds: number;
}

/**
 * The worst copy k against half the greatest difference: with q = M/gcd(k, M), 2/(q·sin(π/q)) for even q, 1/(q·sin(π/2q)) for odd q. It is
 * reached where the ways on one side of a line through 0 have the one extreme and those on the other side the other.
 *
 * @param k 1 … M − 1.
 * @param ways M, ≥ 2.
 * @returns at most 1, which is reached at k = M/2.
 * Source: elementary; the largest mean of |cos| over q evenly spaced angles.
 * @example worstCopyShare(1, 3) // 0.666666667
 */
export function worstCopyShare(k: number, ways: number): number {
  if (!(Number.isInteger(k) && Number.isInteger(ways) && k >= 1 && k < ways))
    throw new RangeError(`A copy of ${ways} ways is counted from 1 to ${ways - 1}, not ${k}.`);
  const turns = ways / greatestCommonDivisor(k, ways);
  return turns % 2 === 0 ? 2 / (turns * Math.sin(Math.PI / turns)) : 1 / (turns * Math.sin(Math.PI / (2 * turns)));
}

/**
 * The most that copy k of a tone can be, as a share of the tone: from gains β·g/2, from skews β·π·f·Δ, with β of `worstCopyShare`. In two
 * ways the two stand at right angles and add as powers; in more they are added as amplitudes, which bounds them.
 *
 * @param spread g ≥ 0 and Δ ≥ 0.
 * @param frequencyHz f, the tone's frequency at the input, ≥ 0.
 * @param k 1 … M − 1.
 * @param ways M, ≥ 2.
 * @returns to first order in both: terms of the size of their squares are left out.
 * Source: as `worstCopyShare`; N. Kurosawa et al., IEEE Trans. CAS-I 48 (2001), for how gains and skews add.
 * @example interleaveCopyBound({ gain: 0.004, skewSeconds: 0.002 }, 3001 / 16384, 1, 2) // 0.00230748774
 */
export function interleaveCopyBound(spread: Spread, frequencyHz: number, k: number, ways: number): number {
  const fromGain = 0.5 * spread.gain;
  const fromSkew = Math.PI * frequencyHz * spread.skewSeconds;
  return worstCopyShare(k, ways) * (ways === 2 ? Math.hypot(fromGain, fromSkew) : fromGain + fromSkew);
}

/**
 * The most that the peak of the line at k·rate/M can be, as a share of full scale: β·o/2 at rate/2 and twice that below, where the terms k
 * and M − k are one line.
 *
 * @param spread o, the greatest difference between the offsets of any two ways as a share of full scale, ≥ 0.
 * @param k 1 … floor(M/2).
 * @param ways M, ≥ 2.
 * Source: as `worstCopyShare`.
 * @example offsetLineBound(0.002, 1, 2) // 0.001
 */
export function offsetLineBound(spread: number, k: number, ways: number): number {
  return worstCopyShare(k, ways) * spread * (2 * k === ways ? 0.5 : 1);
}

function greatestCommonDivisor(a: number, b: number): number {
  return b === 0 ? a : greatestCommonDivisor(b, a % b);
}
