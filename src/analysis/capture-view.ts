/** What a capture channel's landings are searched with: its path and landing set at nominal values and at the worst of the tolerances. */
import type { Enclosure, Response } from '../signal/response';
import { constantResponse, product } from '../signal/response-algebra';
import { stretched } from '../signal/stretched';
import type { Channel, Entrance } from '../spec/channel';
import type { Arrival } from './arrivals';
import { axisFactors, bandAxis, type Axis } from './axis';
import { channelPath, withPulse } from './channel-path';
import type { ChannelPath } from './channel-path';
import type { Corners } from './corners';
import { gainAtSetting } from './stage-setting';
import { toDb } from './decibels';
import { frontOf, pathBefore, pathFrom } from './entrance';
import type { Front } from './entrance';
import { without } from './intervals';
import { landingSet } from './landing-set';
import type { LandingSet } from './landing-set';
import { wholePulse } from './whole-pulse';
import { wantedRanges } from './source-range';
import { partsVary, rateRange, varies } from './tolerances';
import { nominalPath, worstPath } from './worst-path';
import type { WorstPath } from './worst-path';

/** One set of assumptions: where landings come from and what the path does to them. */
export interface View {
  readonly axis: Axis;
  readonly rateHz: Enclosure;
  readonly set: LandingSet;
  readonly worst: WorstPath;
  /** The same gain as a part at k·rate ± x, k ≥ 1, and a part at x, where the aperture lasts whole periods of an exact rate. */
  readonly split: SplitGain | null;
  /** The gain at `reference` of the stages in front of the entrance, which only the wanted tone passes; dB. */
  readonly frontDb: number;
}

/** A gain over folds in two parts. */
export interface SplitGain {
  readonly outer: Response;
  readonly inner: Response;
}

/** A capture channel, ready to be asked for landings of what enters at one place. */
export interface CaptureView {
  readonly channel: Channel;
  /** The path from that place on. */
  readonly path: ChannelPath;
  /** The frequency that gains are measured from; null where the gain itself counts. */
  readonly referenceHz: number | null;
  readonly nominal: View;
  /** The same object as `nominal` where nothing varies. */
  readonly worst: View;
  /** For sources that may stand anywhere in a band, where the aperture follows a rate that varies; else the same object as `worst`. */
  readonly worstOfBands: View;
}

/** The views of a channel for what enters at a place, with gains measured from a frequency or as they are. */
export function captureView(channel: Channel, referenceHz: number | null, enters: Entrance = 'input'): CaptureView {
  const whole = channelPath(channel);
  const path = pathFrom(whole, enters);
  const before = pathBefore(whole, enters);
  const rate = channel.rate.hz;
  const exact = { low: rate, high: rate };
  const ranges = wantedRanges(channel);
  const protect = channel.protect?.map((band) => ({ low: band.lowHz, high: band.highHz })) ?? null;
  const setFor = (rateHz: Enclosure, factors: Enclosure): LandingSet =>
    landingSet({ rateHz, wanted: widened(ranges, factors), protect: protect === null ? null : widened(protect, factors) });
  const viewOn = (
    { axis, rateHz, set }: Pick<View, 'axis' | 'rateHz' | 'set'>,
    front: Front,
    gainOf: (one: ChannelPath) => WorstPath,
  ): View => {
    const worst = front.behind(gainOf(path));
    const split = rateHz.low === rateHz.high ? splitGain(path, referenceHz, (bare) => front.behind(gainOf(bare))) : null;
    return { axis, rateHz, set, worst, split, frontDb: front.referenceDb };
  };
  const plain = (one: ChannelPath): WorstPath => nominalPath(one, referenceHz);
  const nominalSet = setFor(exact, unity);
  const nominal = viewOn({ axis: 'hertz', rateHz: exact, set: nominalSet }, frontOf(before, referenceHz, 'nominal'), plain);
  // A stage that the source does not pass moves nothing, unless the tone that it is measured against passes it.
  if (!partsVary(referenceHz === null ? path.channel : channel)) {
    return { channel, path, referenceHz, nominal, worst: nominal, worstOfBands: nominal };
  }
  const front = frontOf(before, referenceHz, 'worst');
  const worstOn = (axis: Axis, set: LandingSet, rateHz: Enclosure): View =>
    viewOn({ axis, rateHz, set }, front, (one) => worstPath(one, { sense: 'largest', referenceHz, axis }));
  const rateHz = rateRange(channel.rate);
  const worst = worstOn('hertz', varies(channel.rate.tolerance) ? setFor(rateHz, unity) : nominalSet, rateHz);
  if (bandAxis(channel) === 'hertz') return { channel, path, referenceHz, nominal, worst, worstOfBands: worst };
  const set = setFor(exact, axisFactors(channel).periods);
  return { channel, path, referenceHz, nominal, worst, worstOfBands: worstOn('periods', set, exact) };
}

/** The views from each place that something enters at, each made once. */
export function captureViews(channel: Channel, referenceHz: number | null): (enters: Entrance) => CaptureView {
  const views = new Map<string | number, CaptureView>();
  return (enters) => {
    const place = typeof enters === 'object' ? enters.stage : enters;
    const view = views.get(place) ?? captureView(channel, referenceHz, enters);
    views.set(place, view);
    return view;
  };
}

/** The gain of all but the pulse, with the pulse's two parts; measured from the reference as the whole is. */
function splitGain(path: ChannelPath, referenceHz: number | null, gainOf: (bare: ChannelPath) => WorstPath): SplitGain | null {
  const whole = wholePulse(path.channel, path.rateHz);
  const reference = referenceHz === null ? 0 : path.pulse.logGain(referenceHz);
  if (whole === null || !Number.isFinite(reference)) return null;
  const bare: ChannelPath = {
    ...withPulse(path, constantResponse(0)),
    channel: { ...path.channel, pulse: { shape: 'instant' } },
  };
  return { outer: product([whole.envelope, constantResponse(-reference), gainOf(bare).response]), inner: whole.ripple };
}

/** Where a tone of a source may stand, outside the wanted bands, on a view's axis. */
export function arrivesWithin(view: View, channel: Channel, { range }: Arrival): readonly Enclosure[] {
  const outside = without([range], wantedRanges(channel));
  return view.axis === 'hertz' ? outside : widened(outside, axisFactors(channel).periods);
}

/** How far a tone's level lies below its stated one over a view's axis; null where it is the same everywhere. */
export function envelopeOn(view: View, channel: Channel, { envelope }: Arrival): Response | null {
  if (envelope === null || view.axis === 'hertz') return envelope;
  return stretched(envelope, axisFactors(channel).periods, 'largest');
}

/** Gain in dB at a frequency with given corner factors, without the stages' gain tolerance. */
export function gainWithCornersDb(path: ChannelPath, frequencyHz: number, corners: Corners): number {
  const stages = path.stages.reduce(
    (sum, stage, index) => sum + gainAtSetting(stage, corners[index] ?? 1, frequencyHz),
    path.pulse.logGain(frequencyHz),
  );
  return toDb(stages);
}

const unity: Enclosure = { low: 1, high: 1 };

function widened(ranges: readonly Enclosure[], factors: Enclosure): readonly Enclosure[] {
  return ranges.map((range) => ({ low: range.low * factors.low, high: range.high * factors.high }));
}
