/** The group delay of a path at its reference and how much it differs over the wanted bands. */
import { groupDelayResponse } from '../signal/group-delay-response';
import { inverse } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import type { Channel } from '../spec/channel';
import { pathDelay } from './channel-path';
import type { ChannelPath } from './channel-path';
import { atCorners, cornerSets } from './corners';
import { wantedRanges } from './source-range';

/** Delay in seconds at the reference at nominal values, the pulse's half width included, and the spread over the wanted bands. */
export interface Delay {
  readonly atReference: number;
  /** Largest minus smallest over the wanted bands, at the worst ends of the corners; null without a wanted band. */
  readonly spread: number | null;
  readonly evaluations: number;
}

/** The delay of a channel. */
export function delayOf(channel: Channel, path: ChannelPath): Delay {
  const atReference = pathDelay(path, channel.referenceHz);
  // A pulse delays every frequency alike, so only the stages spread.
  if (path.stages.length === 0 || channel.wanted.length === 0) {
    return { atReference, spread: channel.wanted.length === 0 ? null : 0, evaluations: 0 };
  }
  const spreads = cornerSets(path).map((corners) => spreadOf(channel, atCorners(path, corners)));
  return {
    atReference,
    spread: Math.max(...spreads.map((spread) => spread.seconds)),
    evaluations: spreads.reduce((sum, spread) => sum + spread.evaluations, 0),
  };
}

function spreadOf(channel: Channel, path: ChannelPath): { readonly seconds: number; readonly evaluations: number } {
  const delay = groupDelayResponse(path.stages.map((stage) => stage.filter));
  const bands = wantedRanges(channel);
  const most = largestOverBands(delay, bands);
  const least = largestOverBands(inverse(delay), bands);
  if (most === null || least === null) return { seconds: 0, evaluations: 0 };
  const seconds = Math.max(0, Math.exp(most.logGain) - Math.exp(-least.logGain));
  return { seconds, evaluations: most.evaluations + least.evaluations };
}
