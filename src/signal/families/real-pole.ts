/** One real pole: an RC section, an amplifier's bandwidth, a sensor, a track-and-hold. */
import type { Filter } from '../filter';
import { checkFamily } from './low-pass';

/**
 * A first-order low-pass: |H| = 1/√(1 + (f/corner)²).
 *
 * @param cornerHz half-power frequency, > 0; for a resistor and a capacitor 1/(2πRC).
 * @returns gain 1 at 0 Hz; falls everywhere.
 * Source: common practice.
 * @example Math.exp(filterResponse(realPole(1000)).logGain(3000)) // 0.316227766
 */
export function realPole(cornerHz: number): Filter {
  checkFamily(1, cornerHz);
  return { poles: [{ re: -cornerHz, im: 0 }], zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] };
}
