/** Where a source enters the path: the part that it passes, and the part in front of it that only the wanted tone passes. */
import { constantResponse, product } from '../signal/response-algebra';
import type { Channel, Entrance } from '../spec/channel';
import { inSeries } from './channel-path';
import type { ChannelPath, StagePath } from './channel-path';
import { toDb } from './decibels';
import { joinWorst } from './tolerances';
import { nominalPath, worstPath } from './worst-path';
import type { WorstPath } from './worst-path';

/** The path behind an entrance, with the aperture; the path itself from the input. */
export function pathFrom(path: ChannelPath, enters: Entrance): ChannelPath {
  const first = firstStage(path, enters);
  if (first === 0) return path;
  const stages = path.stages.slice(first);
  const pulses = path.channel.pulse.shape === 'instant' ? [] : [path.pulse];
  const analogue = inSeries(stages.map((stage) => stage.response));
  const total = inSeries([...pulses, ...stages.map((stage) => stage.response)]);
  return { ...path, channel: withStages(path.channel, stages), stages, analogue, total };
}

/** The stages in front of an entrance as a path without an aperture; null where there are none. */
export function pathBefore(path: ChannelPath, enters: Entrance): ChannelPath | null {
  const first = firstStage(path, enters);
  if (first === 0) return null;
  const stages = path.stages.slice(0, first);
  const total = inSeries(stages.map((stage) => stage.response));
  const channel: Channel = { ...withStages(path.channel, stages), pulse: { shape: 'instant' } };
  return { ...path, channel, pulse: constantResponse(0), stages, analogue: total, total };
}

/** What the stages in front of an entrance do where a gain is measured from that of a wanted tone, which passes them. */
export interface Front {
  /** A path from the entrance with the tone's gain in front of it counted in. */
  behind(part: WorstPath): WorstPath;
  /** The front's gain at the channel's `reference`, dB, with the same parts. */
  readonly referenceDb: number;
}

/**
 * The front of an entrance. A level stated under `levels-at: input` holds at the source's own entrance; under `levels-at: sampler` it is
 * what the source would be at the sampler if it stood at `reference`, so it is divided by the gain there of the part of the path that it
 * passes, and of no stage that it does not.
 * @param toneHz the frequency that gains are measured from; null where the gain itself counts
 */
export function frontOf(before: ChannelPath | null, toneHz: number | null, at: 'nominal' | 'worst'): Front {
  if (before === null) return { behind: (part) => part, referenceDb: 0 };
  const { levelsAt, referenceHz } = before.channel;
  const plain = nominalPath(before, null);
  if (toneHz === null) return { behind: (part) => part, referenceDb: toDb(plain.response.logGain(referenceHz)) };
  if (levelsAt === 'sampler') {
    const ratio =
      at === 'nominal'
        ? nominalPath(before, toneHz)
        : worstPath(before, { sense: 'largest', referenceHz: toneHz, axis: 'hertz' });
    return { behind: (part) => behind(part, ratio, ratio.response.logGain(referenceHz), referenceHz), referenceDb: 0 };
  }
  const least = at === 'nominal' ? plain : worstPath(before, { sense: 'smallest', referenceHz: null, axis: 'hertz' });
  return {
    behind: (part) => behind(part, least, -least.response.logGain(toneHz), toneHz),
    referenceDb: toDb(least.response.logGain(referenceHz)),
  };
}

function behind(part: WorstPath, front: WorstPath, frontLog: number, frequencyHz: number): WorstPath {
  const deviations = front.worstAt(frequencyHz);
  return {
    // A null of the front at the tone has no ratio; the part's own gain is then what can be said.
    response: product([part.response, constantResponse(Number.isFinite(frontLog) ? frontLog : 0)]),
    gainLog: part.gainLog,
    cornersAt: (hz) => part.cornersAt(hz),
    worstAt: (hz) => joinWorst(deviations, part.worstAt(hz)),
  };
}

/** The index of the first stage that a source passes; the number of stages where it passes none. */
function firstStage(path: ChannelPath, enters: Entrance): number {
  if (enters === 'input') return 0;
  return enters === 'sampler' ? path.stages.length : enters.stage;
}

function withStages(channel: Channel, stages: readonly StagePath[]): Channel {
  return { ...channel, stages: stages.map((one) => one.stage) };
}
