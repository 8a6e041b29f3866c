/** The frequency itself as a gain: what turns a level into the rate of change that timing jitter acts on. */
import type { Response } from './response';

/**
 * The response f / 1 Hz.
 *
 * @returns ln f: −Infinity at 0 Hz, Infinity at Infinity; its slope 1/f has no bound from 0 Hz.
 * Source: elementary.
 * @example Math.exp(frequencyWeight().logGain(1000)) // 1000
 */
export function frequencyWeight(): Response {
  return {
    logGain: (frequencyHz) => Math.log(frequencyHz),
    bounds: (lowHz, highHz) => ({ low: Math.log(lowHz), high: Math.log(highHz) }),
    slope: (lowHz, highHz) => (lowHz > 0 ? { low: 1 / highHz, high: 1 / lowHz } : null),
  };
}
