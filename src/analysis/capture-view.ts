/** What a capture channel's landings are searched with: its path and landing set at nominal values and at the worst of the tolerances. */
import type { Enclosure, Response } from '../signal/response';
import { constantResponse, product } from '../signal/response-algebra';
import type { Channel, Source } from '../spec/channel';
import { channelPath, withPulse } from './channel-path';
import type { ChannelPath } from './channel-path';
import { toDb } from './decibels';
import { landingSet } from './landing-set';
import type { LandingSet } from './landing-set';
import { wholePulse } from './pulse';
import { outsideWanted } from './source-range';
import { partsVary, rateRange, varies } from './tolerances';
import { axisFactors, bandAxis, nominalPath, worstPath } from './worst-path';
import type { Axis, WorstPath } from './worst-path';

/** One set of assumptions: where landings come from and what the path does to them. */
export interface View {
  readonly axis: Axis;
  readonly rateHz: Enclosure;
  readonly set: LandingSet;
  readonly worst: WorstPath;
  /** The same gain as a part at k·rate ± x, k ≥ 1, and a part at x, where the aperture lasts whole periods of an exact rate. */
  readonly split: SplitGain | null;
}

/** A gain over folds in two parts. */
export interface SplitGain {
  readonly outer: Response;
  readonly inner: Response;
}

/** A capture channel, ready to be asked for landings. */
export interface CaptureView {
  readonly channel: Channel;
  readonly path: ChannelPath;
  /** The frequency that gains are measured from; null where the gain itself counts. */
  readonly referenceHz: number | null;
  readonly nominal: View;
  /** The same object as `nominal` where nothing varies. */
  readonly worst: View;
  /** For sources that may stand anywhere in a band, where the aperture follows a rate that varies; else the same object as `worst`. */
  readonly worstOfBands: View;
}

/** The views of a channel, with gains measured from a frequency or as they are. */
export function captureView(channel: Channel, referenceHz: number | null): CaptureView {
  const path = channelPath(channel);
  const rate = channel.rate.hz;
  const exact = { low: rate, high: rate };
  const ranges = channel.wanted.map((band) => ({ low: band.lowHz, high: band.highHz }));
  const protect = channel.protect?.map((band) => ({ low: band.lowHz, high: band.highHz })) ?? null;
  const setFor = (rateHz: Enclosure, factors: Enclosure): LandingSet =>
    landingSet({ rateHz, wanted: widened(ranges, factors), protect: protect === null ? null : widened(protect, factors) });
  const plain = nominalPath(path, referenceHz);
  const split = splitGain(path, referenceHz, (bare) => nominalPath(bare, referenceHz));
  const nominal: View = { axis: 'hertz', rateHz: exact, set: setFor(exact, unity), worst: plain, split };
  if (!partsVary(channel)) return { channel, path, referenceHz, nominal, worst: nominal, worstOfBands: nominal };
  const rateHz = rateRange(channel.rate);
  const clockVaries = varies(channel.rate.tolerance);
  const worstOn = (axis: Axis, set: LandingSet, rates: Enclosure): View => {
    const worst = (one: ChannelPath): WorstPath => worstPath(one, { sense: 'largest', referenceHz, axis });
    const parts = rates.low === rates.high ? splitGain(path, referenceHz, worst) : null;
    return { axis, rateHz: rates, set, worst: worst(path), split: parts };
  };
  const worst = worstOn('hertz', clockVaries ? setFor(rateHz, unity) : nominal.set, rateHz);
  if (bandAxis(channel) === 'hertz') return { channel, path, referenceHz, nominal, worst, worstOfBands: worst };
  const set = setFor(exact, axisFactors(channel).periods);
  return { channel, path, referenceHz, nominal, worst, worstOfBands: worstOn('periods', set, exact) };
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

/** Where a source may stand, outside the wanted bands, on a view's axis. */
export function sourceWithin(view: View, channel: Channel, source: Source): readonly Enclosure[] {
  const outside = outsideWanted(channel, source);
  return view.axis === 'hertz' ? outside : widened(outside, axisFactors(channel).periods);
}

/** Gain in dB at a frequency with given corner factors, without the stages' gain tolerance. */
export function gainWithCornersDb(path: ChannelPath, frequencyHz: number, corners: readonly number[]): number {
  const stages = path.stages.reduce(
    (sum, stage, index) => sum + stage.response.logGain(frequencyHz / (corners[index] ?? 1)),
    path.pulse.logGain(frequencyHz),
  );
  return toDb(stages);
}

const unity: Enclosure = { low: 1, high: 1 };

function widened(ranges: readonly Enclosure[], factors: Enclosure): readonly Enclosure[] {
  return ranges.map((range) => ({ low: range.low * factors.low, high: range.high * factors.high }));
}
