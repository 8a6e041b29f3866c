/** Inverse Chebyshev (type II) low-pass filters: flat passband, equal ripple in the stop band. */
import type { Filter } from '../filter';
import type { Root } from '../sections';
import { checkDb, checkFamily, epsilonOf, mirrored } from './low-pass';

/** What the corner frequency names: the half-power point, or the first frequency with all of the attenuation. */
export type InverseChebyshevCorner = 'half-power' | 'stopband';

/**
 * An inverse Chebyshev low-pass filter: |H|² = T²/(T² + ε²), T the Chebyshev polynomial of the order at f_s/f, ε² = 10^(attenuation/10) − 1
 * and f_s the edge of the stop band. Its poles are f_s²/p over the poles p of a Chebyshev filter, its zeros ±j·f_s/cos θ.
 *
 * @param order whole, ≥ 1; exact to 1e−9 up to 20. An even order keeps its attenuation up to infinity.
 * @param cornerHz > 0, in Hz.
 * @param attenuationDb > 0, in dB; above 3.0103 where the corner is at half power.
 * @param cornerAt what `cornerHz` names.
 * @returns gain 1 at 0 Hz; it turns at its zeros and at f_s/cos(kπ/order).
 * Source: A. I. Zverev, Handbook of Filter Synthesis (1967), from memory; checked against mpmath at 50 digits.
 * @example Math.exp(filterResponse(inverseChebyshev(3, 1000, 40, 'stopband')).logGain(1000)) // 0.01
 */
export function inverseChebyshev(
  order: number,
  cornerHz: number,
  attenuationDb: number,
  cornerAt: InverseChebyshevCorner,
): Filter {
  checkFamily(order, cornerHz);
  checkDb('attenuation', attenuationDb);
  const epsilon = epsilonOf(attenuationDb);
  if (cornerAt === 'half-power' && !(epsilon > 1)) throw new RangeError('An attenuation of 3.01 dB or less has no half power.');
  const edgeHz = cornerAt === 'stopband' ? cornerHz : cornerHz * Math.cosh(Math.acosh(epsilon) / order);
  const a = Math.asinh(epsilon) / order;
  const poles = mirrored(order, (angle) => inverted(edgeHz, -Math.sinh(a) * Math.sin(angle), Math.cosh(a) * Math.cos(angle)));
  const turnsHz = stopTurns(order, edgeHz);
  const zeros = turnsHz.filter((_, index) => index % 2 === 0).flatMap((im) => [im, -im].map((one): Root => ({ re: 0, im: one })));
  return { poles, zeros, gainAt: { frequencyHz: 0, gain: 1 }, turnsHz };
}

/** edge/(re + j·im), mirrored to the upper half plane again. */
function inverted(edgeHz: number, re: number, im: number): Root {
  const square = re * re + im * im;
  return { re: (edgeHz * re) / square, im: (edgeHz * im) / square };
}

/** The zeros and the maxima between them in turn, ascending. */
function stopTurns(order: number, edgeHz: number): readonly number[] {
  const found: number[] = [];
  // cos(kπ/(2·order)) as a sine, which keeps its digits near 0.
  for (let k = 1; k < order; k += 1) found.push(edgeHz / Math.sin((Math.PI * (order - k)) / (2 * order)));
  return found;
}
