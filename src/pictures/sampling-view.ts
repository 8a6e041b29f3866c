/** What the section "before and after sampling" needs to know of a channel, worked out once. */
import type { Enclosure } from '../analysis';
import { gainDb } from '../analysis';
import { sourceRange, outsideWanted } from '../analysis/source-range';
import type { FrequencyAxis, LevelAxis } from '../protocol/picture';
import type { Source } from '../spec/channel';
import { frequencyAxis, levelAxis } from './axes';
import type { Arriving } from './landings';
import { limitFigure } from './subject';
import type { Subject } from './subject';

/** A source with where it may stand. */
export interface SourceView extends Arriving {
  readonly source: Source;
  readonly index: number;
  readonly range: Enclosure;
}

/** The section's common ground. */
export interface SamplingView {
  readonly subject: Subject;
  readonly sources: readonly SourceView[];
  readonly input: FrequencyAxis;
  readonly output: FrequencyAxis;
  readonly levels: LevelAxis;
  readonly protect: readonly Enclosure[];
  /** The alias limit as a level, dBFS; null without one. */
  readonly limitDb: number | null;
  /** How far a straight line may miss a curve, dB. */
  readonly tolerance: number;
}

/** Works it out. */
export function samplingView(subject: Subject): SamplingView {
  const { figures, channel } = subject;
  const limitDb = limitLevel(subject);
  const sources = channel.unwanted.map((source, index): SourceView => ({
    source,
    index,
    range: sourceRange(source),
    ranges: outsideWanted(channel, source),
    levelDb: source.levelDb,
    response: subject.largest,
    rateHz: channel.rate.hz,
  }));
  const stated = [...channel.wanted.map((band) => band.levelDb), ...sources.map(({ levelDb }) => levelDb)];
  const levels = levelAxis(Math.max(...stated), 1.5, [limitDb, figures.alias?.level ?? null, figures.noise.total]);
  const tolerance = (levels.high - levels.low) / 3000;
  return {
    subject,
    sources,
    input: inputAxis(subject, sources, levels),
    output: frequencyAxisTo(figures.outputRate / 2),
    levels,
    protect: figures.protected.map(({ low, high }) => ({ low, high: Math.min(high, figures.halfRate) })),
    limitDb,
    tolerance,
  };
}

function frequencyAxisTo(highHz: number): FrequencyAxis {
  return { title: 'Hz after sampling, to half the rate', lowHz: 0, highHz, logLowHz: highHz / 1e4, scale: 'linear' };
}

function inputAxis(subject: Subject, sources: readonly SourceView[], levels: LevelAxis): FrequencyAxis {
  const { channel } = subject;
  const wanted = channel.wanted.flatMap((band) => [band.lowHz, band.highHz]);
  const edges = sources.flatMap(({ range }) => [range.low, range.high]);
  const finite = [...wanted, ...edges].filter((f) => f > 0 && Number.isFinite(f));
  const endless = sources.filter(({ range }) => !Number.isFinite(range.high));
  const worst = subject.figures.alias?.frequency ?? null;
  const highest = Math.max(...finite, 1.5 * channel.rate.hz, worst !== null && Number.isFinite(worst) ? worst : 0);
  const fading = endless.map((source) => fadesAt(source, highest, levels.low));
  // A source from 0 Hz up shows the first stretch that lands, too.
  const fromZero = sources.some(({ range }) => range.low === 0) ? [channel.rate.hz / 20] : [];
  const lowest = Math.min(...finite, ...fromZero);
  return frequencyAxis('Hz at the input', Number.isFinite(lowest) ? lowest : 0, Math.max(highest * 1.1, ...fading));
}

/** Where an endless source has faded below what is shown; at most 20 times as far. */
function fadesAt({ levelDb, response }: SourceView, fromHz: number, floorDb: number): number {
  const steps = Array.from({ length: 14 }, (_, index) => fromHz * 10 ** (index / 10));
  return steps.find((f) => levelDb + gainDb(response, f) < floorDb) ?? fromHz * 20;
}

/** A limit in dBc counts from the weakest wanted tone as it comes out. */
function limitLevel(subject: Subject): number | null {
  const limit = limitFigure(subject, 'alias');
  if (limit === null) return null;
  if (limit.unit !== 'dBc') return limit.at;
  const { alias } = subject.figures;
  if (alias !== null && alias.level !== null && alias.relative !== null) return limit.at + alias.level - alias.relative;
  const weakest = Math.min(...subject.channel.wanted.map((band) => band.levelDb));
  return limit.at + weakest + gainDb(subject.nominal, subject.channel.referenceHz);
}
