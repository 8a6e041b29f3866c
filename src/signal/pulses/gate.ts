/** A gate that repeats with the sampling rate: natural sampling, which weighs every copy of the spectrum by one Fourier coefficient. */
import type { Complex } from '../complex';
import { pulseArea } from './pulse-area';
import { pulsePhase } from './pulse-phase';
import { pulseResponse } from './pulse-response';
import type { PulseShape } from './pulse-shape';

/**
 * ln|c_k| of a gate of height 1: c_k = (area/T)·P(k·fs). Copy k of the input, at f + k·fs, is weighed by c_k as a whole.
 *
 * @param shape lengths above 0 s, no longer than the period.
 * @param rateHz fs > 0.
 * @param copy k, any whole number.
 * @returns −Infinity where copy k vanishes.
 * Source: Fourier series.
 * @example Math.exp(logGateWeight({ shape: 'rectangle', widthSeconds: 0.25 }, 1, 1)) // 0.225079079
 */
export function logGateWeight(shape: PulseShape, rateHz: number, copy: number): number {
  return Math.log(pulseArea(shape) * rateHz) + pulseResponse(shape).logGain(Math.abs(copy) * rateHz);
}

/**
 * |c_k|/|c_0|: copy k against the wanted path, as a wide gate has it weakened before any filter acts.
 *
 * @param shape lengths above 0 s, no longer than the period.
 * @param rateHz fs > 0.
 * @param copy k, any whole number.
 * @returns null for `split`, whose wanted path is nothing.
 * Source: Fourier series.
 * @example relativeGateWeight({ shape: 'rectangle', widthSeconds: 0.5 }, 1, 1) // 0.636619772
 */
export function relativeGateWeight(shape: PulseShape, rateHz: number, copy: number): number | null {
  if (shape.shape === 'split') return null;
  return Math.exp(pulseResponse(shape).logGain(Math.abs(copy) * rateHz));
}

/**
 * c_k itself, the gate opening at t = 0; c_{−k} is its conjugate.
 *
 * @param shape lengths above 0 s, no longer than the period.
 * @param rateHz fs > 0.
 * @param copy k, any whole number.
 * Source: Fourier series; for the rectangle (w/T)·sinc(k·w/T)·e^{−jπkw/T}.
 * @example gateCoefficient({ shape: 'rectangle', widthSeconds: 0.25 }, 1, 1).im // -0.159154943
 */
export function gateCoefficient(shape: PulseShape, rateHz: number, copy: number): Complex {
  const size = Math.exp(logGateWeight(shape, rateHz, copy));
  const phase = pulsePhase(shape, copy * rateHz);
  return { re: size * Math.cos(phase), im: size * Math.sin(phase) };
}
