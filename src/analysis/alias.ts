/** The strongest landing of each unwanted source in a protected range, nominally and at the worst of all tolerances. */
import type { Channel, Limit, Source } from '../spec/channel';
import { arrivalDb, arrivalsOf, mayMove, nominalArrivals, standsStill } from './arrivals';
import { captureView, captureViews, gainWithCornersDb } from './capture-view';
import type { CaptureView, View } from './capture-view';
import { sumOfLevels, toDb } from './decibels';
import type { AliasFigure, WorstAt } from './figures';
import { landingPoint } from './landing-point';
import type { LandingPoint } from './landing-point';
import { sourceLandings } from './source-landings';
import type { Landed, SourceLandings } from './source-landings';
import { deviation, joinWorst, rateLabel, toneLabel, varies } from './tolerances';

/** The aliases of a channel. */
export interface Aliases {
  readonly figures: readonly AliasFigure[];
  readonly strongest: AliasFigure | null;
  /** All of them as powers, dBFS; of harmonics and lines all that land. */
  readonly sumDb: number | null;
  /** The same sum as the limit counts it, against the wanted tone for one in dBc, and its largest gap. */
  readonly judgedSum: { readonly valueDb: number; readonly nominalDb: number; readonly gapDb: number } | null;
  /** Nominal value against the wanted tone of the strongest nominal landing, for limits in dBc. */
  readonly nominalRelativeDb: number | null;
  readonly nominalLevelDb: number | null;
  readonly evaluations: number;
}

/** Every source's strongest landing, measured as the alias limit measures it. */
export function aliasesOf(channel: Channel, limit: Limit | null): Aliases {
  if (channel.direction !== 'capture' || channel.unwanted.length === 0) return noAliases;
  const byRatio = limit?.unit === 'dBc' || channel.levelsAt === 'sampler';
  const viewAt = captureViews(channel, byRatio ? channel.referenceHz : null);
  const found = channel.unwanted.map((source, index) => aliasOf(viewAt(source.enters), source, index, limit));
  return aliasesFrom(found, limit);
}

/** The landings of one source, added as powers, against a tone's own gain with the tone's level counted out; null where none lands. */
export function landingsAgainstTone(
  channel: Channel,
  source: Source,
  toneHz: number,
  at: 'nominal' | 'worst',
): Pick<SourceLandings, 'sumDb' | 'evaluations'> {
  const view = captureView(channel, toneHz, source.enters);
  return at === 'nominal'
    ? sourceLandings(view.nominal, channel, nominalArrivals(source))
    : sourceLandings(worstFor(view, source), channel, arrivalsOf(source));
}

/** Those of a channel without unwanted sources. */
export const noAliases: Aliases = {
  figures: [],
  strongest: null,
  sumDb: null,
  judgedSum: null,
  nominalRelativeDb: null,
  nominalLevelDb: null,
  evaluations: 0,
};

/** Levels at the sampler and against the wanted tone; as powers where several are added. */
export interface Levels {
  readonly levelDb: number;
  readonly relativeDb: number;
}

/** What is known of one source. */
export interface Found {
  readonly figure: AliasFigure;
  readonly nominal: Levels | null;
  /** All that lands of it, as powers. */
  readonly sum: Levels | null;
  readonly nominalSum: Levels | null;
  readonly gapDb: number;
  readonly evaluations: number;
}

/** The aliases of a channel from what is known of each source. */
export function aliasesFrom(found: readonly Found[], limit: Limit | null): Aliases {
  const figures = found.map((one) => one.figure);
  const relative = limit?.unit === 'dBc';
  const measure = (figure: AliasFigure): number => (relative ? figure.relative : figure.level) ?? -Infinity;
  const sumOf = (of: (one: Found) => Levels | null, by: keyof Levels): number | null => {
    const levelsDb = found.flatMap((one) => of(one)?.[by] ?? []);
    return sumOfLevels(levelsDb);
  };
  const counted = relative ? 'relativeDb' : 'levelDb';
  const valueDb = sumOf((one) => one.sum, counted);
  const nominalDb = sumOf((one) => one.nominalSum, counted) ?? -Infinity;
  const gapDb = Math.max(0, ...found.map((one) => one.gapDb));
  return {
    figures,
    strongest: figures
      .filter((figure) => figure.level !== null)
      .reduce<AliasFigure | null>((best, one) => (best === null || measure(one) > measure(best) ? one : best), null),
    sumDb: sumOf((one) => one.sum, 'levelDb'),
    judgedSum: valueDb === null ? null : { valueDb, nominalDb: Math.min(nominalDb, valueDb), gapDb },
    nominalLevelDb: largest(figures.map((figure) => figure.nominal)),
    nominalRelativeDb: largest(found.map((one) => one.nominal?.relativeDb ?? null)),
    evaluations: found.reduce((sum, one) => sum + one.evaluations, 0),
  };
}

function aliasOf(view: CaptureView, source: Source, index: number, limit: Limit | null): Found {
  const { channel } = view;
  const at = worstFor(view, source);
  const worst = sourceLandings(at, channel, arrivalsOf(source));
  const { strongest } = worst;
  if (strongest === null) {
    const figure = noLanding(source, index, limit);
    return { figure, nominal: null, sum: null, nominalSum: null, gapDb: 0, evaluations: worst.evaluations };
  }
  const same = at === view.nominal && !mayMove(source);
  const plain = same ? worst : sourceLandings(view.nominal, channel, nominalArrivals(source));
  const levels = levelsOf(view, at, strongest);
  const sum = raised(levels, worst);
  const nominal = plain.strongest === null ? null : notAbove(levelsOf(view, view.nominal, plain.strongest), levels);
  return {
    figure: figureOf(
      view,
      { source, index, at, levels, sumDb: sum.levelDb, strongest, nominalDb: nominal?.levelDb ?? null },
      limit,
    ),
    nominal,
    sum,
    nominalSum: nominal === null ? null : raised(nominal, plain),
    gapDb: worst.gapDb,
    evaluations: worst.evaluations + (same ? 0 : plain.evaluations),
  };
}

