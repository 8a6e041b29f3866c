/** Where a source lands between 0 and half the rate, and how strongly: at each frequency the strongest of all folds of the source. */
import type { Enclosure, Response } from '../analysis';
import { foldFrequency, gainDb } from '../analysis';
import type { Points } from '../protocol/picture';
import { sampleCurve } from './sample-curve';

/** A source as the sampler sees it. */
export interface Arriving {
  /** Where it may stand, without the wanted bands. */
  readonly ranges: readonly Enclosure[];
  readonly levelDb: number;
  readonly response: Response;
  readonly rateHz: number;
}

/** A landing of one input frequency. */
export interface Landed {
  readonly levelDb: number;
  readonly fromHz: number;
}

/** Folds that are looked at one by one before the rest is taken to be weaker. */
const mostFolds = 4000;

/** The strongest that lands exactly on x; null where nothing does. */
export function landingAt(source: Arriving, x: number): Landed | null {
  let best: Landed | null = null;
  const { rateHz, ranges, response, levelDb } = source;
  const lowest = Math.min(...ranges.map((range) => range.low));
  const highest = Math.max(...ranges.map((range) => range.high));
  const first = Math.max(0, Math.floor(lowest / rateHz));
  for (let fold = first; fold < first + mostFolds && fold * rateHz - x <= highest; fold += 1) {
    if (best !== null && fold > first && levelDb + gainBound(response, Math.max(0, fold * rateHz - x)) <= best.levelDb) break;
    for (const frequencyHz of fold === 0 ? [x] : [fold * rateHz - x, fold * rateHz + x]) {
      if (!ranges.some((range) => range.low <= frequencyHz && frequencyHz <= range.high)) continue;
      const level = levelDb + gainDb(response, frequencyHz);
      if (best === null || level > best.levelDb) best = { levelDb: level, fromHz: frequencyHz };
    }
  }
  return best;
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

function gainBound(response: Response, fromHz: number): number {
  return response.bounds(fromHz, Infinity).high * (20 / Math.LN10);
}
