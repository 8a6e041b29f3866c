/** A channel's path as responses: the aperture or hold, each stage and the whole, to be evaluated at any frequency by analysis, pictures and hovers. */
import { constantResponse, product } from '../signal/response-algebra';
import type { Response } from '../signal/response';
import type { Channel } from '../spec/channel';
import { toDb } from './decibels';
import { stageDelay, stagePath, stagePhaseRad } from './stage-path';
import type { StagePath } from './stage-path';
import { hasPulse, wantedDelaySeconds, wantedPulse } from './wanted-pulse';

export type { StagePath } from './stage-path';

/** The whole path of a channel at nominal values and one rate. */
export interface ChannelPath {
  readonly channel: Channel;
  readonly rateHz: number;
  /**
   * The aperture at the input frequency, the hold at the output frequency with its area over the period, or what a relay's gate makes of
   * the wanted path.
   */
  readonly pulse: Response;
  readonly stages: readonly StagePath[];
  /** All stages in series, without the pulse. */
  readonly analogue: Response;
  /** Pulse and stages. */
  readonly total: Response;
}

/** The path of a channel, at its own rate unless another is given. */
export function channelPath(channel: Channel, rateHz = channel.rate.hz): ChannelPath {
  const stages = channel.stages.map(stagePath);
  const pulse = wantedPulse(channel, rateHz);
  const analogue = inSeries(stages.map((stage) => stage.response));
  const total = inSeries([...(hasPulse(channel) ? [pulse] : []), ...stages.map((stage) => stage.response)]);
  return { channel, rateHz, pulse, stages, analogue, total };
}

/** The same path with another response in place of its pulse's. */
export function withPulse(path: ChannelPath, pulse: Response): ChannelPath {
  const { channel, rateHz, stages, analogue } = path;
  return { channel, rateHz, pulse, stages, analogue, total: inSeries([pulse, analogue]) };
}

/** Responses in series; a flat one where there are none. */
export function inSeries(responses: readonly Response[]): Response {
  const [only] = responses;
  if (only === undefined) return constantResponse(0);
  return responses.length === 1 ? only : product(responses);
}

/** A response measured from its own value at a frequency; unchanged where it has a null there. */
export function relativeTo(response: Response, referenceHz: number): Response {
  const reference = response.logGain(referenceHz);
  return Number.isFinite(reference) && reference !== 0 ? product([constantResponse(-reference), response]) : response;
}

/** Gain in dB at a frequency. */
export function gainDb(response: Response, frequencyHz: number): number {
  return toDb(response.logGain(frequencyHz));
}

/** Loss in dB at a frequency against another; positive where less comes through. */
export function lossDb(response: Response, frequencyHz: number, referenceHz: number): number {
  return gainDb(response, referenceHz) - gainDb(response, frequencyHz);
}

/** The stages' phase in radians at a frequency, unwrapped by pole and zero; the pulse's own is left out. Null where a table has none. */
export function pathPhaseRad(path: ChannelPath, frequencyHz: number): number | null {
  return sumOrNull(path.stages.map((stage) => stagePhaseRad(stage, frequencyHz)));
}

/** Group delay of stages and pulse in seconds; null where a measured stage has no phase. */
export function pathDelay(path: ChannelPath, frequencyHz: number): number | null {
  const stages = sumOrNull(path.stages.map((stage) => stageDelay(stage, frequencyHz)));
  return stages === null ? null : stages + wantedDelaySeconds(path.channel, path.rateHz, frequencyHz);
}

function sumOrNull(values: readonly (number | null)[]): number | null {
  return values.reduce((sum, value) => (sum === null || value === null ? null : sum + value), 0);
}
