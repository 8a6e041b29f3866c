/** The split pulse, positive for its first half and negative for its second: it passes nothing at 0 Hz and serves higher zones. */
import type { Response } from '../response';
import { lobedResponse, type Lobes } from './lobes';
import { logSinc, sincSlope } from './sinc';

/**
 * The magnitude of a split pulse's spectrum, normalised to unit area of |p|: |P(f)| = sin²(πz)/(πz), z = f·w/2.
 *
 * @param widthSeconds w > 0 in s, both halves together.
 * @returns ln|P|: −Infinity at 0 Hz, at every multiple of 2/w (to rounding) and at Infinity; largest at z = 0.371.
 * Source: two rectangles of opposite sign, any Fourier-transform table.
 * @example Math.exp(splitResponse(1).logGain(0.5)) // 0.636619772
 */
export function splitResponse(widthSeconds: number): Response {
  return lobedResponse(splitLobes, 0.5 * widthSeconds);
}

/** sin²(πz)/(πz): nulls at 0, 1, 2 … */
const splitLobes: Lobes = {
  logGain: (z) => (z === Infinity ? -Infinity : 2 * logSinc(z) + Math.log(Math.PI * z)),
  lobeAt: Math.floor,
  endOf: (lobe) => lobe + 1,
  peakOf,
  slopeIn: (lobe, z) => 2 * sincSlope(z, lobe) + 1 / z,
  envelope: (z) => -Math.log(Math.PI * z),
};

/** Where a lobe peaks: tan(y) = 2y at y = π(n + ½) − atan(1/(2y)); each round shrinks the error threefold or more. */
function peakOf(lobe: number): number {
  const q = Math.PI * (lobe + 0.5);
  let y = q;
  for (let round = 0; round < 16; round += 1) y = q - Math.atan(0.5 / y);
  return y / Math.PI;
}
