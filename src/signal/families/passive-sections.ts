/** Sections of two and three parts, driven from 0 Ω and unloaded. */
import type { Filter } from '../filter';
import { checkFamily } from './low-pass';
import { secondOrder } from './second-order';

/**
 * A first-order high-pass: |H| = 1/√(1 + (corner/f)²).
 *
 * @param cornerHz half-power frequency, > 0.
 * @returns gain 1 at infinity; rises everywhere.
 * Source: common practice.
 * @example Math.exp(filterResponse(zeroAtOrigin(1000)).logGain(1000)) // 0.70710678
 */
export function zeroAtOrigin(cornerHz: number): Filter {
  checkFamily(1, cornerHz);
  return {
    poles: [{ re: -cornerHz, im: 0 }],
    zeros: [{ re: 0, im: 0 }],
    gainAt: { frequencyHz: Infinity, gain: 1 },
    turnsHz: [],
  };
}

/**
 * A series capacitor and a shunt resistor: a high-pass with its corner at 1/(2πRC).
 *
 * @param ohm > 0.
 * @param farad > 0.
 * Source: common practice.
 * @example Math.exp(filterResponse(seriesCapacitor(1e3, 1e-9)).logGain(159154.943)) // 0.70710678
 */
export function seriesCapacitor(ohm: number, farad: number): Filter {
  return zeroAtOrigin(1 / (2 * Math.PI * ohm * farad));
}

/**
 * A series resistor and coil and a shunt capacitor: a low-pass of natural frequency 1/(2π√(LC)) and Q = √(L/C)/R.
 *
 * @param ohm > 0.
 * @param henry > 0.
 * @param farad > 0.
 * @returns gain 1 at 0 Hz.
 * Source: common practice.
 * @example Math.exp(filterResponse(seriesResonance(100, 1e-3, 1e-9)).logGain(159154.943)) // 10
 */
export function seriesResonance(ohm: number, henry: number, farad: number): Filter {
  return secondOrder('lowpass', 1 / (2 * Math.PI * Math.sqrt(henry * farad)), Math.sqrt(henry / farad) / ohm);
}
