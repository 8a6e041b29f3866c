/** The group delay of a path at its reference and how much it differs over the wanted bands, nominally and at the worst of the tolerances. */
import type { Channel, Limit } from '../spec/channel';
import { pathDelay } from './channel-path';
import type { ChannelPath } from './channel-path';
import { atCorners, cornerSets, deviationsAt } from './corners';
import type { Corners } from './corners';
import { delaySpread } from './delay-spread';
import type { DelaySpread } from './delay-spread';
import type { WorstAt } from './figures';
import { wantedRanges } from './source-range';
import { deviation, joinWorst, rateLabel, rateRange, varies } from './tolerances';
import { wantedDelayCurve, wantedDelayMoves } from './wanted-delay-curve';
import { wantedDelaySeconds } from './wanted-pulse';
import { worstCorners } from './worst-corners';

/** A delay at its worst. */
export interface WorstDelay {
  readonly seconds: number;
  readonly nominalSeconds: number;
  readonly gapSeconds: number;
  readonly frequencyHz: number;
  readonly worstAt: WorstAt | null;
}

/** The delay of a channel's path. */
export interface Delay {
  /** In seconds at the reference at nominal values, the pulse's own included; null where a measured stage has no phase. */
  readonly atReference: number | null;
  /** Largest minus smallest over the wanted bands, at the worst ends of the corners; null without a wanted band, or where a table has no phase. */
  readonly spread: number | null;
  /** What a `delay` limit is held against; null without one, and where a table has no phase. */
  readonly worst: WorstDelay | null;
  /** What a `delay-spread` limit is held against; null without one, and as above. */
  readonly worstSpread: WorstDelay | null;
  readonly evaluations: number;
}

/** The limits that a channel's delay is held to; null where there is none. */
export interface DelayLimits {
  readonly delay: Limit | null;
  readonly spread: Limit | null;
}

/** The delay of a channel, its spread looked for once it is asked for; a limit of the spread makes its search as fine as the limit asks, without one a thousandth of the delay does. */
export function delayOf(channel: Channel, path: ChannelPath, limits: DelayLimits): Delay {
  const atReference = pathDelay(path, channel.referenceHz);
  const judged = limits.spread === null ? null : spreadOf(channel, path, limits.spread);
  let asked: { readonly spread: Spread | null } | null = limits.spread === null ? null : { spread: judged };
  return {
    atReference,
    // Its search is a third of an analysis, and only a result or a plot asks for it where no limit does.
    get spread() {
      asked ??= { spread: spreadOf(channel, path, null) };
      return asked.spread?.reachedSeconds ?? null;
    },
    worst: atReference === null || limits.delay === null ? null : worstDelay(channel, path, atReference),
    worstSpread: judged?.judged ?? null,
    evaluations: judged?.evaluations ?? 0,
  };
}

/** The stages' delays and the pulse's move by themselves, so each is taken at its own largest. */
function worstDelay(channel: Channel, path: ChannelPath, nominalSeconds: number): WorstDelay {
  const { referenceHz, rate } = channel;
  const corners = worstCorners(path, [], (tried) => pathDelay(atCorners(path, tried), referenceHz) ?? -Infinity);
  const stages = pathDelay(atCorners(path, corners), referenceHz) ?? nominalSeconds;
  const pulseAt = (rateHz: number): number => wantedDelaySeconds(channel, rateHz, referenceHz);
  const slowest = rateEnds(channel).reduce((worst, hz) => (pulseAt(hz) > pulseAt(worst) ? hz : worst), rate.hz);
  return {
    seconds: Math.max(stages - pulseAt(rate.hz) + pulseAt(slowest), nominalSeconds),
    nominalSeconds,
    gapSeconds: 0,
    frequencyHz: referenceHz,
    worstAt: joinWorst(deviationsAt(path, corners), rateDeviation(channel, slowest)),
  };
}

interface Spread {
  readonly reachedSeconds: number;
  readonly judged: WorstDelay;
  readonly evaluations: number;
}

/** How much of the limit its search may leave open. */
const openShare = 1e-3;

/** The spread at every end of the corners, with a limit also between them, and at the ends of the rate where the worst of these is. */
function spreadOf(channel: Channel, path: ChannelPath, limit: Limit | null): Spread | null {
  if (channel.wanted.length === 0) return null;
  const bands = wantedRanges(channel);
  const at = (corners: Corners, rateHz: number, withinSeconds: number | null): readonly Found[] => {
    const { stages } = atCorners(path, corners);
    const spread = delaySpread({ stages, pulse: wantedDelayCurve(channel, rateHz, bands), bands, withinSeconds });
    return spread === null ? [] : [{ corners, rateHz, spread }];
  };
  const { hz } = channel.rate;
  const within = limit === null ? null : limit.at * openShare;
  const ends = cornerSets(path);
  const between = limit === null ? [] : [worstCorners(path, [], (tried) => at(tried, hz, null)[0]?.spread.reachedSeconds ?? 0)];
  const found = [...ends, ...between.filter((corners) => !ends.includes(corners))].flatMap((corners) => at(corners, hz, within));
  const [nominal] = found;
  if (nominal === undefined) return null;
  const worst = largestOf(found, nominal);
  // A pulse that delays every frequency alike has no part in the spread, whatever the rate.
  const rates = wantedDelayCurve(channel, hz, bands) === null ? [] : rateEnds(channel).slice(1);
  return worstOf(channel, path, nominal, [...found, ...rates.flatMap((rateHz) => at(worst.corners, rateHz, within))]);
}

function largestOf(found: readonly Found[], nominal: Found): Found {
  return found.reduce((best, one) => (one.spread.seconds > best.spread.seconds ? one : best), nominal);
}

interface Found {
  readonly corners: Corners;
  readonly rateHz: number;
  readonly spread: DelaySpread;
}

function worstOf(channel: Channel, path: ChannelPath, nominal: Found, found: readonly Found[]): Spread {
  const worst = largestOf(found, nominal);
  const moves = found.some(({ rateHz }) => rateHz !== channel.rate.hz);
  return {
    reachedSeconds: Math.max(...found.map(({ spread }) => spread.reachedSeconds)),
    judged: {
      seconds: worst.spread.seconds,
      nominalSeconds: nominal.spread.seconds,
      gapSeconds: worst.spread.seconds - worst.spread.reachedSeconds,
      frequencyHz: worst.spread.atHz,
      worstAt: joinWorst(deviationsAt(path, worst.corners), moves ? rateDeviation(channel, worst.rateHz) : null),
    },
    evaluations: found.reduce((sum, { spread }) => sum + spread.evaluations, 0),
  };
}

/** The rates at which a pulse is looked at, nominal first: only one whose length moves with the clock has more than one. */
function rateEnds(channel: Channel): readonly number[] {
  const { rate } = channel;
  if (!varies(rate.tolerance) || !wantedDelayMoves(channel)) return [rate.hz];
  const { low, high } = rateRange(rate);
  return [rate.hz, low, high];
}

function rateDeviation(channel: Channel, rateHz: number): WorstAt | null {
  const { rate } = channel;
  const moves = varies(rate.tolerance) && wantedDelayMoves(channel);
  return moves ? { [rateLabel(rate)]: deviation(rateHz / rate.hz, rate.tolerance) } : null;
}
