/** Where a worst case stands in plain terms: the input frequency, where it lands, about which fold, and at which rate. */
import { foldFrequency } from '../signal/folding';
import type { Landing } from '../signal/folding';
import type { Enclosure } from '../signal/response';
import type { Channel } from '../spec/channel';
import type { View } from './capture-view';
import { contains } from './intervals';
import { rateRange, varies } from './tolerances';
import { appearance } from './wanted';

/** A landing with the rate that makes it. */
export interface LandingPoint {
  readonly frequencyHz: number;
  /** Null where the frequency is infinite. */
  readonly landing: Landing | null;
  readonly rateHz: number;
}

/** The point that a search reached: the nominal rate where it lands there too, else the allowed rate at which it does. */
export function landingPoint(channel: Channel, view: View, foundHz: number, within: readonly Enclosure[]): LandingPoint {
  const nominal = channel.rate.hz;
  if (foundHz === Infinity) return { frequencyHz: Infinity, landing: null, rateHz: nominal };
  if (!varies(channel.rate.tolerance)) return pointAt(foundHz, nominal);
  const scale = view.axis === 'periods' ? 1 / nominal : 0;
  const candidates = ratesFor(channel, foundHz).map((rateHz) =>
    pointAt(scale === 0 ? foundHz : foundHz * rateHz * scale, rateHz),
  );
  const fits = candidates.find(
    (point) => (view.axis === 'hertz' || contains(within, point.frequencyHz)) && landsProtected(channel, point),
  );
  return fits ?? pointAt(foundHz, nominal);
}

function pointAt(frequencyHz: number, rateHz: number): LandingPoint {
  return { frequencyHz, landing: foldFrequency(frequencyHz, rateHz), rateHz };
}

/** The nominal rate, the ends, and the rates that put the frequency in the middle of a protected range. */
function ratesFor(channel: Channel, frequencyHz: number): readonly number[] {
  const { low, high } = rateRange(channel.rate);
  const middles = protectedAt(channel, channel.rate.hz).map((range) => (range.low + range.high) / 2);
  const fold = Math.max(1, Math.round(frequencyHz / channel.rate.hz));
  const solved = [fold - 1, fold, fold + 1]
    .filter((multiple) => multiple >= 1)
    .flatMap((multiple) => middles.flatMap((middle) => [(frequencyHz - middle) / multiple, (frequencyHz + middle) / multiple]));
  return [channel.rate.hz, high, low, ...solved.filter((rate) => low < rate && rate < high)];
}

function landsProtected(channel: Channel, point: LandingPoint): boolean {
  const slack = 1e-9 * point.rateHz;
  const { landing } = point;
  return (
    landing !== null &&
    protectedAt(channel, point.rateHz).some(
      (range) => range.low - slack <= landing.landsHz && landing.landsHz <= range.high + slack,
    )
  );
}

/** The protected ranges at a rate: as stated, or the wanted bands where they then appear (capture) or leave. */
export function protectedAt(channel: Channel, rateHz: number): readonly Enclosure[] {
  if (channel.protect !== null) return channel.protect.map((range) => ({ low: range.lowHz, high: range.highHz }));
  return channel.wanted.map((band) =>
    channel.direction !== 'capture' ? { low: band.lowHz, high: band.highHz } : appearance(band, rateHz),
  );
}
