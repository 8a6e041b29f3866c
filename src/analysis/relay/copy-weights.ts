/** How much weaker than the wanted path each copy leaves the sampling, before any filter acts. */
import type { Channel } from '../../spec/channel';
import { reportedFolds } from '../copies';
import { relayWeights, weightResponse } from './weights';

/**
 * |c_k|/c_0 for k = 0 … 8; null without a gate. A pulsed gate weighs the whole of copy k alike; of a track and hold it is the stronger of
 * the two copies, at k·rate ± f, of a tone at the channel's `reference` against that tone's own output.
 */
export function copyWeights(channel: Channel): readonly number[] | null {
  if (channel.gate === null) return null;
  const rateHz = channel.rate.hz;
  const weights = relayWeights(channel, rateHz);
  const { referenceHz } = channel;
  const at = (copy: number, outputHz: number): number => weightResponse(weights.copy(copy)).logGain(outputHz);
  const wanted = at(0, referenceHz);
  return Array.from({ length: reportedFolds + 1 }, (_, k) => {
    if (k === 0) return 1;
    const upper = at(k, referenceHz + k * rateHz);
    const below = referenceHz - k * rateHz;
    const lower = below < 0 ? at(k, -below) : at(-k, below);
    return Math.exp(Math.max(upper, lower) - wanted);
  });
}
