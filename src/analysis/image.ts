/** What a generate channel lets out besides the wanted band: the strongest point of every copy, and the strongest of all to infinity. */
import type { Enclosure } from '../signal/response';
import type { Channel, Limit, WantedBand } from '../spec/channel';
import { onAxis } from './axis';
import { gainWithCornersDb } from './capture-view';
import { channelPath } from './channel-path';
import type { ChannelPath } from './channel-path';
import { copiesOf, leavesAt, reportedFolds } from './copies';
import type { WantedCopy } from './copies';
import { toDb } from './decibels';
import type { ImageFigure, WorstAt } from './figures';
import { strongestOfCopy, strongestOfRun } from './image-search';
import type { ImagePoint, Measure } from './image-search';
import { followsRate } from './pulse';
import { deviation, joinWorst, partsVary, rateLabel, rateRange, varies } from './tolerances';

/** The images of a channel. */
export interface Images {
  /** The strongest of each copy and side, k up to 8. */
  readonly figures: readonly ImageFigure[];
  readonly strongest: ImageFigure | null;
  readonly nominalLevelDb: number | null;
  readonly nominalRelativeDb: number | null;
  readonly evaluations: number;
}

/** Every copy's strongest point, measured as the image limit measures it; by level where there is none. */
export function imagesOf(channel: Channel, path: ChannelPath, limit: Limit | null): Images {
  if (channel.direction !== 'generate') return noImages;
  const measure = measureOf(limit);
  return imagesFrom(
    channel.wanted.flatMap((band) => imagesOfBand(channel, path, band, measure)),
    limit,
  );
}

const noImages: Images = { figures: [], strongest: null, nominalLevelDb: null, nominalRelativeDb: null, evaluations: 0 };

/** How images are measured under a limit. */
export function measureOf(limit: Limit | null): Measure {
  return limit?.unit === 'dBc' ? 'relative' : 'level';
}

/** The images of a channel from those of all its wanted bands. */
export function imagesFrom(found: readonly Image[], limit: Limit | null): Images {
  if (found.length === 0) return noImages;
  const measure = measureOf(limit);
  const key = (one: Image): number => (measure === 'relative' ? one.relativeDb : one.levelDb);
  const nominalKey = (one: Image): number => (measure === 'relative' ? one.nominalRelativeDb : one.nominalLevelDb);
  const figures = strongestOfEach(found, key).map((one) => figureOf(one, limit, key(one)));
  const strongest = found.reduce((best, one) => (key(one) > key(best) ? one : best));
  const nominal = found.reduce((best, one) => (nominalKey(one) > nominalKey(best) ? one : best));
  return {
    figures,
    strongest: figureOf(
      { ...strongest, nominalLevelDb: Math.min(nominal.nominalLevelDb, strongest.levelDb) },
      limit,
      key(strongest),
    ),
    nominalLevelDb: nominal.nominalLevelDb,
    nominalRelativeDb: nominal.nominalRelativeDb,
    evaluations: found.reduce((sum, one) => sum + one.evaluations, 0),
  };
}

/** A copy's strongest point in levels, worst and nominal. */
export interface Image {
  readonly copy: ImagePoint['copy'];
  readonly fromHz: number;
  readonly frequencyHz: number;
  readonly levelDb: number;
  readonly relativeDb: number;
  readonly nominalLevelDb: number;
  readonly nominalRelativeDb: number;
  readonly gapDb: number;
  readonly worstAt: WorstAt | null;
  readonly evaluations: number;
}

function imagesOfBand(channel: Channel, path: ChannelPath, band: WantedBand, measure: Measure): readonly Image[] {
  const range = { low: band.lowHz, high: band.highHz };
  const still = { path, copies: copiesOf(range, path.rateHz) };
  const nominal = pointsOf({ ...still, measure, parts: 'nominal' });
  if (!partsVary(channel)) return nominal.map((point) => imageOf(band, still, point, still, point));
  const worst = assumptions(channel, path, range).map((one) => ({ one, points: pointsOf({ ...one, measure, parts: 'worst' }) }));
  return nominal.flatMap((point, index) =>
    worst.flatMap(({ one, points }) => {
      const moved = points[index];
      return moved === undefined ? [] : [imageOf(band, one, moved, still, point)];
    }),
  );
}

/** A rate, the path at it, and the copies there. */
export interface Assumption {
  readonly path: ChannelPath;
  readonly copies: WantedCopy;
}

/**
 * Where the worst is looked for. A hold that follows the rate is the same at every rate when frequencies are counted in periods, so that
 * one search covers the clock's tolerance; a hold of fixed width is looked at with the clock at nominal and at either end.
 */
