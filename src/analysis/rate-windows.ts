/** The table of rates that keep every wanted band whole and apart from the others, with guards and the clock's tolerance taken off. */
import { rateWindow, zoneCount, zoneOf } from '../signal/folding';
import type { Enclosure } from '../signal/response';
import type { Band, Channel } from '../spec/channel';
import { apart } from './rate-meetings';
import type { RateWindow } from './rate-meetings';
import { factorsOf } from './tolerances';
import { guarded } from './wanted';

export type { RateWindow } from './rate-meetings';

/** The windows of a channel, rising in rate. */
export interface RateTable {
  readonly windows: readonly RateWindow[];
  /** How many zones of the highest band were not looked at, since they lie further from the present rate than the others. */
  readonly leftOff: number;
}

/** Zones that are looked at unless a caller wants fewer. */
const usualZones = 400;

/** Bounds that differ by no more than this are one. */
const slack = 1e-12;

/**
 * The rates that keep all wanted bands whole: for one band 2·high/n ≤ rate ≤ 2·low/(n − 1), n = 1 … floor(high/(high − low)); for several
 * what they have in common, less the rates at which two of them meet after folding.
 * @param mostZones how many zones of the highest band are looked at, those around the present rate
 */
export function rateWindowsOf(channel: Channel, mostZones = usualZones): RateTable {
  const bands = channel.wanted.map((band) => widened(channel, band));
  if (bands.length === 0 || bands.some((band) => band.high === Infinity)) return { windows: [], leftOff: 0 };
  const highest = bands.reduce((top, band, index) => (band.high > (bands[top]?.high ?? 0) ? index : top), 0);
  const { cells, leftOff } = highestWindows(bands[highest] ?? noBand, channel.rate.hz, mostZones);
  const whole = bands.reduce<readonly Cell[]>(
    (found, band, index) => (index === highest ? found : common(found, windowsWithin(band, reachOf(found)), index)),
    cells.map(({ low, high, zone }) => ({ low, high, zones: bands.map((_, index) => (index === highest ? zone : 0)) })),
  );
  return { windows: apart(channel, whole), leftOff };
}

/** The window around the present rate; where it is in none, the one that keeps each band in its present zone, or null. */
export function windowAround(channel: Channel): Enclosure | null {
  const { windows } = rateWindowsOf(channel, nearZones);
  const rate = channel.rate.hz;
  const around = windows.find(({ low, high }) => low * (1 - slack) <= rate && rate <= high * (1 + slack));
  const zones = channel.wanted.map((band) => zoneOf(band.lowHz, rate));
  const found = around ?? windows.find((window) => window.zones.every((zone, index) => zone === zones[index])) ?? null;
  return found === null ? null : { low: found.low, high: found.high };
}

/** The zones next to the present one. */
const nearZones = 3;

/** A window while it is being made; `zones` has 0 for bands that have not been looked at. */
type Cell = RateWindow;

const noBand: Enclosure = { low: 0, high: Infinity };

/** A band with its guard, and as much wider as the clock may be off: its windows are then those of nominal rates. */
function widened(channel: Channel, band: Band): Enclosure {
  const { lowHz, highHz } = guarded(channel, band);
  const clock = factorsOf(channel.rate.tolerance);
  return { low: lowHz / clock.high, high: highHz / clock.low };
}

type ZoneWindow = Enclosure & { readonly zone: number };

/** The windows of the band that has the most of them, around the zone of a rate, rising in rate. */
function highestWindows(
  band: Enclosure,
  rateHz: number,
  most: number,
): { readonly cells: readonly ZoneWindow[]; readonly leftOff: number } {
  const count = zonesOf(band);
  const present = Math.min(zoneOf(band.low, rateHz), count);
  const last = Math.min(count, Math.max(present + Math.floor(most / 2), most));
  const first = Math.max(1, last - most + 1);
  return { cells: zoneWindows(band, first, last), leftOff: count - (last - first + 1) };
}

/** The windows of a band that reach into a range of rates, rising in rate. */
function windowsWithin(band: Enclosure, rates: Enclosure): readonly ZoneWindow[] {
  const first = Math.max(1, Math.ceil(((2 * band.high) / rates.high) * (1 - slack)));
  const last = Math.min(zonesOf(band), Math.floor(((2 * band.low) / rates.low) * (1 + slack)) + 1);
  return zoneWindows(band, first, last);
}

function zoneWindows({ low, high }: Enclosure, first: number, last: number): readonly ZoneWindow[] {
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => {
    const window = rateWindow(low, high, last - index);
    return { low: window.lowHz, high: window.highHz, zone: window.zone };
  });
}

/** A band without any width stays whole everywhere. */
function zonesOf({ low, high }: Enclosure): number {
  return low < high ? zoneCount(low, high) : Number.MAX_SAFE_INTEGER;
}

function reachOf(cells: readonly Cell[]): Enclosure {
  return { low: cells[0]?.low ?? Infinity, high: cells.at(-1)?.high ?? Infinity };
}

/** The rates that two rising rows of windows have in common. */
function common(cells: readonly Cell[], windows: readonly ZoneWindow[], index: number): readonly Cell[] {
  const found: Cell[] = [];
  let at = 0;
  for (const cell of cells) {
    while (at < windows.length && (windows[at]?.high ?? Infinity) < cell.low * (1 - slack)) at += 1;
    for (let next = at; next < windows.length; next += 1) {
      const window = windows[next];
      if (window === undefined || window.low > cell.high * (1 + slack)) break;
      const low = Math.max(cell.low, window.low);
      found.push({ low, high: Math.max(low, Math.min(cell.high, window.high)), zones: cell.zones.with(index, window.zone) });
    }
  }
  return found;
}
