/** Where frequencies go when they are sampled: folds, zones, and the rates that keep a band whole. */
import type { Enclosure } from './response';

/** Where a tone appears after sampling. */
export interface Landing {
  /** In 0 … rate/2, Hz. */
  readonly landsHz: number;
  /** The multiple of the rate it folds about. */
  readonly fold: number;
  /** Whether rising input frequencies come out falling. */
  readonly inverted: boolean;
}

/** The rates that keep a band whole in one zone. */
export interface RateWindow {
  readonly zone: number;
  readonly lowHz: number;
  /** Infinity in zone 1. */
  readonly highHz: number;
  readonly inverted: boolean;
}

/** Decimal fractions are not exact in double precision: 1.1/(1.1 − 1.0) is 10.99… and must count as 11. */
const floorSlack = 1e-12;

/**
 * Where a tone lands: |f − rate·round(f/rate)|.
 *
 * @param frequencyHz f ≥ 0, finite.
 * @param rateHz sampling rate, > 0.
 * @returns exact for the two doubles given. A tone exactly on a multiple of rate/2 has no side and counts as upright.
 * Source: the sampling theorem; R. E. Crochiere, L. R. Rabiner, Multirate Digital Signal Processing (1983), ch. 2, from memory.
 * @example foldFrequency(41200, 51200).landsHz // 10000
 */
export function foldFrequency(frequencyHz: number, rateHz: number): Landing {
  checkRate(rateHz);
  if (!(frequencyHz >= 0 && frequencyHz < Infinity))
    throw new RangeError(`A frequency must be 0 Hz or more, not ${frequencyHz}.`);
  const above = frequencyHz % rateHz;
  const inverted = above > rateHz / 2;
  const below = Math.round((frequencyHz - above) / rateHz);
  return { landsHz: inverted ? rateHz - above : above, fold: inverted ? below + 1 : below, inverted };
}

/**
 * The zone that a band stands in, counted from 1: n = floor(2·low/rate) + 1. Even zones come out inverted.
 *
 * @param lowHz lower edge of the band, ≥ 0; on a multiple of rate/2 (to 1e−12) it belongs to the zone above.
 * @param rateHz sampling rate, > 0.
 * Source: common practice.
 * @example zoneOf(70e6, 40e6) // 4
 */
export function zoneOf(lowHz: number, rateHz: number): number {
  checkRate(rateHz);
  return slackFloor((2 * lowHz) / rateHz) + 1;
}

/**
 * The rates that keep a band whole: 2·high/n ≤ rate ≤ 2·low/(n − 1), n = 1 … floor(high/(high − low)), zone 1 first.
 *
 * @param lowHz lower edge with its guard, ≥ 0.
 * @param highHz upper edge with its guard, > low.
 * @param most how many windows at most; a narrow band high up has millions.
 * @returns windows that fall together to a single rate are kept.
 * Source: R. G. Vaughan, N. L. Scott, D. R. White, "The theory of bandpass sampling", IEEE Trans. Signal Processing 39 (1991) 1973–1984.
 * @example rateWindows(20, 25).map((window) => window.lowHz).join(' ') // '50 25 16.666666666666668 12.5 10'
 */
export function rateWindows(lowHz: number, highHz: number, most = 1000): readonly RateWindow[] {
  const count = Math.min(zoneCount(lowHz, highHz), most);
  return Array.from({ length: count }, (_, index) => rateWindow(lowHz, highHz, index + 1));
}

/**
 * How many zones some rate keeps a band whole in: floor(high/(high − low)).
 *
 * @param lowHz lower edge with its guard, ≥ 0.
 * @param highHz upper edge with its guard, > low.
 * Source: as `rateWindows`.
 * @example zoneCount(1.0, 1.1) // 11
 */
export function zoneCount(lowHz: number, highHz: number): number {
  if (!(lowHz >= 0 && lowHz < highHz && highHz < Infinity))
    throw new RangeError(`A band must run upwards from 0 Hz, not ${lowHz} .. ${highHz}.`);
  return slackFloor(highHz / (highHz - lowHz));
}

/**
 * The rates that keep a band whole in one zone: 2·high/n ≤ rate ≤ 2·low/(n − 1).
 *
 * @param lowHz lower edge with its guard, ≥ 0.
 * @param highHz upper edge with its guard, > low.
 * @param zone n, 1 … `zoneCount`; beyond it the window is empty, and is given as the single rate 2·high/n.
 * Source: as `rateWindows`.
 * @example rateWindow(65, 75, 4).lowHz // 37.5
 */
export function rateWindow(lowHz: number, highHz: number, zone: number): RateWindow {
  const low = (2 * highHz) / zone;
  const high = zone === 1 ? Infinity : (2 * lowHz) / (zone - 1);
  return { zone, lowHz: low, highHz: Math.max(low, high), inverted: zone % 2 === 0 };
}

/**
 * Every interval of input frequencies that lands in a range: [k·rate + low, k·rate + high] and [k·rate − high, k·rate − low].
 *
 * @param lowHz lower edge of the range after sampling, 0 … rate/2.
 * @param highHz its upper edge, 0 … rate/2.
 * @param rateHz sampling rate, > 0.
 * @param lastFold the largest k; k = 0, the range itself, comes first.
 * Source: common practice.
 * @example landingFrequencies(1, 2, 10, 1).map((range) => range.low).join(' ') // '1 8 11'
 */
export function landingFrequencies(lowHz: number, highHz: number, rateHz: number, lastFold: number): readonly Enclosure[] {
  checkRate(rateHz);
  const found: Enclosure[] = [{ low: lowHz, high: highHz }];
  for (let fold = 1; fold <= lastFold; fold += 1) {
    found.push(
      { low: fold * rateHz - highHz, high: fold * rateHz - lowHz },
      { low: fold * rateHz + lowHz, high: fold * rateHz + highHz },
    );
  }
  return found;
}

function slackFloor(value: number): number {
  return Math.floor(value * (1 + floorSlack));
}

function checkRate(rateHz: number): void {
  if (!(rateHz > 0 && rateHz < Infinity)) throw new RangeError(`A rate must be above 0 Hz, not ${rateHz}.`);
}
