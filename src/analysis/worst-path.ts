/** A path at the worst of its tolerances: every stage stretched and scaled for itself, so that each frequency sees its own worst case. */
import type { Enclosure, Response } from '../signal/response';
import { constantResponse } from '../signal/response-algebra';
import { stretched, stretchedRatio } from '../signal/stretched';
import type { Sense, StretchedResponse } from '../signal/stretched';
import type { Channel } from '../spec/channel';
import { inSeries, relativeTo } from './channel-path';
import type { ChannelPath, StagePath } from './channel-path';
import type { WorstAt } from './figures';
import { followsRate } from './pulse';
import { cornerLabel, deviation, factorsOf, gainLabel, partsVary, rateRange, varies } from './tolerances';

/**
 * What frequencies are measured in while the rate may deviate. `hertz`: as they are; a pulse that follows the rate is then
 * stretched. `periods`: as multiples of the rate, written in Hz at the nominal rate; the stages are then stretched. It is only for pulses
 * that follow the rate.
 */
export type Axis = 'hertz' | 'periods';

/** Which worst case is asked for. */
export interface WorstQuestion {
  readonly sense: Sense;
  /** The frequency that the gain is measured from, with the same parts; null for the gain itself, whose tolerance then counts. */
  readonly referenceHz: number | null;
  readonly axis: Axis;
}

/** A path at its worst. */
export interface WorstPath {
  readonly response: Response;
  /** ln of what the stages' gain tolerances add to it; 0 where gains are measured from a reference. */
  readonly gainLog: number;
  /** The corner factor of each stage, in order, at which the worst is reached at a frequency. */
  cornersAt(frequencyHz: number): readonly number[];
  /** What deviates, and how far, where the worst is reached at a frequency; null where nothing can. The rate is the caller's. */
  worstAt(frequencyHz: number): WorstAt | null;
}

/** The worst of a path at each frequency. */
export function worstPath(path: ChannelPath, question: WorstQuestion): WorstPath {
  if (!partsVary(path.channel)) return nominalPath(path, question.referenceHz);
  const stages = path.stages.map((stage) => worstStage(stage, path.channel, question));
  const response = inSeries([...worstPulse(path, question), ...stages.flatMap((stage) => stage.responses)]);
  const withGain = question.referenceHz === null;
  return {
    response,
    gainLog: stages.reduce((sum, stage) => sum + stage.gainLog, 0),
    cornersAt: (frequencyHz) => stages.map((stage) => stage.cornerAt(frequencyHz)),
    worstAt: (frequencyHz) => describe(stages, frequencyHz, withGain ? question.sense : null),
  };
}

/** A path with nothing deviating. */
export function nominalPath(path: ChannelPath, referenceHz: number | null): WorstPath {
  return {
    response: referenceHz === null ? path.total : relativeTo(path.total, referenceHz),
    gainLog: 0,
    cornersAt: () => path.stages.map(() => 1),
    worstAt: () => null,
  };
}

/** The factors by which the rate's tolerance moves a response that the axis does not follow. */
export function axisFactors(channel: Channel): Record<Axis, Enclosure> {
  const { low, high } = rateRange(channel.rate);
  const nominal = channel.rate.hz;
  return { hertz: { low: low / nominal, high: high / nominal }, periods: { low: nominal / high, high: nominal / low } };
}

/** The axis on which what may stand anywhere in a band is searched: that of the pulse, where the pulse follows a rate that varies. */
export function bandAxis(channel: Channel): Axis {
  return varies(channel.rate.tolerance) && followsRate(channel.pulse) ? 'periods' : 'hertz';
}

/** A range of frequencies on an axis, at every rate that is allowed. */
export function onAxis(channel: Channel, axis: Axis, range: Enclosure): Enclosure {
  if (axis === 'hertz') return range;
  const { low, high } = axisFactors(channel).periods;
  return { low: range.low * low, high: range.high * high };
}

interface WorstStage {
  readonly path: StagePath;
  readonly responses: readonly Response[];
  readonly gainLog: number;
  cornerAt(frequencyHz: number): number;
}

function worstStage(path: StagePath, channel: Channel, question: WorstQuestion): WorstStage {
  const { stage, response } = path;
  const own = factorsOf(stage.cornerTolerance);
  const axis = question.axis === 'periods' ? axisFactors(channel).periods : { low: 1, high: 1 };
  const moved = stretchedFrom(response, { low: own.low * axis.low, high: own.high * axis.high }, question);
  const gain = question.sense === 'largest' ? stage.gainTolerance.high : stage.gainTolerance.low;
  const gainLog = question.referenceHz === null ? Math.log1p(gain) : 0;
  return {
    path,
    responses: gainLog === 0 ? [moved.response] : [moved.response, constantResponse(gainLog)],
    gainLog,
    // What the rate moves is no deviation of the corner.
    cornerAt: (frequencyHz) => Math.min(Math.max(moved.factorAt(frequencyHz), own.low), own.high),
  };
}

/** A pulse that follows the rate is the same at every rate in periods; one of fixed width is only ever looked at in hertz. */
function worstPulse({ channel, pulse }: ChannelPath, question: WorstQuestion): readonly Response[] {
  if (channel.pulse.shape === 'instant') return [];
  const moves = followsRate(channel.pulse) && question.axis === 'hertz';
  const factors = moves ? axisFactors(channel).hertz : { low: 1, high: 1 };
  return [stretchedFrom(pulse, factors, question).response];
}

function stretchedFrom(
  response: Response,
  factors: Enclosure,
  question: WorstQuestion,
): { readonly response: Response; factorAt(frequencyHz: number): number } {
  const { referenceHz, sense } = question;
  if (factors.low === factors.high) {
    return { response: referenceHz === null ? response : relativeTo(response, referenceHz), factorAt: () => 1 };
  }
  const moved: StretchedResponse =
    referenceHz === null ? stretched(response, factors, sense) : stretchedRatio(response, referenceHz, factors, sense);
  return { response: moved, factorAt: (frequencyHz) => moved.factorAt(frequencyHz) };
}

function describe(stages: readonly WorstStage[], frequencyHz: number, gainSense: Sense | null): WorstAt | null {
  const entries = stages.flatMap((worst): readonly (readonly [string, number])[] => {
    const { stage } = worst.path;
    const corner = varies(stage.cornerTolerance) ? deviation(worst.cornerAt(frequencyHz), stage.cornerTolerance) : null;
    const gain = gainSense === 'largest' ? stage.gainTolerance.high : stage.gainTolerance.low;
    return [
      ...(corner === null ? [] : [[cornerLabel(stage), corner] as const]),
      ...(gainSense !== null && varies(stage.gainTolerance) ? [[gainLabel(stage), gain] as const] : []),
    ];
  });
  return entries.length === 0 ? null : Object.fromEntries(entries);
}
