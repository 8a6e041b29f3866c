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

export function foldFrequency(frequencyHz: number, rateHz: number): Landing {
  throw new RangeError(`not yet ${String(frequencyHz)} ${String(rateHz)}`);
}
/** n = floor(2·low/rate) + 1. */
export function zoneOf(lowHz: number, rateHz: number): number {
  throw new RangeError(`not yet ${String(lowHz)} ${String(rateHz)}`);
}
/** Zone 1 first. */
export function rateWindows(lowHz: number, highHz: number): readonly RateWindow[] {
  throw new RangeError(`not yet ${String(lowHz)} ${String(highHz)}`);
}
/** Every input interval, up to `lastFold`, that lands in [lowHz, highHz]. */
export function landingFrequencies(lowHz: number, highHz: number, rateHz: number, lastFold: number): readonly Enclosure[] {
  throw new RangeError(`not yet ${String(lowHz)} ${String(highHz)} ${String(rateHz)} ${String(lastFold)}`);
}
