/** A path at the worst of its tolerances: every stage stretched and scaled for itself, so that each frequency sees its own worst case. */
import type { Response } from '../signal/response';
import { constantResponse } from '../signal/response-algebra';
import type { Sense } from '../signal/stretched';
import type { Channel } from '../spec/channel';
import { axisFactors } from './axis';
import { inSeries, relativeTo } from './channel-path';
import type { ChannelPath, StagePath } from './channel-path';
import type { Corners } from './corners';
import type { WorstAt } from './figures';
import { stretchedFrom, type WorstQuestion } from './stretched-from';
import { cornerLabel, deviation, factorsOf, gainLabel, partsVary, varies } from './tolerances';
import { worstPulse } from './worst-pulse';

/** A path at its worst. */
export interface WorstPath {
  readonly response: Response;
  /** ln of what the stages' gain tolerances add to it; 0 where gains are measured from a reference. */
  readonly gainLog: number;
  /** What each stage is set to, in order, where the worst is reached at a frequency. */
  cornersAt(frequencyHz: number): Corners;
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
