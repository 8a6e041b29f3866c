/** Exact ranges over an interval of the few functions that turn at known places. */
import type { Enclosure } from '../response';

/**
 * The range of |sin(πx)|.
 *
 * @param high may be Infinity.
 * @example sineRange(0.25, 0.75).high // 1
 */
export function sineRange(low: number, high: number): Enclosure {
  if (!(high - low < 1)) return { low: 0, high: 1 };
  const ends = [Math.abs(Math.sin(Math.PI * (low - Math.round(low)))), Math.abs(Math.sin(Math.PI * (high - Math.round(high))))];
  return {
    low: Math.floor(high) >= Math.ceil(low) ? 0 : Math.min(...ends),
    high: Math.floor(high - 0.5) >= Math.ceil(low - 0.5) ? 1 : Math.max(...ends),
  };
}

/**
 * The range of a function that rises to its only peak and falls behind it.
 *
 * @example humpRange((y) => y / (1 + y * y), 1, { low: 0, high: 9 }).high // 0.5
 */
export function humpRange(hump: (y: number) => number, peak: number, { low, high }: Enclosure): Enclosure {
  const ends = [hump(low), hump(high)];
  return { low: Math.min(...ends), high: low <= peak && peak <= high ? hump(peak) : Math.max(...ends) };
}

/**
 * The least enclosure that holds both.
 *
 * @example hullOf({ low: 0, high: 1 }, { low: 3, high: 4 }).high // 4
 */
export function hullOf(one: Enclosure, other: Enclosure): Enclosure {
  return { low: Math.min(one.low, other.low), high: Math.max(one.high, other.high) };
}
