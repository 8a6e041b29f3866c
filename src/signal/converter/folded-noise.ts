/** White and flicker noise of a source or a stage that sampling folds into a band, over every fold up to infinity. */
import type { Filter } from '../filter';
import { filterResponse } from '../filter';
import { powerCuts, powerFrom, type NoiseBandwidth } from '../noise-bandwidth';
import { integrate, type Integral } from '../quadrature';
import type { Response } from '../response';
import { constantResponse, product } from '../response-algebra';
import { remainingVariation } from './remaining-variation';

/** What the sampler averages over. */
export interface NoiseAperture {
  readonly response: Response;
  /** |A(f)| ≤ ceiling/f at every f; 1/(πw) for a rectangle of width w and gain 1 at 0 Hz. */
  readonly ceilingHz: number;
}

/** Noise on its way to a band of a sampler. */
export interface FoldedNoise {
  /** The path from where the noise enters, filters in series. */
  readonly filters: readonly Filter[];
  readonly aperture: NoiseAperture | null;
  /** f_c ≥ 0 in n²·(1 + f_c/f); 0 for white noise. */
  readonly flickerHz: number;
  /** The band's edges behind the sampler, 0 ≤ low ≤ high ≤ rate/2. */
  readonly lowHz: number;
  readonly highHz: number;
  readonly rateHz: number;
}

/** Folds that are integrated one by one; what is above them is taken together. */
const foldsApart = 512;

/** Where the adaptive quadrature stops, against the value. */
const relative = 1e-10;

/**
 * ∫ (1 + f_c/f)·|H|²·|A|² df over every frequency that ends in the band, all folds. Times a one-sided density n² it is noise power.
 *
 * The first 512 folds are integrated one by one. Of the rest, X to infinity, the band gets its share 2·(high − low)/rate, which is off by
 * no more than 2·(high − low)·V, V the variation that |H|² has left above X: a mean over part of an interval differs from the mean
 * over all of it by no more than what varies there. With an aperture, whose nulls may keep step with the rate, the rest is only known to
 * lie between nothing and its ceiling; the middle is given.
 *
 * @returns Hz with a bound on the error; endless where nothing makes the path fall, or flicker noise is asked for down to 0 Hz.
 * @throws RangeError where the band does not lie within 0 … rate/2.
 * Source: elementary; the quadrature that of `integrate`.
 * @example foldedNoise({ filters: [realPole(1000)], aperture: null, flickerHz: 0, lowHz: 0, highHz: 50, rateHz: 100 }).value // 1570.79633
 */
export function foldedNoise(noise: FoldedNoise): NoiseBandwidth {
  checkBand(noise);
  if (noise.lowHz === noise.highHz) return { kind: 'finite', value: 0, errorBound: 0 };
  if (noise.flickerHz > 0 && noise.lowHz === 0) return { kind: 'endless' };
  const rest = noise.aperture === null ? restOfFilters(noise) : restUnderCeiling(noise, noise.aperture);
  if (rest === null) return { kind: 'endless' };
  return { kind: 'finite', ...sumOf([...apart(noise), rest]) };
}

function checkBand({ lowHz, highHz, rateHz, flickerHz }: FoldedNoise): void {
  if (!(lowHz >= 0 && lowHz <= highHz && highHz <= (rateHz / 2) * (1 + 1e-12) && rateHz < Infinity))
    throw new RangeError(`A band must lie within 0 Hz .. half the rate, not ${lowHz} .. ${highHz}.`);
  if (!(flickerHz >= 0 && flickerHz < Infinity)) throw new RangeError(`A flicker corner must be 0 Hz or more, not ${flickerHz}.`);
}

/** The folds below X = (512 − ½)·rate, each cut where the filters turn sharply. */
function apart(noise: FoldedNoise): readonly Integral[] {
  const { filters, aperture, flickerHz, lowHz, highHz, rateHz } = noise;
  const path = product([...filters.map(filterResponse), aperture?.response ?? constantResponse(0)]);
  const power = (frequencyHz: number): number => (1 + flickerHz / frequencyHz) * Math.exp(2 * path.logGain(frequencyHz));
  const cuts = powerCuts(filters);
  const over = (low: number, high: number): readonly Integral[] => {
    const ends = [low, ...cuts.filter((cut) => cut > low && cut < high), high];
    return ends.slice(1).map((end, index) => integrate(power, ends[index] ?? low, end, relative));
  };
  return Array.from({ length: foldsApart }, (_, fold) => [
    ...over(fold * rateHz + lowHz, fold * rateHz + highHz),
    ...(fold === 0 ? [] : over(fold * rateHz - highHz, fold * rateHz - lowHz)),
  ]).flat();
}

/** The band's share of what the filters let through above X, or null where that has no end. */
function restOfFilters(noise: FoldedNoise): Integral | null {
  const from = (foldsApart - 0.5) * noise.rateHz;
  const white = powerFrom(noise.filters, from);
  if (white.kind === 'endless') return null;
  const width = 2 * (noise.highHz - noise.lowHz);
  const share = width / noise.rateHz;
  // Above X flicker adds between nothing and f_c/X: its half is taken, and its half is the bound.
  const flicker = noise.flickerHz / from;
  const uneven = share < 1 ? width * (1 - share) * remainingVariation(noise.filters, from) : 0;
  return {
    value: share * white.value * (1 + flicker / 2),
    errorBound: (share * white.errorBound + uneven) * (1 + flicker) + share * white.value * (flicker / 2),
  };
}

/** Half of the most that can come from above X through an aperture. */
function restUnderCeiling(noise: FoldedNoise, { response, ceilingHz }: NoiseAperture): Integral | null {
  const from = (foldsApart - 0.5) * noise.rateHz;
  const path = product(noise.filters.map(filterResponse));
  const width = 2 * (noise.highHz - noise.lowHz);
  // Σ 1/f² over what folds into the band is no more than width·Σ 1/((k − ½)·rate)², which is below width/(rate·(X − rate)).
  const byAperture =
    Math.exp(2 * path.bounds(from, Infinity).high) * ceilingHz ** 2 * (width / (noise.rateHz * (from - noise.rateHz)));
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
