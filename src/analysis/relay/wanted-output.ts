/** What a relay makes of a wanted level stated at its sampler: the input filter against its own gain at `reference`, all else as it is. */
import { product } from '../../signal/response-algebra';
import type { Sense } from '../../signal/stretched';
import type { Channel } from '../../spec/channel';
import { channelPath } from '../channel-path';
import type { ChannelPath } from '../channel-path';
import { joinWorst } from '../tolerances';
import { nominalPath, worstPath } from '../worst-path';
import type { WorstPath } from '../worst-path';
import { relayPath } from './relay-path';

/** From the wanted level to the output, nominally (no sense) or at the largest or smallest of the tolerances. */
export function fromSampler(channel: Channel, sense: Sense | null): WorstPath {
  const { input } = relayPath(channel);
  const behind = channelPath({ ...channel, stages: channel.outputStages, inputStages: [] });
  const before = sideOf(input, sense, channel.referenceHz);
  const after = sideOf(behind, sense, null);
  return {
    response: product([before.response, after.response]),
    gainLog: after.gainLog,
    cornersAt: (frequencyHz) => [...before.cornersAt(frequencyHz), ...after.cornersAt(frequencyHz)],
    worstAt: (frequencyHz) => joinWorst(before.worstAt(frequencyHz), after.worstAt(frequencyHz)),
  };
}

function sideOf(side: ChannelPath, sense: Sense | null, referenceHz: number | null): WorstPath {
  return sense === null ? nominalPath(side, referenceHz) : worstPath(side, { sense, referenceHz, axis: 'hertz' });
}
