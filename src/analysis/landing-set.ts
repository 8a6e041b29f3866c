/** From which input frequencies something lands in the protected ranges: a few explicit stretches around the wanted bands and runs of folds to infinity. */
import { foldFrequency } from '../signal/folding';
import type { Enclosure } from '../signal/response';
import { without } from './intervals';
import { appearance } from './wanted';

/** How a channel samples, as far as landings go. */
export interface Sampling {
  /** Low = high for an exact rate. */
  readonly rateHz: Enclosure;
  readonly wanted: readonly Enclosure[];
  /** Ranges after sampling; null: the wanted bands as they appear there, wherever the rate puts them. */
  readonly protect: readonly Enclosure[] | null;
}

/** Every frequency k·rate ± x, x in the bands, k from first to last; the rate ranges over all that is allowed. */
export interface FoldRun {
  readonly bands: readonly Enclosure[];
  readonly firstFold: number;
  readonly lastFold: number;
}

/** The frequencies that land in a protected range; a wanted band itself is not among them. */
export interface LandingSet {
  readonly pieces: readonly Enclosure[];
  readonly runs: readonly FoldRun[];
}

/** How many folds on either side of a wanted band are given as exact stretches, because there its own place matters. */
const nearFolds = 8;

/** A stretch this narrow, relative to its frequency, beside a wanted band is rounding and not a landing. */
const sliver = 1e-9;

/** The landing set of a sampler. */
export function landingSet(sampling: Sampling): LandingSet {
  if (sampling.protect !== null) return protectedSet(sampling, sampling.protect);
  const sets = sampling.wanted.map((band) => ownSet(sampling, band));
  return { pieces: sets.flatMap((set) => set.pieces), runs: sets.flatMap((set) => set.runs) };
}

/** Whether a frequency lands in a protected range at some allowed rate, edges included. */
export function lands(set: LandingSet, rateHz: Enclosure, frequencyHz: number): boolean {
  const tolerance = 1e-12 * frequencyHz;
  return (
    set.pieces.some((piece) => piece.low - tolerance <= frequencyHz && frequencyHz <= piece.high + tolerance) ||
    set.runs.some((run) => run.bands.some((band) => inRun(run, band, rateHz, frequencyHz)))
  );
}

/** Some k with k·low + a ≤ f ≤ k·high + b, or the same of the lower side. */
function inRun(run: FoldRun, band: Enclosure, rateHz: Enclosure, frequencyHz: number): boolean {
  const reaches = (low: number, high: number): boolean => {
    const slack = 1e-12 * (1 + frequencyHz / rateHz.low);
    const first = Math.max(run.firstFold, Math.ceil((frequencyHz - high) / rateHz.high - slack));
    return first <= Math.min(run.lastFold, Math.floor((frequencyHz - low) / rateHz.low + slack));
  };
  return reaches(band.low, band.high) || reaches(-band.high, -band.low);
}

/** Landings in a wanted band where it appears: every copy of that band but itself. */
function ownSet(sampling: Sampling, band: Enclosure): LandingSet {
  const { rateHz } = sampling;
  const nominal = (rateHz.low + rateHz.high) / 2;
  const bands = [appearsWithin(band, rateHz)];
  const middle = foldFrequency((band.low + band.high) / 2, nominal);
  const own = middle.fold;
  if (own === 0 && band.high <= nominal / 2) return { pieces: [], runs: [{ bands, firstFold: 1, lastFold: Infinity }] };
  if (band.high - band.low > nominal / 2) return protectedSet(sampling, bands);
  const first = Math.max(0, own - nearFolds);
  const folds = Array.from({ length: own + nearFolds - first + 1 }, (_, index) => first + index);
  const pieces = folds.flatMap((fold) => copies(band, own, fold, middle.inverted, rateHz));
  const below = first > 0 ? [{ bands, firstFold: 0, lastFold: first - 1 }] : [];
  return { pieces, runs: [...below, { bands, firstFold: own + nearFolds + 1, lastFold: Infinity }] };
}

/**
 * Both copies of a wanted band about k·rate. With f in the band and `own` the multiple it folds about, the copy that runs the
 * same way as the band is f + (k − own)·rate, the other (k + own)·rate − f; so the band's own place is exact at every rate.
 */
function copies(band: Enclosure, own: number, fold: number, inverted: boolean, rateHz: Enclosure): readonly Enclosure[] {
  const shift = fold - own;
  const sum = fold + own;
  const same = {
    low: band.low + Math.min(shift * rateHz.low, shift * rateHz.high),
    high: band.high + Math.max(shift * rateHz.low, shift * rateHz.high),
  };
  const mirrored = { low: sum * rateHz.low - band.high, high: sum * rateHz.high - band.low };
  // About 0 Hz there is an upper side only.
  const sameExists = shift !== 0 && !(fold === 0 && inverted);
  const mirroredExists = !(fold === 0 && !inverted);
  return [...(sameExists ? [same] : []), ...(mirroredExists ? [mirrored] : [])].map(notNegative);
}

/** Landings in stated ranges; a fold that may coincide with a wanted band is given as stretches with the band cut out. */
function protectedSet(sampling: Sampling, protect: readonly Enclosure[]): LandingSet {
  const { rateHz, wanted } = sampling;
  const nominal = (rateHz.low + rateHz.high) / 2;
  const bands = protect
    .map((band) => ({ low: band.low, high: Math.min(band.high, nominal / 2) }))
    .filter((band) => band.low <= band.high);
  const near = wanted.flatMap((band) => {
    const own = foldFrequency((band.low + band.high) / 2, nominal).fold;
    return [own - 1, own, own + 1];
  });
  const folds = [...new Set([0, ...near])].filter((fold) => fold >= 0).sort((a, b) => a - b);
  const holes = wanted.map((band) => ({ low: band.low * (1 - sliver), high: band.high * (1 + sliver) }));
  const pieces = without(
    folds.flatMap((fold) => bands.flatMap((band) => sides(band, fold, rateHz))),
    holes,
  );
  const runs = folds.flatMap((fold, index): readonly FoldRun[] => {
    const next = folds[index + 1] ?? Infinity;
    return next > fold + 1 ? [{ bands, firstFold: fold + 1, lastFold: next - 1 }] : [];
  });
  return { pieces, runs };
}

function sides(band: Enclosure, fold: number, rateHz: Enclosure): readonly Enclosure[] {
  if (fold === 0) return [band];
  return [
    { low: fold * rateHz.low + band.low, high: fold * rateHz.high + band.high },
    { low: fold * rateHz.low - band.high, high: fold * rateHz.high - band.low },
  ];
}

/** Where a band may appear as the rate ranges over what is allowed. */
function appearsWithin(band: Enclosure, rateHz: Enclosure): Enclosure {
  const nominal = (rateHz.low + rateHz.high) / 2;
  const places = [rateHz.low, nominal, rateHz.high].map((rate) => appearance({ lowHz: band.low, highHz: band.high }, rate));
  return {
    low: Math.min(...places.map((place) => place.low)),
    high: Math.min(nominal / 2, Math.max(...places.map((place) => place.high))),
  };
}

function notNegative(piece: Enclosure): Enclosure {
  return { low: Math.max(0, piece.low), high: Math.max(0, piece.high) };
}
