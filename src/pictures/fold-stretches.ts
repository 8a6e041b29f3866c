/** Cuts a source into the stretches that fold onto the protected ranges, each with its strongest level and the part of it that does harm. */
import type { Enclosure } from '../analysis';
import { levelOnto } from './landings';
import type { Arriving } from './landings';

/** A stretch of the input that lands, as a whole, in a protected range. */
export interface FoldStretch {
  readonly lowHz: number;
  readonly highHz: number;
  readonly fold: number;
  /** A lower side lands turned round. */
  readonly inverted: boolean;
  readonly strongestDb: number;
  readonly strongestHz: number;
}

/** How many folds from a source's first one are cut; those beyond are weaker than anything worth a ribbon. */
const mostFolds = 48;

/** The points at which a stretch is looked at; its ends are among them. */
const looks = 64;

/** Every stretch of the first folds, the strongest first. */
export function foldStretches(source: Arriving, protect: readonly Enclosure[]): FoldStretch[] {
  const stretches = source.ranges.flatMap((range) => {
    const first = Math.max(0, Math.floor(range.low / source.rateHz));
    const last = Math.min(first + mostFolds, Math.ceil(range.high / source.rateHz));
    return Array.from({ length: last - first + 1 }, (_, index) => first + index).flatMap((fold) =>
      protect.flatMap((target) => sidesOf(source, fold, target).flatMap((side) => cut(source, side, range))),
    );
  });
  return stretches.sort((a, b) => b.strongestDb - a.strongestDb);
}

/** Where a frequency of a stretch lands. */
export function landsAt({ fold, inverted }: FoldStretch, frequencyHz: number, rateHz: number): number {
  return inverted ? fold * rateHz - frequencyHz : frequencyHz - fold * rateHz;
}

/** The stretch cut where its level crosses the limit: parts above it, which do harm, and parts below. */
export function cutAtLimit(
  source: Arriving,
  stretch: FoldStretch,
  limitDb: number,
): { readonly part: FoldStretch; readonly over: boolean }[] {
  const level = (f: number): number => levelOf(source, stretch, f);
  const points = pointsOf(stretch);
  const cuts = points.slice(1).flatMap((high, index) => {
    const low = points[index] ?? high;
    return level(low) > limitDb !== level(high) > limitDb ? [crossing(level, low, high, limitDb)] : [];
  });
  const ends = [stretch.lowHz, ...cuts, stretch.highHz];
  return ends.slice(1).flatMap((high, index) => {
    const part = strongestIn(source, { ...stretch, lowHz: ends[index] ?? high, highHz: high });
    return part.lowHz < part.highHz ? [{ part, over: level((part.lowHz + part.highHz) / 2) > limitDb }] : [];
  });
}

function sidesOf(
  { rateHz }: Arriving,
  fold: number,
  { low, high }: Enclosure,
): Omit<FoldStretch, 'strongestDb' | 'strongestHz'>[] {
  const upper = { lowHz: fold * rateHz + low, highHz: fold * rateHz + high, fold, inverted: false };
  const lower = { lowHz: fold * rateHz - high, highHz: fold * rateHz - low, fold, inverted: true };
  return fold === 0 ? [upper] : [lower, upper];
}

function cut(source: Arriving, side: Omit<FoldStretch, 'strongestDb' | 'strongestHz'>, range: Enclosure): FoldStretch[] {
  const lowHz = Math.max(side.lowHz, range.low);
  const highHz = Math.min(side.highHz, range.high);
  const touches = lowHz > highHz || (lowHz === highHz && range.low < range.high);
  return touches ? [] : [strongestIn(source, { ...side, lowHz, highHz, strongestDb: 0, strongestHz: lowHz })];
}

function strongestIn(source: Arriving, stretch: FoldStretch): FoldStretch {
  const best = pointsOf(stretch).reduce(
    (best, f) => {
      const level = levelOf(source, stretch, f);
      return level > best.level ? { level, f } : best;
    },
    { level: -Infinity, f: stretch.lowHz },
  );
  return { ...stretch, strongestDb: best.level, strongestHz: best.f };
}

/** The level at which a frequency of a stretch lands: copy −k of an upper side, copy k of a lower one. */
function levelOf(source: Arriving, stretch: Pick<FoldStretch, 'fold' | 'inverted'>, f: number): number {
  const { fold, inverted } = stretch;
  const lands = Math.max(0, inverted ? fold * source.rateHz - f : f - fold * source.rateHz);
  return levelOnto(source, f, inverted ? fold : -fold, lands);
}

function pointsOf({ lowHz, highHz }: FoldStretch): number[] {
  return Array.from({ length: looks + 1 }, (_, index) => lowHz + ((highHz - lowHz) * index) / looks);
}

function crossing(level: (f: number) => number, low: number, high: number, limitDb: number): number {
  let [a, b] = [low, high];
  const above = level(a) > limitDb;
  for (let step = 0; step < 40; step += 1) {
    const middle = (a + b) / 2;
    if (level(middle) > limitDb === above) a = middle;
    else b = middle;
  }
  return (a + b) / 2;
}
