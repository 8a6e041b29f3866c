/** White and flicker noise of a source or a stage that sampling folds into a band, over every fold up to infinity. */
import { filterResponse, type Filter } from '../filter';
import { foldFrequency } from '../folding';
import { powerCuts, powerFrom, type NoiseBandwidth } from '../noise-bandwidth';
import { integrate, type Integral } from '../quadrature';
import type { Response } from '../response';
import { constantResponse, product } from '../response-algebra';
import { meanDecimatedDensity } from './decimated-noise';
import { gridPieces } from './grid-pieces';
import { remainingVariation } from './remaining-variation';

/** What the sampler averages over. */
export interface NoiseAperture {
  readonly response: Response;
  /** |A(f)| ≤ ceiling/f at every f; 1/(πw) for a rectangle of width w and gain 1 at 0 Hz. */
  readonly ceilingHz: number;
}

/** What stands between the sampler and the output. */
export interface NoiseDecimation {
  /** M ≥ 1; of several stages the product. */
  readonly by: number;
  /** |D|² at 0 … rate/2; of several stages the product, each repeating at its own rate. */
  readonly power: (frequencyHz: number) => number;
}

/** Noise on its way to a band of a sampler. */
export interface FoldedNoise {
  /** The path from where the noise enters, filters in series. */
  readonly filters: readonly Filter[];
  readonly aperture: NoiseAperture | null;
  readonly decimation: NoiseDecimation | null;
  /** f_c ≥ 0 in n²·(1 + f_c/f); 0 for white noise. */
  readonly flickerHz: number;
  /** The band's edges at the output, 0 ≤ low ≤ high ≤ half the output's rate. */
  readonly lowHz: number;
  readonly highHz: number;
  /** The sampler's rate, > 0. */
  readonly rateHz: number;
}

/** Pieces of the axis that are integrated one by one, and folds at least; what is above them is taken together. */
const piecesApart = 512;
const fewestFolds = 32;

/** Where the adaptive quadrature stops, against the value. */
const relative = 1e-10;

/**
 * ∫ (1 + f_c/f)·|H|²·|A|²·|D|² df over every frequency that ends in the band, all folds. Times a one-sided density n² it is noise power.
 *
 * The first folds are integrated one by one. Of the rest, X to infinity, the band gets its share W/rate, W the integral of |D|² over what
 * ends in the band out of one width of the rate; without decimation that is 2·(high − low). It is off by no more than W·V, V the variation
 * that |H|² has left above X: a weighted mean over an interval differs from the plain one by no more than what varies there. With an
 * aperture, whose nulls may keep step with the rate, the rest is only known to lie between nothing and its ceiling; the middle is given.
 *
 * @returns Hz with a bound on the error; endless where nothing makes the path fall, or flicker noise is asked for down to 0 Hz.
 * @throws RangeError where the band does not lie within half the output's rate.
 * Source: elementary; the quadrature that of `integrate`.
 * @example foldedNoise({ filters: [realPole(1000)], aperture: null, decimation: null, flickerHz: 0, lowHz: 0, highHz: 50, rateHz: 100 }).value // 1570.79633
 */
export function foldedNoise(noise: FoldedNoise): NoiseBandwidth {
  checkBand(noise);
  if (noise.lowHz === noise.highHz) return { kind: 'finite', value: 0, errorBound: 0 };
  if (noise.flickerHz > 0 && noise.lowHz === 0) return { kind: 'endless' };
  const rest = noise.aperture === null ? restOfFilters(noise) : restUnderCeiling(noise, noise.aperture);
  if (rest === null) return { kind: 'endless' };
  return { kind: 'finite', ...sumOf([...apart(noise), rest]) };
}

function checkBand({ lowHz, highHz, rateHz, flickerHz, decimation }: FoldedNoise): void {
  const halfHz = rateHz / (2 * (decimation?.by ?? 1));
  if (!(lowHz >= 0 && lowHz <= highHz && highHz <= halfHz * (1 + 1e-12) && rateHz < Infinity))
    throw new RangeError(`A band must lie within 0 Hz .. half the output's rate, not ${lowHz} .. ${highHz}.`);
  if (!(flickerHz >= 0 && flickerHz < Infinity)) throw new RangeError(`A flicker corner must be 0 Hz or more, not ${flickerHz}.`);
}

function foldsApart({ decimation }: FoldedNoise): number {
  return Math.max(fewestFolds, Math.round(piecesApart / (decimation?.by ?? 1)));
}

