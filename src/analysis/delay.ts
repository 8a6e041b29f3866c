/** The group delay of a path at its reference and how much it differs over the wanted bands. */
import type { Channel } from '../spec/channel';
import { pathDelay } from './channel-path';
import type { ChannelPath } from './channel-path';
import { atCorners, cornerSets } from './corners';
import { delaySpread } from './delay-spread';
import { wantedRanges } from './source-range';

/** The delay of a channel's path. */
export interface Delay {
  /** In seconds at the reference at nominal values, the pulse's own included; null where a measured stage has no phase. */
  readonly atReference: number | null;
  /** Largest minus smallest over the wanted bands, at the worst ends of the corners; null without a wanted band, or where a table has no phase. */
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
  const bands = wantedRanges(channel);
  const spreads = cornerSets(path).map((corners) => delaySpread(atCorners(path, corners).stages, bands));
  const known = spreads.flatMap((spread) => spread ?? []);
  return {
    atReference,
    spread: known.length < spreads.length ? null : Math.max(...known.map((spread) => spread.seconds)),
    evaluations: known.reduce((sum, spread) => sum + spread.evaluations, 0),
  };
}
