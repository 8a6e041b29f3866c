/** Noise on the converter's grid as it stands behind decimation, every fold added. */
import { foldFrequency } from '../folding';
import { integrate, type Integral } from '../quadrature';

/** A band behind decimation. */
export interface DecimatedBand {
  /** Edges at the output, 0 ≤ low ≤ high ≤ half the output's rate; where equal, the density there. */
  readonly lowHz: number;
  readonly highHz: number;
  /** The converter's rate, > 0. */
  readonly rateHz: number;
  /** M ≥ 1: how many of its samples become one; of several stages the product. */
  readonly by: number;
}

/** Where the adaptive quadrature stops, against the value. */
const relative = 1e-10;

/**
 * The density behind decimation at one output frequency: the sum over the M frequencies of the grid that fold onto it.
 *
 * @param power the density times |D|² at 0 … rate/2; of several stages the product of their gains, each repeating at its own rate.
 * @param frequencyHz 0 … rate/2M.
 * @param rateHz the converter's rate, > 0.
 * @param by M, a whole number ≥ 1.
 * Source: R. E. Crochiere, L. R. Rabiner, Multirate Digital Signal Processing (1983), ch. 2, from memory.
 * @example decimatedDensity(() => 1, 0.01, 1, 8) // 8
 */
export function decimatedDensity(
  power: (frequencyHz: number) => number,
  frequencyHz: number,
  rateHz: number,
  by: number,
): number {
  if (!(Number.isInteger(by) && by >= 1)) throw new RangeError(`Decimation must be by a whole number from 1, not ${by}.`);
  let sum = 0;
  for (let k = 0; k < by; k += 1) sum += power(foldFrequency(frequencyHz + (k * rateHz) / by, rateHz).landsHz);
  return sum;
}

/**
 * The mean density over a band behind decimation, every fold added, by adaptive quadrature.
 *
 * @param power as of `decimatedDensity`; smooth.
 * @returns in the unit of `power`, with a bound on the error. Times the band's width it is the noise power in it.
 * @throws RangeError where the band is not within 0 … rate/2M.
 * Source: as `decimatedDensity`; the quadrature that of `integrate`.
 * @example meanDecimatedDensity((f) => shapingWeight(f, 8, 1), { lowHz: 0, highHz: 0.5, rateHz: 8, by: 8 }).value // 16
 */
export function meanDecimatedDensity(power: (frequencyHz: number) => number, band: DecimatedBand): Integral {
  const { lowHz, highHz, rateHz, by } = band;
  if (!(lowHz >= 0 && lowHz <= highHz && highHz <= (rateHz / (2 * by)) * (1 + 1e-12)))
    throw new RangeError(`A band must lie within 0 Hz .. half the output's rate, not ${lowHz} .. ${highHz}.`);
  const density = (frequencyHz: number): number => decimatedDensity(power, frequencyHz, rateHz, by);
  if (lowHz === highHz) return { value: density(lowHz), errorBound: 0 };
  const { value, errorBound } = integrate(density, lowHz, highHz, relative);
  return { value: value / (highHz - lowHz), errorBound: errorBound / (highHz - lowHz) };
}
