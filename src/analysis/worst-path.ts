/** A path at the worst of its tolerances: every stage stretched and scaled for itself, so that each frequency sees its own worst case. */
import type { Response } from '../signal/response';
import { constantResponse } from '../signal/response-algebra';
import type { Sense } from '../signal/stretched';
import type { Channel } from '../spec/channel';
import { axisFactors } from './axis';
import { inSeries, relativeTo } from './channel-path';
import type { ChannelPath, StagePath } from './channel-path';
import { deviationsAt } from './corners';
import type { Corners } from './corners';
import type { WorstAt } from './figures';
import type { StageSetting } from './stage-setting';
import type { WorstQuestion } from './stretched-from';
import { deviation, gainLabel, joinWorst, partsVary, rateLabel, varies } from './tolerances';
import { worstPulse } from './worst-pulse';
import type { WorstPulse } from './worst-pulse';
import { movedStage } from './worst-stage';

/** A path at its worst. */
export interface WorstPath {
  readonly response: Response;
  /** ln of what the stages' gain tolerances add to it; 0 where gains are measured from a reference. */
  readonly gainLog: number;
  /** What each stage is set to, in order, where the worst is reached at a frequency. */
  cornersAt(frequencyHz: number): Corners;
  /**
   * What deviates, and how far, where the worst is reached at a frequency; null where nothing can. The rate is named as far as it moves the
   * pulse; where it also moves the frequency, or is the axis, it is the caller's.
   */
  worstAt(frequencyHz: number): WorstAt | null;
}

/** The worst of a path at each frequency. */
export function worstPath(path: ChannelPath, question: WorstQuestion): WorstPath {
  if (!partsVary(path.channel)) return nominalPath(path, question.referenceHz);
  const stages = path.stages.map((stage) => worstStage(stage, path.channel, question));
  const pulse = worstPulse(path, question);
  const response = inSeries([...pulse.responses, ...stages.flatMap((stage) => stage.responses)]);
  const withGain = question.referenceHz === null;
  return {
    response,
    gainLog: stages.reduce((sum, stage) => sum + stage.gainLog, 0),
    cornersAt: (frequencyHz) => stages.map((stage) => stage.settingAt(frequencyHz)),
    worstAt: (frequencyHz) =>
      joinWorst(describe(stages, frequencyHz, withGain ? question.sense : null), rateOf(path.channel, pulse, frequencyHz)),
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

function rateOf({ rate }: Channel, { rateFactorAt }: WorstPulse, frequencyHz: number): WorstAt | null {
  return rateFactorAt === null ? null : { [rateLabel(rate)]: deviation(rateFactorAt(frequencyHz), rate.tolerance) };
}

interface WorstStage {
  readonly path: StagePath;
  readonly responses: readonly Response[];
  readonly gainLog: number;
  settingAt(frequencyHz: number): StageSetting;
}

function worstStage(path: StagePath, channel: Channel, question: WorstQuestion): WorstStage {
  const { stage } = path;
  const moved = movedStage(path, question.axis === 'periods' ? axisFactors(channel).periods : { low: 1, high: 1 }, question);
  const gain = question.sense === 'largest' ? stage.gainTolerance.high : stage.gainTolerance.low;
  const gainLog = question.referenceHz === null ? Math.log1p(gain) : 0;
  return {
    path,
    responses: gainLog === 0 ? [moved.response] : [moved.response, constantResponse(gainLog)],
    gainLog,
    settingAt: (frequencyHz) => moved.settingAt(frequencyHz),
  };
}

function describe(stages: readonly WorstStage[], frequencyHz: number, gainSense: Sense | null): WorstAt | null {
  const gains = stages.flatMap(({ path: { stage } }): readonly (readonly [string, number])[] => {
    const gain = gainSense === 'largest' ? stage.gainTolerance.high : stage.gainTolerance.low;
    return gainSense !== null && varies(stage.gainTolerance) ? [[gainLabel(stage), gain]] : [];
  });
  const settings = stages.map((worst) => worst.settingAt(frequencyHz));
  return joinWorst(deviationsAt({ stages: stages.map((worst) => worst.path) }, settings), Object.fromEntries(gains));
}
