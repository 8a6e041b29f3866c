/** Half a period of a sine as a pulse; also what the edges of a raised-cosine pulse do to its spectrum. */
import type { Response } from '../response';
import { lobedResponse, type Lobes } from './lobes';
import { logSinc, sincSlope } from './sinc';

/**
 * The magnitude of a half sine's spectrum, normalised to unit area: |P(f)| = |cos(πx)/(1 − (2x)²)|, x = f·w.
 *
 * It is evaluated as (π/4)·|sinc(x − ½)|/(x + ½), which is the same and has no 0/0 at x = ½, where it is π/4.
 *
 * @param widthSeconds w ≥ 0 in s; 0 is gain 1 at every frequency.
 * @returns ln|P|: 0 at 0 Hz, −Infinity at 1.5/w, 2.5/w, 3.5/w … and at Infinity.
 * Source: any Fourier-transform table; the other form by the addition theorem.
 * @example Math.exp(halfSineResponse(1).logGain(0.5)) // 0.785398163
 */
export function halfSineResponse(widthSeconds: number): Response {
  return lobedResponse(halfSineLobes, widthSeconds);
}

/** Nulls at 1.5, 2.5, 3.5 …; lobe 0 reaches from 0 to 1.5. */
const halfSineLobes: Lobes = {
  logGain: (x) => Math.log(0.25 * Math.PI) + logSinc(x - 0.5, x) - Math.log(x + 0.5),
  lobeAt: (x) => Math.max(0, Math.floor(x - 0.5)),
  endOf: (lobe) => lobe + 1.5,
  peakOf: (lobe) => (lobe === 0 ? 0 : peakOf(lobe)),
  slopeIn: (lobe, x) => (x === 0 ? 0 : sincSlope(x - 0.5, lobe) - 1 / (x + 0.5)),
  envelope: (x) => -Math.log(4 * x * x - 1),
};

/** Where lobe n ≥ 1 peaks: tan(πδ) = −8x/(π(4x² − 1)) at x = n + 1 + δ; each round shrinks the error twentyfold or more. */
function peakOf(lobe: number): number {
  let x = lobe + 1;
  for (let round = 0; round < 6; round += 1) x = lobe + 1 - Math.atan((8 * x) / (Math.PI * (4 * x * x - 1))) / Math.PI;
  return x;
}
