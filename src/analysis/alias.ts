/** The strongest landing of each unwanted source in a protected range, nominally and at the worst of all tolerances. */
import type { Enclosure } from '../signal/response';
import type { Extreme } from '../signal/search';
import type { Channel, Limit, Source } from '../spec/channel';
import { captureView, gainWithCornersDb, sourceWithin } from './capture-view';
import type { CaptureView, View } from './capture-view';
import { sumOfLevels, toDb } from './decibels';
import type { AliasFigure, WorstAt } from './figures';
import { landingPoint } from './landing-point';
import type { LandingPoint } from './landing-point';
import { strongestLanding } from './strongest-landing';
import { deviation, joinWorst, rateLabel, toneLabel, varies } from './tolerances';

/** The aliases of a channel. */
export interface Aliases {
  readonly figures: readonly AliasFigure[];
  readonly strongest: AliasFigure | null;
  /** All of them as powers, dBFS. */
  readonly sumDb: number | null;
  /** Nominal value against the wanted tone of the strongest nominal landing, for limits in dBc. */
  readonly nominalRelativeDb: number | null;
  readonly nominalLevelDb: number | null;
  readonly evaluations: number;
}

/** Every source's strongest landing, measured as the alias limit measures it. */
export function aliasesOf(channel: Channel, limit: Limit | null): Aliases {
  if (channel.direction !== 'capture' || channel.unwanted.length === 0) return noAliases;
  const byRatio = limit?.unit === 'dBc' || channel.levelsAt === 'sampler';
  const view = captureView(channel, byRatio ? channel.referenceHz : null);
  const found = channel.unwanted.map((source, index) => aliasOf(view, source, index, limit));
  const figures = found.map((one) => one.figure);
  const measure = (figure: AliasFigure): number => (limit?.unit === 'dBc' ? figure.relative : figure.level) ?? -Infinity;
  const landing = figures.filter((figure) => figure.level !== null);
  return {
    figures,
    strongest: landing.reduce<AliasFigure | null>(
      (best, one) => (best === null || measure(one) > measure(best) ? one : best),
      null,
    ),
    sumDb: sumOfLevels(landing.map((figure) => figure.level ?? -Infinity)),
    nominalLevelDb: largest(figures.map((figure) => figure.nominal)),
    nominalRelativeDb: largest(found.map((one) => one.nominalRelativeDb)),
    evaluations: found.reduce((sum, one) => sum + one.evaluations, 0),
  };
}

/** The strongest landing of one source against a tone's own gain, in dB with both levels counted out; null where none lands. */
export function landingAgainstTone(channel: Channel, source: Source, toneHz: number, at: 'nominal' | 'worst'): Extreme | null {
  const view = captureView(channel, toneHz);
  return at === 'nominal'
    ? search(view.nominal, channel, source).extreme
    : search(worstFor(view, source), channel, source).extreme;
}

const noAliases: Aliases = {
  figures: [],
  strongest: null,
  sumDb: null,
  nominalRelativeDb: null,
  nominalLevelDb: null,
  evaluations: 0,
};

interface Found {
  readonly figure: AliasFigure;
  readonly nominalRelativeDb: number | null;
  readonly evaluations: number;
}

/** A search's outcome in levels. */
interface Levels {
  readonly levelDb: number;
  readonly relativeDb: number;
}

