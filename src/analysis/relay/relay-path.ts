/** A relay channel in its three parts: the filter before the sampling, what sampling makes of each copy, and the filter behind it. */
import type { Channel } from '../../spec/channel';
import { channelPath } from '../channel-path';
import type { ChannelPath } from '../channel-path';
import { relayWeights } from './weights';
import type { RelayWeights } from './weights';

/** The parts of a relay channel at one rate. */
export interface RelayPath {
  readonly channel: Channel;
  readonly rateHz: number;
  readonly weights: RelayWeights;
  /** The input filter alone, without a pulse. */
  readonly input: ChannelPath;
  /** The output filter alone, without a pulse. */
  readonly output: ChannelPath;
}

/** The parts of a relay channel, at its own rate unless another is given. */
export function relayPath(channel: Channel, rateHz = channel.rate.hz): RelayPath {
  return {
    channel,
    rateHz,
    weights: relayWeights(channel, rateHz),
    input: channelPath(sideAlone(channel, channel.inputStages), rateHz),
    output: channelPath(sideAlone(channel, channel.outputStages), rateHz),
  };
}

/** One filter of a relay as a path of its own, which captures: without a pulse, so that what leaves it is what is sampled. */
function sideAlone(channel: Channel, stages: Channel['stages']): Channel {
  return {
    ...channel,
    direction: 'capture',
    pulse: { shape: 'instant' },
    gate: null,
    stages,
    inputStages: stages,
    outputStages: [],
  };
}
