/** Takes from windows of rates those at which two wanted bands, each whole, come out on top of each other. */
import type { Enclosure } from '../signal/response';
import type { Band, Channel } from '../spec/channel';
import { intersection } from './intervals';
import { factorsOf } from './tolerances';
import { guarded } from './wanted';

/** Rates between two bounds, at any of which each wanted band stays in its zone and clear of the others. */
export interface RateWindow {
  /** Nominal rates in Hz; `high` is Infinity where every band is in zone 1. */
  readonly low: number;
  readonly high: number;
  /** The zone of each wanted band, in the channel's order; even zones come out inverted. */
  readonly zones: readonly number[];
}

/** The parts of each window in which all bands appear one beside the other, in the same order at every rate of the clock. */
export function apart(channel: Channel, windows: readonly RateWindow[]): readonly RateWindow[] {
  const bands = channel.wanted.map((band) => guarded(channel, band));
  const clock = factorsOf(channel.rate.tolerance);
  return windows.flatMap(({ low, high, zones }) => {
    const places = bands.map((band, index) => placeOf(band, zones[index] ?? 1));
    return apartWithin({ low, high }, places, clock).map((part) => ({ low: part.low, high: part.high, zones }));
  });
}

/** An edge of a band after folding, as it moves with the rate: `atZero` + `slope`·rate. */
interface Edge {
  readonly atZero: number;
  readonly slope: number;
}

/** Where a band appears as long as it stays in one zone. */
interface Appearance {
  readonly lower: Edge;
  readonly upper: Edge;
}

/** In zone n the band is folded about m = floor(n/2) times the rate: f − m·rate in odd zones, m·rate − f in even ones. */
function placeOf({ lowHz, highHz }: Band, zone: number): Appearance {
  const fold = Math.floor(zone / 2);
  return zone % 2 === 0
    ? { lower: { atZero: -highHz, slope: fold }, upper: { atZero: -lowHz, slope: fold } }
    : { lower: { atZero: lowHz, slope: -fold }, upper: { atZero: highHz, slope: -fold } };
}

function apartWithin(window: Enclosure, places: readonly Appearance[], clock: Enclosure): readonly Enclosure[] {
  let parts: readonly Enclosure[] = [window];
  for (const [index, one] of places.entries()) {
    for (const other of places.slice(0, index)) {
      if (parts.length === 0) return [];
      parts = intersection(parts, [...ratesBelow(one, other, clock), ...ratesBelow(other, one, clock)]);
    }
  }
  return parts;
}

/** Edges that miss each other by no more than this, relative to the band, touch: that is allowed. */
const slack = 1e-12;

/** The nominal rates at which one band ends below the start of another, at either end of the clock; at most one interval. */
function ratesBelow({ upper }: Appearance, { lower }: Appearance, clock: Enclosure): readonly Enclosure[] {
  const slope = upper.slope - lower.slope;
  const atZero = upper.atZero - lower.atZero;
  const touching = slack * Math.max(Math.abs(upper.atZero), Math.abs(lower.atZero));
  if (slope === 0) return atZero <= touching ? [{ low: 0, high: Infinity }] : [];
  const meet = -atZero / slope;
  if (slope > 0) return meet > 0 ? [{ low: 0, high: meet / clock.high }] : [];
  return [{ low: Math.max(0, meet / clock.low), high: Infinity }];
}