/** X, half a rate below the first fold that is not taken apart. */
function restFrom(noise: FoldedNoise): number {
  return (foldsApart(noise) - 0.5) * noise.rateHz;
}

/** The folds below X, each cut where the filters turn sharply. */
function apart(noise: FoldedNoise): readonly Integral[] {
  const { filters, lowHz, highHz, rateHz, decimation } = noise;
  const power = powerOf(noise);
  const cuts = powerCuts(filters);
  const over = (low: number, high: number): readonly Integral[] => {
    const ends = [low, ...cuts.filter((cut) => cut > low && cut < high), high];
    return ends.slice(1).map((end, index) => integrate(power, ends[index] ?? low, end, relative));
  };
  const pieces = gridPieces(lowHz, highHz, rateHz, decimation?.by ?? 1);
  return Array.from({ length: foldsApart(noise) }, (_, fold) => fold * rateHz).flatMap((middle) =>
    pieces.flatMap(({ low, high }) => [
      ...over(middle + low, middle + high),
      ...(middle === 0 ? [] : over(middle - high, middle - low)),
    ]),
  );
}

function powerOf({ filters, aperture, flickerHz, rateHz, decimation }: FoldedNoise): (frequencyHz: number) => number {
  const path = product([...filters.map(filterResponse), aperture?.response ?? constantResponse(0)]);
  const analogue = (frequencyHz: number): number => (1 + flickerHz / frequencyHz) * Math.exp(2 * path.logGain(frequencyHz));
  if (decimation === null) return analogue;
  return (frequencyHz) => analogue(frequencyHz) * decimation.power(foldFrequency(frequencyHz, rateHz).landsHz);
}

/** W, in Hz. */
function weightOf({ lowHz, highHz, rateHz, decimation }: FoldedNoise): Integral {
  const width = 2 * (highHz - lowHz);
  if (decimation === null) return { value: width, errorBound: 0 };
  const mean = meanDecimatedDensity(decimation.power, { lowHz, highHz, rateHz, by: decimation.by });
  return { value: width * mean.value, errorBound: width * mean.errorBound };
}

/** The band's share of what the filters let through above X, or null where that has no end. */
function restOfFilters(noise: FoldedNoise): Integral | null {
  const { filters, rateHz, decimation } = noise;
  const from = restFrom(noise);
  const white = powerFrom(filters, from);
  if (white.kind === 'endless') return null;
  const weight = weightOf(noise);
  const share = weight.value / rateHz;
  // Above X flicker adds between nothing and f_c/X: its half is taken, and its half is the bound.
  const flicker = noise.flickerHz / from;
  // A band as wide as the output leaves nothing uneven, unless decimation weighs its parts apart.
  const unevenShare = decimation === null ? Math.max(0, 1 - share) : 1;
  const uneven = weight.value * unevenShare * remainingVariation(filters, from);
  const numeric = share * white.errorBound + (weight.errorBound / rateHz) * white.value;
  return {
    value: share * white.value * (1 + flicker / 2),
    errorBound: (numeric + uneven) * (1 + flicker) + share * white.value * (flicker / 2),
  };
}

/** Half of the most that can come from above X through an aperture. */
function restUnderCeiling(noise: FoldedNoise, { response, ceilingHz }: NoiseAperture): Integral | null {
  const from = restFrom(noise);
  const path = product(noise.filters.map(filterResponse));
  const weight = weightOf(noise);
  // Σ 1/f² over what folds into the band is no more than W·Σ 1/((k − ½)·rate)², which is below W/(rate·(X − rate)).
  const ceiling = ((weight.value + weight.errorBound) * ceilingHz ** 2) / (noise.rateHz * (from - noise.rateHz));
  const byAperture = Math.exp(2 * path.bounds(from, Infinity).high) * ceiling;
  const filters = restOfFilters({ ...noise, flickerHz: 0 });
  const largest = Math.min((ceilingHz / from) ** 2, Math.exp(2 * response.bounds(from, Infinity).high));
  const byFilters = filters === null ? Infinity : largest * (filters.value + filters.errorBound);
  const most = Math.min(byAperture, byFilters) * (1 + noise.flickerHz / from);
  return Number.isFinite(most) ? { value: most / 2, errorBound: most / 2 } : null;
}

function sumOf(parts: readonly Integral[]): Integral {
  return parts.reduce((sum, part) => ({ value: sum.value + part.value, errorBound: sum.errorBound + part.errorBound }), {
    value: 0,
    errorBound: 0,
  });
}
