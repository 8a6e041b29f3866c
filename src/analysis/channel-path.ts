/** A channel's path as responses: the aperture or hold, each stage and the whole, to be evaluated at any frequency by analysis, pictures and hovers. */
import { filterResponse, groupDelay, phaseRad } from '../signal/filter';
import type { Filter } from '../signal/filter';
import { constantResponse, product } from '../signal/response-algebra';
import type { Response } from '../signal/response';
import type { Channel, Stage } from '../spec/channel';
import { toDb } from './decibels';
import { pulseResponse, pulseSeconds } from './pulse';
import { stageFilter } from './stage-filter';

/** One stage with its filter and its response at nominal values. */
export interface StagePath {
  readonly stage: Stage;
  readonly filter: Filter;
  readonly response: Response;
}

/** The whole path of a channel at nominal values and one rate. */
export interface ChannelPath {
  readonly channel: Channel;
  readonly rateHz: number;
  /** The aperture at the input frequency, or the hold at the output frequency with its area over the period. */
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
  const pulse = pulseResponse(channel, rateHz);
  const analogue = inSeries(stages.map((stage) => stage.response));
  const total = inSeries([...(channel.pulse.shape === 'instant' ? [] : [pulse]), ...stages.map((stage) => stage.response)]);
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

/** The stages' phase in radians at a frequency, unwrapped by pole and zero; the pulse's own delay is left out. */
export function pathPhaseRad(path: ChannelPath, frequencyHz: number): number {
  return path.stages.reduce((sum, stage) => sum + phaseRad(stage.filter, frequencyHz), 0);
}

/** Group delay of stages and pulse in seconds: a rectangle delays by half its width. */
export function pathDelay(path: ChannelPath, frequencyHz: number): number {
  const half = pulseSeconds(path.channel.pulse, path.rateHz) / 2;
  return path.stages.reduce((sum, stage) => sum + groupDelay(stage.filter, frequencyHz), half);
}

function stagePath(stage: Stage): StagePath {
  const filter = stageFilter(stage.form);
  return { stage, filter, response: filterResponse(filter) };
}
