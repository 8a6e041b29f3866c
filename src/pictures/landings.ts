/** Where a source lands between 0 and half the rate, and how strongly: at each frequency the strongest of all folds of the source. */
import type { Enclosure, Response } from '../analysis';
import { foldFrequency } from '../analysis';
import type { Points } from '../protocol/picture';
import { sampleCurve } from './sample-curve';

/** A source as the sampler sees it. */
export interface Arriving {
  /** Where it may stand, without the wanted bands. */
  readonly ranges: readonly Enclosure[];
  readonly levelDb: number;
  /** From the source to the sampler. */
  readonly response: Response;
  readonly rateHz: number;
  /** What comes after the sampler; null in capture, where that is nothing. */
  readonly behind: Behind | null;
}

/** What a copy passes behind the sampler of a relay: its weight and the output filter, in ln. */
export interface Behind {
  /** Of copy k, whose input stands at x − k·rate, where it leaves on x. */
  logAt(copy: number, x: number): number;
  /** What bounds every copy with |k| ≥ first, first ≥ 1. */
  boundAt(first: number, x: number): number;
}

/** The level in dBFS at which a frequency of a source ends up as copy k on x. */
export function levelOnto({ levelDb, response, behind }: Arriving, frequencyHz: number, copy: number, x: number): number {
  const log = response.logGain(frequencyHz) + (behind === null ? 0 : behind.logAt(copy, x));
  return levelDb + log * dbPerNeper;
}

const dbPerNeper = 20 / Math.LN10;

/** A landing of one input frequency. */
export interface Landed {
  readonly levelDb: number;
  readonly fromHz: number;
}

/** Folds that are looked at one by one before the rest is taken to be weaker. */
const mostFolds = 4000;

/** The strongest that lands exactly on x; null where nothing does. */
export function landingAt(source: Arriving, x: number): Landed | null {
  const { rateHz, ranges, response, levelDb, behind } = source;
  let bestLog = -Infinity;
  let fromHz = NaN;
  const look = (frequencyHz: number, copy: number): void => {
    if (!stands(ranges, frequencyHz)) return;
    const logGain = response.logGain(frequencyHz) + (behind === null ? 0 : behind.logAt(copy, x));
    if (logGain > bestLog || Number.isNaN(fromHz)) [bestLog, fromHz] = [logGain, frequencyHz];
  };
  const first = firstFold(source);
  const last = Math.min(first + mostFolds, (highestOf(ranges) + x) / rateHz);
  for (let fold = first; fold <= last; fold += 1) {
    // All that is still to come is weaker: what lies further out is bounded as one interval, now and then.
    if (fold > first && isPowerOfTwo(fold - first) && boundFrom(source, fold, x) <= bestLog) break;
    if (fold > 0) look(fold * rateHz - x, fold);
    look(fold * rateHz + x, -fold);
  }
  return Number.isNaN(fromHz) ? null : { levelDb: levelDb + bestLog * dbPerNeper, fromHz };
}

/** What no frequency from a fold on can pass, in ln. */
function boundFrom({ response, rateHz, behind }: Arriving, fold: number, x: number): number {
  const { high } = response.bounds(fold * rateHz - x, Infinity);
  return high + (behind === null ? 0 : behind.boundAt(fold, x));
}

/** The curves of a source's landings, one for each stretch that it reaches without a gap. */
export function landingCurves(
  source: Arriving,
  view: { readonly through: readonly number[]; readonly floor: number; readonly tolerance: number },
): Points[] {
  const edges = landingEdges(source);
  return edges.slice(1).flatMap((high, index): Points[] => {
    const low = edges[index] ?? 0;
    if (high - low < 1e-9 * source.rateHz || landingAt(source, (low + high) / 2) === null) return [];
    // A hair inside, so that neither end belongs to the neighbour's folds.
    const inset = (high - low) * 1e-9;
    const origins = new Map<number, number>();
    const curve = (x: number): number => {
      const landed = landingAt(source, Math.min(high - inset, Math.max(low + inset, x)));
      origins.set(x, landed?.fromHz ?? x);
      return landed?.levelDb ?? -Infinity;
    };
    const points = sampleCurve(curve, { lowHz: low, highHz: high, ...view });
    return [{ ...points, from: points.x.map((x) => origins.get(x) ?? x) }];
  });
}

/** Where the set of folds that land may change: 0, half the rate, and where the source's own edges land. */
function landingEdges({ ranges, rateHz }: Arriving): number[] {
  const ends = ranges.flatMap((range) => [range.low, range.high]).filter((f) => Number.isFinite(f));
  const landed = ends.map((f) => foldFrequency(f, rateHz).landsHz);
  return [...new Set([0, ...landed, rateHz / 2])].sort((a, b) => a - b);
}

function firstFold({ ranges, rateHz }: Arriving): number {
  return Math.max(0, Math.floor(ranges.reduce((low, range) => Math.min(low, range.low), Infinity) / rateHz));
}

function highestOf(ranges: readonly Enclosure[]): number {
  return ranges.reduce((high, range) => Math.max(high, range.high), 0);
}

function stands(ranges: readonly Enclosure[], frequencyHz: number): boolean {
  for (const range of ranges) if (range.low <= frequencyHz && frequencyHz <= range.high) return true;
  return false;
}

function isPowerOfTwo(count: number): boolean {
  return (count & (count - 1)) === 0;
}
