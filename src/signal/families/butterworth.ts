/** Butterworth low-pass filters: maximally flat magnitude, poles evenly spaced on a circle. */
import type { Filter } from '../filter';
import { checkFamily, mirrored } from './low-pass';

/**
 * A Butterworth low-pass filter: |H|² = 1 / (1 + (f/corner)^(2·order)), from poles on a circle of radius `corner`.
 *
 * @param order whole, ≥ 1; exact to 1e−9 up to 20.
 * @param cornerHz half-power frequency (3.0103 dB below the gain at 0 Hz), > 0.
 * @returns gain 1 at 0 Hz; falls everywhere, so it has no turning points.
 * Source: S. Butterworth, "On the theory of filter amplifiers", Experimental Wireless 7 (1930) 536–541.
 * @example Math.exp(filterResponse(butterworth(4, 1000)).logGain(2000)) // 0.0623782861
 */
export function butterworth(order: number, cornerHz: number): Filter {
  checkFamily(order, cornerHz);
  const poles = mirrored(order, (angle) => ({ re: -cornerHz * Math.sin(angle), im: cornerHz * Math.cos(angle) }));
  return { poles, zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] };
}
