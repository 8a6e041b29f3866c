/** What the section "before and after sampling" needs to know of a channel, worked out once. */
import { gainDb, inSeries, relayPath, weightResponse } from '../analysis';
import type { Enclosure, Response } from '../analysis';
import { arrivalsOf } from '../analysis/arrivals';
import type { Arrival } from '../analysis/arrivals';
import { captureViews } from '../analysis/capture-view';
import { sourceRange, wantedRanges } from '../analysis/source-range';
import { without } from '../analysis/intervals';
import type { FrequencyAxis, LevelAxis } from '../protocol/picture';
import type { Channel, Source } from '../spec/channel';
import { frequencyAxis, levelAxis } from './axes';
import type { Arriving, Behind } from './landings';
import { relayGains } from './leaving-copies';
import { limitFigure } from './subject';
import type { Subject } from './subject';

/** One tone of a source: itself, a harmonic, a line of its table, or what may stand anywhere under an envelope. */
export interface ToneView extends Arriving {
  /** Every frequency at which it may stand. */
  readonly range: Enclosure;
  readonly harmonic: number;
  /** How far its stated level lies below `levelDb` over frequency; null where it is the same everywhere. */
  readonly envelope: Response | null;
}

/** A source with what it sends. */
export interface SourceView {
  readonly source: Source;
  readonly index: number;
  /** Where it may stand itself. */
  readonly range: Enclosure;
  readonly tones: readonly ToneView[];
}

/** The section's common ground. */
export interface SamplingView {
  readonly subject: Subject;
  /** What the input meets before the sampler, at nominal values. */
  readonly across: Response;
  readonly sources: readonly SourceView[];
  readonly input: FrequencyAxis;
  readonly output: FrequencyAxis;
  readonly levels: LevelAxis;
  readonly protect: readonly Enclosure[];
  /** The alias limit as a level, dBFS; null without one. */
  readonly limitDb: number | null;
  /** Whether the limit holds for all landings together, so that no single one breaks it. */
  readonly limitSums: boolean;
  /** How far a straight line may miss a curve, dB. */
  readonly tolerance: number;
}

/** Works it out. */
export function samplingView(subject: Subject): SamplingView {
  const { figures, channel } = subject;
  const limitDb = limitLevel(subject);
  const sources = sourceViews(subject);
  const stated = [...channel.wanted.map((band) => band.levelDb), ...channel.unwanted.map(({ levelDb }) => levelDb)];
  const levels = levelAxis(Math.max(...stated), 1.5, [limitDb, figures.alias?.level ?? null, figures.noise.total]);
  const tolerance = (levels.high - levels.low) / 3000;
  return {
    subject,
    across: channel.direction === 'relay' ? relayGains(subject).input : subject.nominal,
    sources,
    input: inputAxis(subject, sources, levels),
    output: frequencyAxisTo(subject),
    levels,
    protect: figures.protected.map(({ low, high }) => ({ low, high: Math.min(high, figures.halfRate) })),
    limitDb,
    limitSums: channel.limits.some(({ key, sum }) => key === 'alias' && sum),
    tolerance,
  };
}

/** Tones of a source that are drawn; the weaker ones beyond them would only cover one another. */
const mostTones = 200;

function sourceViews(subject: Subject): readonly SourceView[] {
  const { channel } = subject;
  // Levels that hold at the sampler are measured from the reference, so the path counts from there.
  const before = channel.direction === 'relay' ? relayPath(channel).input.channel : channel;
  const viewAt = captureViews(before, channel.levelsAt === 'sampler' ? channel.referenceHz : null);
  const behind = channel.direction === 'relay' ? behindSampler(subject) : null;
  return channel.unwanted.map((source, index): SourceView => {
    const { response } = viewAt(source.enters).worst.worst;
    const tones = [...arrivalsOf(source)]
      .sort((a, b) => b.levelDb - a.levelDb)
      .slice(0, mostTones)
      .map((arrival) => toneView(channel, arrival, response, behind));
    return { source, index, range: sourceRange(source), tones };
  });
}

function toneView(
  channel: Channel,
  { harmonic, range, levelDb, envelope }: Arrival,
  path: Response,
  behind: Behind | null,
): ToneView {
  const response = envelope === null ? path : inSeries([path, envelope]);
  const ranges = without([range], wantedRanges(channel));
  return { harmonic, range, ranges, levelDb, response, envelope, rateHz: channel.rate.hz, behind };
}

/** The weights of a relay's copies and its output filter. */
function behindSampler(subject: Subject): Behind {
  const { weights } = relayPath(subject.channel);
  const { largestOutput, weightDb } = relayGains(subject);
  return {
    logAt: (copy, x) => (weightDb(copy, x) * Math.LN10) / 20 + largestOutput.logGain(x),
    boundAt: (first, x) => weightResponse(weights.boundFrom(first)).logGain(x) + largestOutput.logGain(x),
  };
}

/** From 0 to half the rate; logarithmic where all that counts is a small part of it. */
function frequencyAxisTo({ channel, figures }: Subject): FrequencyAxis {
  const title = channel.direction === 'relay' ? 'Hz at the output, to half the rate' : 'Hz after sampling, to half the rate';
  const highHz = figures.outputRate / 2;
  const counts = Math.max(...figures.protected.map(({ high }) => high), ...figures.wanted.map(({ appearsHigh }) => appearsHigh));
  const scale = counts < highHz / 25 ? 'log' : 'linear';
  return { title, lowHz: 0, highHz, logLowHz: scale === 'log' ? counts / 100 : highHz / 1e4, scale };
}

function inputAxis(subject: Subject, sources: readonly SourceView[], levels: LevelAxis): FrequencyAxis {
  const { channel } = subject;
  // Of a band from 0 Hz a decade shows on a logarithmic axis.
  const wanted = channel.wanted.flatMap((band) => [band.lowHz > 0 ? band.lowHz : band.highHz / 10, band.highHz]);
  const tones = sources.flatMap((source) => source.tones);
  const edges = tones.flatMap(({ range }) => [range.low, range.high]);
  const finite = [...wanted, ...edges].filter((f) => f > 0 && Number.isFinite(f));
  const endless = tones.filter(({ range }) => !Number.isFinite(range.high));
  const worst = subject.figures.alias?.frequency ?? null;
  const highest = Math.max(...finite, 1.5 * channel.rate.hz, worst !== null && Number.isFinite(worst) ? worst : 0);
  const fading = endless.map((tone) => fadesAt(tone, highest, levels.low));
  // A source from 0 Hz up shows the first stretch that lands, too.
  const fromZero = tones.some(({ range }) => range.low === 0) ? [channel.rate.hz / 20] : [];
  const lowest = Math.min(...finite, ...fromZero);
  return frequencyAxis('Hz at the input', Number.isFinite(lowest) ? lowest : 0, Math.max(highest * 1.1, ...fading));
}

/** Where an endless source has faded below what is shown; at most 20 times as far. */
function fadesAt({ levelDb, response }: ToneView, fromHz: number, floorDb: number): number {
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
