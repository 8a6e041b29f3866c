/** The rectangular pulse: an averaging aperture or a hold, as the magnitude of its spectrum. */
import type { Response } from '../response';
import { lobedResponse, type Lobes } from './lobes';
import { logSinc, sincSlope } from './sinc';

/**
 * The magnitude of a rectangle's spectrum, normalised to unit area: |P(f)| = |sinc(f·w)|, sinc(x) = sin(πx)/(πx).
 *
 * Bounds over an interval come from its ends and the side lobes' own peaks, where tan(πx) = πx; the slope from
 * π·w·(cot(πx) − 1/(πx)), which falls throughout each lobe.
 *
 * @param widthSeconds w ≥ 0 in s; 0 is an instant, gain 1 at every frequency.
 * @returns ln|P|: 0 at 0 Hz, −Infinity at every multiple of 1/w (to rounding) and at Infinity.
 * Source: any Fourier-transform table; the peaks' equation by differentiation.
 * @example 20 * Math.log10(Math.exp(rectangleResponse(1 / 48000).logGain(24000))) // -3.92239754
 */
export function rectangleResponse(widthSeconds: number): Response {
  if (!(widthSeconds >= 0) || !Number.isFinite(widthSeconds)) {
    throw new RangeError(`A pulse's width must be 0 s or more, not ${widthSeconds}.`);
  }
  return lobedResponse(sincLobes, widthSeconds);
}

/** |sinc(x)|: nulls at 1, 2, 3 … */
const sincLobes: Lobes = {
  logGain: (x) => logSinc(x),
  lobeAt: Math.floor,
  endOf: (lobe) => lobe + 1,
  peakOf: (lobe) => (lobe === 0 ? 0 : peakOf(lobe)),
  slopeIn: (lobe, x) => sincSlope(x, lobe),
  envelope: (x) => -Math.log(Math.PI * x),
};

/** Where lobe n ≥ 1 peaks: tan(z) = z at z = q − 1/q − 2/(3q³) − …, q = π(n + ½), finished with one Newton step on z − tan z. */
function peakOf(lobe: number): number {
  const q = Math.PI * (lobe + 0.5);
  const z = q - 1 / q - 2 / (3 * q ** 3) - 13 / (15 * q ** 5) - 146 / (105 * q ** 7);
  const tangent = 1 / Math.tan(q - z);
  return (z + (tangent - z) / -(tangent * tangent)) / Math.PI;
}