/** A tone that stands still is exact in hertz; what may stand anywhere in a band is not moved by reckoning in periods. */
function worstFor(view: CaptureView, source: Source): View {
  return standsStill(source) ? view.worst : view.worstOfBands;
}

/** What a source's figure is made of. */
interface Reached {
  readonly source: Source;
  readonly index: number;
  readonly at: View;
  readonly levels: Levels;
  readonly sumDb: number;
  readonly strongest: Landed;
  readonly nominalDb: number | null;
}

function figureOf({ channel }: CaptureView, reached: Reached, limit: Limit | null): AliasFigure {
  const { source, index, at, levels, sumDb, strongest, nominalDb } = reached;
  const { extreme, within, arrival } = strongest;
  const point = landingPoint(channel, at, extreme.frequencyHz, within);
  const held = heldTo(limit, levels);
  return {
    source: source.name,
    index,
    harmonic: arrival.harmonic,
    frequency: point.frequencyHz,
    lands: point.landing?.landsHz ?? null,
    fold: point.landing?.fold ?? null,
    inverted: point.landing?.inverted ?? null,
    level: levels.levelDb,
    nominal: nominalDb,
    sum: sumDb,
    relative: levels.relativeDb,
    limit: held.limit,
    margin: held.margin,
    gap: extreme.gapDb,
    worstAt: joinWorst(at.worst.worstAt(extreme.frequencyHz), ownDeviations(channel, source, arrival.harmonic, point)),
  };
}

/** Behind the sampler in dBFS and against the weakest wanted tone, with the same parts for both. */
function levelsOf({ channel, path, referenceHz }: CaptureView, at: View, landed: Landed): Levels {
  const { levelDb: reachedDb, extreme, arrival } = landed;
  const wantedDb = Math.min(...channel.wanted.map((band) => band.levelDb));
  const corners = at.worst.cornersAt(extreme.frequencyHz);
  const referenceDb = channel.levelsAt === 'sampler' ? 0 : gainWithCornersDb(path, channel.referenceHz, corners) + at.frontDb;
  if (referenceHz !== null) {
    const relativeDb = reachedDb - wantedDb;
    // Parts that silence the wanted tone leave nothing to measure from; the landing itself still has its level.
    const ownDb = (): number => arrivalDb(arrival, extreme.frequencyHz) + gainWithCornersDb(path, extreme.frequencyHz, corners);
    return { relativeDb, levelDb: referenceDb === -Infinity ? ownDb() : relativeDb + wantedDb + referenceDb };
  }
  return { levelDb: reachedDb, relativeDb: reachedDb - wantedDb - referenceDb - toDb(at.worst.gainLog) };
}

/** The limit that one source is held to, and its margin; under a limit for the sum no single source has either. */
export function heldTo(limit: Limit | null, { levelDb, relativeDb }: Levels): Pick<AliasFigure, 'limit' | 'margin'> {
  if (limit === null || limit.sum) return { limit: null, margin: null };
  return { limit: limit.at, margin: limit.at - (limit.unit === 'dBc' ? relativeDb : levelDb) };
}

/** A nominal value is one of those that the worst was taken from, so it lies above it by rounding only. */
export function notAbove(nominal: Levels, worst: Levels): Levels {
  return {
    levelDb: Math.min(nominal.levelDb, worst.levelDb),
    relativeDb: Math.min(nominal.relativeDb, worst.relativeDb),
  };
}

/** The levels of all that lands of a source, from those of the strongest. */
function raised({ levelDb, relativeDb }: Levels, { sumDb, strongest }: SourceLandings): Levels {
  const byDb = sumDb === null || strongest === null || sumDb === strongest.levelDb ? 0 : sumDb - strongest.levelDb;
  return { levelDb: levelDb + byDb, relativeDb: relativeDb + byDb };
}

function ownDeviations(channel: Channel, source: Source, harmonic: number, point: LandingPoint): WorstAt | null {
  const { rate } = channel;
  const moved: Record<string, number> = {};
  if (varies(rate.tolerance)) moved[rateLabel(rate)] = deviation(point.rateHz / rate.hz, rate.tolerance);
  if (source.kind === 'tone' && varies(source.tolerance)) {
    moved[toneLabel(source)] = deviation(point.frequencyHz / (harmonic * source.frequencyHz), source.tolerance);
  }
  return moved;
}

/** The figure of a source that lands nowhere. */
export function noLanding(source: Source, index: number, limit: Limit | null): AliasFigure {
  return {
    source: source.name,
    index,
    harmonic: 1,
    frequency: null,
    lands: null,
    fold: null,
    inverted: null,
    level: null,
    nominal: null,
    sum: null,
    relative: null,
    limit: limit === null || limit.sum ? null : limit.at,
    margin: null,
    gap: null,
    worstAt: null,
  };
}

function largest(levels: readonly (number | null)[]): number | null {
  const known = levels.filter((level) => level !== null);
  return known.length === 0 ? null : Math.max(...known);
}
