/** The assumptions that a relay channel is searched under: nominal values, and what the tolerances of parts and clock make of them. */
import type { Enclosure } from '../../signal/response';
import type { Channel } from '../../spec/channel';
import { onAxis } from '../axis';
import type { ChannelPath } from '../channel-path';
import { intersection } from '../intervals';
import { followsRate } from '../pulse';
import type { Sense } from '../../signal/stretched';
import { deviation, partsVary, rateLabel, rateRange, varies } from '../tolerances';
import type { WorstAt } from '../figures';
import { nominalPath, worstPath } from '../worst-path';
import type { WorstPath } from '../worst-path';
import { relayPath } from './relay-path';
import type { RelayPath } from './relay-path';

/** One set of assumptions. Frequencies are multiples of the rate, written at its nominal value, where the clock is among what may deviate. */
export interface RelayView {
  readonly parts: 'nominal' | 'worst';
  readonly relay: RelayPath;
  /** The channel with the rate of this view; its clock's tolerance is still there where one search covers it. */
  readonly channel: Channel;
}

/** The views of a channel. */
export interface RelayViews {
  readonly nominal: RelayView;
  /** The worst of all of them counts; the nominal view alone where nothing varies. */
  readonly worst: readonly RelayView[];
}

/**
 * A pulse that follows the rate is the same at every rate when frequencies are counted in periods, so one search covers the clock's
 * tolerance, with every frequency of the spec widened by it; a pulse of fixed width is looked at with the clock at nominal and at either end.
 */
export function relayViews(channel: Channel): RelayViews {
  const nominal: RelayView = { parts: 'nominal', relay: relayPath(channel), channel };
  if (!partsVary(channel)) return { nominal, worst: [nominal] };
  if (!varies(channel.rate.tolerance) || samplingFollows(channel)) {
    return { nominal, worst: [{ parts: 'worst', relay: nominal.relay, channel }] };
  }
  const { low, high } = rateRange(channel.rate);
  const worst = [channel.rate.hz, low, high].map((hz): RelayView => {
    const moved = { ...channel, rate: { ...channel.rate, hz, tolerance: { low: 0, high: 0 } } };
    return { parts: 'worst', relay: relayPath(moved), channel: moved };
  });
  return { nominal, worst };
}

/** A range of frequencies of the spec as a view counts them. */
export function inView(view: RelayView, range: Enclosure): Enclosure {
  return view.parts === 'nominal' ? range : onAxis(view.channel, 'periods', range);
}

/** Where something both arrives and leaves, as a view counts it. Bands that only touch share nothing: one may begin where another ends. */
export function staysIn(view: RelayView, arrives: readonly Enclosure[], leaves: readonly Enclosure[]): readonly Enclosure[] {
  const isWide = ({ low, high }: Enclosure): boolean => low < high;
  return arrives.flatMap((one) =>
    leaves.flatMap((other) =>
      intersection([one], [other])
        .filter((shared) => isWide(shared) || !isWide(one) || !isWide(other))
        .map((shared) => inView(view, shared)),
    ),
  );
}

/** One side of a relay at its nominal or worst gain. */
export function sideOf(view: RelayView, side: ChannelPath, sense: Sense, referenceHz: number | null): WorstPath {
  return view.parts === 'nominal' ? nominalPath(side, referenceHz) : worstPath(side, { sense, referenceHz, axis: 'periods' });
}

/** The rate at which every one of some frequencies lies in its range, over the view's own: 1 where it does, else an end of the clock. */
export function rateScale(
  view: RelayView,
  places: readonly { readonly frequencyHz: number; readonly range: readonly Enclosure[] }[],
): number {
  const { rate } = view.channel;
  const { low, high } = rateRange(rate);
  const fits = (scale: number): boolean =>
    places.every(({ frequencyHz, range }) =>
      range.some((one) => one.low * (1 - 1e-12) <= frequencyHz * scale && frequencyHz * scale <= one.high * (1 + 1e-12)),
    );
  return [1, low / rate.hz, high / rate.hz].find(fits) ?? 1;
}

/** How far the rate of a point deviates, by the clock's label; null where it cannot. */
export function rateDeviation(channel: Channel, rateHz: number): WorstAt | null {
  const { rate } = channel;
  return varies(rate.tolerance) ? { [rateLabel(rate)]: deviation(rateHz / rate.hz, rate.tolerance) } : null;
}

/** Whether gate or hold follow the rate. */
function samplingFollows({ pulse, gate }: Channel): boolean {
  if (gate === null) return followsRate(pulse) || pulse.shape === 'instant';
  return gate.kind === 'pulse' ? followsRate(gate.pulse) : 'share' in gate.track;
}
