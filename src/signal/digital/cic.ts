/** Cascaded integrators and combs: a running mean of R·M samples, N times over. */
import { lobedResponse, type Lobes } from '../pulses/lobes';
import { logSinc, sincSlope } from '../pulses/sinc';
import type { Response } from '../response';
import { repeating } from './repeating';

/** Integrators and combs around a change of rate. */
export interface Cic {
  /** N ≥ 1: how many integrators, and how many combs. */
  readonly stages: number;
  /** M ≥ 1: the delay of each comb, in samples of the lower rate. */
  readonly delay: number;
  /** R ≥ 1: the ratio of the rates. */
  readonly by: number;
}

/**
 * The gain |sin(πRMf)/(RM·sin(πf))|^N, f as a share of the higher rate; 1 at 0 Hz.
 *
 * Between two nulls its logarithm is concave, so over an interval ends and peaks give its exact range. The removable points, where both
 * sines vanish, and the nulls, every other multiple of rate/(RM), are exact at every repetition.
 *
 * @param rateHz the higher rate, above 0.
 * @returns ln|H|, −Infinity at the nulls.
 * @throws RangeError where N, R or M is no whole number from 1, or R·M above 10⁹.
 * Source: E. B. Hogenauer, An economical class of digital filters for decimation and interpolation (1981).
 * @example 20 * Math.log10(Math.exp(cicResponse({ stages: 3, delay: 1, by: 8 }, 8).logGain(0.125))) // -0.66274803
 */
export function cicResponse(cic: Cic, rateHz: number): Response {
  const length = lengthOf(cic);
  const lobes = cicLobes(length, cic.stages);
  const overShares = lobedResponse(lobes, length);
  return repeating(
    {
      logGain: (share, roundedFrom) => meanGain(share * length, length, cic.stages, roundedFrom * length),
      bounds: (low, high) => overShares.bounds(low, high),
      slope: (low, high) => overShares.slope(low, high),
    },
    rateHz,
  );
}

/**
 * The delay N·(RM − 1)/2 in samples of the higher rate: the filter is symmetric.
 *
 * Source: as for cicResponse.
 * @example cicDelaySamples({ stages: 4, delay: 1, by: 25 }) // 48
 */
export function cicDelaySamples(cic: Cic): number {
  return (cic.stages * (lengthOf(cic) - 1)) / 2;
}

/**
 * By how many bits its registers must be wider than the words that go in: ceil(N·log2(RM)).
 *
 * Source: as for cicResponse.
 * @example cicGrowthBits({ stages: 4, delay: 1, by: 25 }) // 19
 */
export function cicGrowthBits(cic: Cic): number {
  // Only a power of two gives a whole number, and then exactly; the slack is for its rounding.
  return Math.ceil(cic.stages * Math.log2(lengthOf(cic)) - 1e-9);
}

function lengthOf({ stages, delay, by }: Cic): number {
  for (const count of [stages, delay, by]) {
    if (!(Number.isInteger(count) && count >= 1))
      throw new RangeError(`Stages, delay and ratio of a CIC must be whole numbers from 1, not ${count}.`);
  }
  if (delay * by > 1e9) throw new RangeError(`A CIC of ${delay * by} samples is too long.`);
  return delay * by;
}

/** N·ln|sin(πx)/(K·sin(πx/K))| for 0 ≤ x ≤ K/2, as a ratio of two sincs, of which the lower has no null there. */
function meanGain(x: number, length: number, stages: number, roundedFrom = x): number {
  return stages * (logSinc(x, roundedFrom) - logSinc(x / length));
}

/** Over x = share·K, so that the nulls are the whole numbers. Its peaks fall towards K/2 as those of a sinc do. */
function cicLobes(length: number, stages: number): Lobes {
  const slopeIn = (lobe: number, x: number): number => stages * (sincSlope(x, lobe) - sincSlope(x / length, 0) / length);
  return {
    logGain: (x) => meanGain(x, length, stages),
    lobeAt: Math.floor,
    endOf: (lobe) => lobe + 1,
    peakOf: (lobe) => (lobe === 0 ? 0 : peakBetween(lobe, lobe + 1, (x) => slopeIn(lobe, x))),
    slopeIn,
    envelope: () => 0,
  };
}

/** Where a slope that falls throughout passes 0, by halving. */
function peakBetween(low: number, high: number, slope: (x: number) => number): number {
  let [from, to] = [low, high];
  for (;;) {
    const middle = from + 0.5 * (to - from);
    if (middle <= from || middle >= to) return middle;
    if (slope(middle) > 0) from = middle;
    else to = middle;
  }
}
