/** The group delay of a path at its reference and how much it differs over the wanted bands. */
import { groupDelayResponse } from '../signal/group-delay-response';
import { inverse } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import type { Channel } from '../spec/channel';
import { pathDelay } from './channel-path';
import type { ChannelPath } from './channel-path';
import { wantedRanges } from './source-range';

/** Delay in seconds at the reference, the pulse's half width included, and the spread over the wanted bands. */
export interface Delay {
  readonly atReference: number;
  /** Largest minus smallest over the wanted bands; null without a wanted band. */
  readonly spread: number | null;
  readonly evaluations: number;
}

/** The delay of a channel at nominal values. */
export function delayOf(channel: Channel, path: ChannelPath): Delay {
  const atReference = pathDelay(path, channel.referenceHz);
  // A pulse delays every frequency alike, so only the stages spread.
  if (path.stages.length === 0) return { atReference, spread: channel.wanted.length === 0 ? null : 0, evaluations: 0 };
  const delay = groupDelayResponse(path.stages.map((stage) => stage.filter));
  const bands = wantedRanges(channel);
  const most = largestOverBands(delay, bands);
  const least = largestOverBands(inverse(delay), bands);
  if (most === null || least === null) return { atReference, spread: null, evaluations: 0 };
  return {
    atReference,
    spread: Math.max(0, Math.exp(most.logGain) - Math.exp(-least.logGain)),
    evaluations: most.evaluations + least.evaluations,
  };
}