export function assumptions(channel: Channel, path: ChannelPath, range: Enclosure): readonly Assumption[] {
  if (followsRate(channel.pulse) || !varies(channel.rate.tolerance)) {
    return [{ path, copies: copiesOf(onAxis(channel, 'periods', range), path.rateHz) }];
  }
  const { low, high } = rateRange(channel.rate);
  return [channel.rate.hz, low, high].map((hz) => {
    const rate = { ...channel.rate, hz, tolerance: { low: 0, high: 0 } };
    return { path: channelPath({ ...channel, rate }), copies: copiesOf(range, hz) };
  });
}

/** The single copies, then the runs; the same order for every assumption. */
function pointsOf(question: Parameters<typeof strongestOfCopy>[0]): readonly ImagePoint[] {
  const single = question.copies.single.map((copy) => strongestOfCopy(question, copy));
  const runs = question.copies.runs.map((run) => strongestOfRun(question, run));
  return [...single, ...runs].filter((point) => point !== null);
}

function imageOf(band: WantedBand, at: Assumption, worst: ImagePoint, still: Assumption, nominal: ImagePoint): Image {
  const { rate } = still.path.channel;
  const levels = levelsOf(band, at, worst);
  const stillLevels = nominal === worst ? levels : levelsOf(band, still, nominal);
  const wantedHz = leavesAt(at.copies.wanted, at.path.rateHz, worst.basebandHz);
  const scale = rateScale(at.path.channel, band, wantedHz);
  const clock = varies(rate.tolerance)
    ? { [rateLabel(rate)]: deviation((scale * at.path.rateHz) / rate.hz, rate.tolerance) }
    : null;
  return {
    copy: worst.copy,
    fromHz: wantedHz * scale,
    frequencyHz: worst.frequencyHz * scale,
    levelDb: levels.levelDb,
    relativeDb: levels.relativeDb,
    nominalLevelDb: Math.min(stillLevels.levelDb, levels.levelDb),
    nominalRelativeDb: Math.min(stillLevels.relativeDb, levels.relativeDb),
    gapDb: worst.gapDb,
    worstAt: joinWorst(worst.worstAt, clock),
    evaluations: worst.evaluations + (nominal === worst ? 0 : nominal.evaluations),
  };
}

/** The level and the level against the same tone's wanted output, with the same parts for both. */
function levelsOf(
  band: WantedBand,
  { path, copies }: Assumption,
  point: ImagePoint,
): { readonly levelDb: number; readonly relativeDb: number } {
  const wantedHz = leavesAt(copies.wanted, path.rateHz, point.basebandHz);
  const gainDb = toDb(point.logGain);
  if (point.measure === 'relative') {
    return { relativeDb: gainDb, levelDb: band.levelDb + gainWithCornersDb(path, point.frequencyHz, point.corners) };
  }
  const wantedDb = gainWithCornersDb(path, wantedHz, point.corners) + toDb(point.gainLog);
  return { levelDb: band.levelDb + gainDb, relativeDb: gainDb - wantedDb };
}

/** The rate, over nominal, at which the wanted frequency that was found lies in its band: nominal where it does. */
export function rateScale(channel: Channel, band: WantedBand, wantedHz: number): number {
  const { low, high } = rateRange(channel.rate);
  const nominal = channel.rate.hz;
  const inside = (scale: number): boolean =>
    band.lowHz * (1 - 1e-12) <= wantedHz * scale && wantedHz * scale <= band.highHz * (1 + 1e-12);
  return [1, low / nominal, high / nominal].find(inside) ?? 1;
}

/** The strongest of each copy and side that is reported, whatever band it copies. */
function strongestOfEach(images: readonly Image[], key: (image: Image) => number): readonly Image[] {
  const best = new Map<string, Image>();
  for (const image of images) {
    if (image.copy.fold > reportedFolds) continue;
    const name = `${String(image.copy.fold)} ${image.copy.side}`;
    const known = best.get(name);
    if (known === undefined || key(image) > key(known)) best.set(name, image);
  }
  return [...best.values()];
}

function figureOf(image: Image, limit: Limit | null, measured: number): ImageFigure {
  return {
    copy: image.copy.fold,
    side: image.copy.fold === 0 ? 'baseband' : image.copy.side,
    from: image.fromHz,
    frequency: image.frequencyHz,
    level: image.levelDb,
    nominal: image.nominalLevelDb,
    relative: image.relativeDb,
    limit: limit?.at ?? null,
    margin: limit === null ? null : limit.at - measured,
    gap: image.gapDb,
    worstAt: image.worstAt,
  };
}