function aliasOf(view: CaptureView, source: Source, index: number, limit: Limit | null): Found {
  const { channel } = view;
  const view1 = worstFor(view, source);
  const worst = search(view1, channel, source);
  if (worst.extreme === null) {
    return { figure: noLanding(source, index, limit), nominalRelativeDb: null, evaluations: 0 };
  }
  const nominalSource = fixedSource(source);
  const same = view1 === view.nominal && nominalSource === source;
  const nominal = same ? worst.extreme : search(view.nominal, channel, nominalSource).extreme;
  const levels = levelsOf(view, view1, source, worst.extreme);
  const nominalLevels = nominal === null ? null : levelsOf(view, view.nominal, source, nominal);
  const point = landingPoint(channel, view1, worst.extreme.frequencyHz, worst.within);
  const counted = limit?.unit === 'dBc' ? levels.relativeDb : levels.levelDb;
  return {
    figure: {
      source: source.name,
      index,
      frequency: point.frequencyHz,
      lands: point.landing?.landsHz ?? null,
      fold: point.landing?.fold ?? null,
      inverted: point.landing?.inverted ?? null,
      level: levels.levelDb,
      nominal: nominalLevels === null ? null : Math.min(nominalLevels.levelDb, levels.levelDb),
      relative: levels.relativeDb,
      limit: limit?.at ?? null,
      margin: limit === null ? null : limit.at - counted,
      gap: worst.extreme.gapDb,
      worstAt: joinWorst(view1.worst.worstAt(worst.extreme.frequencyHz), ownDeviations(channel, source, point)),
    },
    nominalRelativeDb: nominalLevels === null ? null : Math.min(nominalLevels.relativeDb, levels.relativeDb),
    evaluations: worst.extreme.evaluations + (same ? 0 : (nominal?.evaluations ?? 0)),
  };
}

/** A tone that stands still is exact in hertz; what may stand anywhere in a band is not moved by reckoning in periods. */
function worstFor(view: CaptureView, source: Source): View {
  const fixedTone = source.kind === 'tone' && !varies(source.tolerance);
  return fixedTone ? view.worst : view.worstOfBands;
}

function search(
  view: View,
  channel: Channel,
  source: Source,
): { readonly extreme: Extreme | null; readonly within: readonly Enclosure[] } {
  const within = sourceWithin(view, channel, source);
  return {
    within,
    extreme: strongestLanding({ set: view.set, rateHz: view.rateHz, within, response: view.worst.response, split: view.split }),
  };
}

function fixedSource(source: Source): Source {
  return source.kind === 'tone' && varies(source.tolerance) ? { ...source, tolerance: { low: 0, high: 0 } } : source;
}

/** Behind the sampler in dBFS and against the weakest wanted tone, with the same parts for both. */
function levelsOf(view: CaptureView, at: View, source: Source, extreme: Extreme): Levels {
  const { channel, path } = view;
  const wantedDb = Math.min(...channel.wanted.map((band) => band.levelDb));
  const gainDb = toDb(extreme.logGain);
  const referenceDb =
    channel.levelsAt === 'sampler' ? 0 : gainWithCornersDb(path, channel.referenceHz, at.worst.cornersAt(extreme.frequencyHz));
  if (view.referenceHz !== null) {
    const relativeDb = source.levelDb + gainDb - wantedDb;
    return { relativeDb, levelDb: relativeDb + wantedDb + referenceDb };
  }
  const levelDb = source.levelDb + gainDb;
  return { levelDb, relativeDb: levelDb - wantedDb - referenceDb - toDb(at.worst.gainLog) };
}

function ownDeviations(channel: Channel, source: Source, point: LandingPoint): WorstAt | null {
  const { rate } = channel;
  const moved: Record<string, number> = {};
  if (varies(rate.tolerance)) moved[rateLabel(rate)] = deviation(point.rateHz / rate.hz, rate.tolerance);
  if (source.kind === 'tone' && varies(source.tolerance)) {
    moved[toneLabel(source)] = deviation(point.frequencyHz / source.frequencyHz, source.tolerance);
  }
  return moved;
}

function noLanding(source: Source, index: number, limit: Limit | null): AliasFigure {
  return {
    source: source.name,
    index,
    frequency: null,
    lands: null,
    fold: null,
    inverted: null,
    level: null,
    nominal: null,
    relative: null,
    limit: limit?.at ?? null,
    margin: null,
    gap: null,
    worstAt: null,
  };
}

function largest(levels: readonly (number | null)[]): number | null {
  const known = levels.filter((level) => level !== null);
  return known.length === 0 ? null : Math.max(...known);
}
