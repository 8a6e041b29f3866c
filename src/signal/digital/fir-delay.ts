/** The group delay of a filter with finitely many taps. */
import { tapSymmetry } from './fir-amplitude';

/**
 * Its group delay in samples of its own rate: (n − 1)/2 where the taps are symmetric, else Re(Σ k·h_k·z^{−k}/Σ h_k·z^{−k}).
 *
 * @param taps at least one.
 * @param share the frequency as a share of the rate.
 * @returns NaN or an infinity at an exact null of taps that are not symmetric.
 * Source: by differentiation of the phase; any text on group delay.
 * @example firDelaySamples([1, 0.5], 0) // 0.333333333
 */
export function firDelaySamples(taps: readonly number[], share: number): number {
  if (tapSymmetry(taps) !== 'none') return (taps.length - 1) / 2;
  let [re, im, weightedRe, weightedIm] = [0, 0, 0, 0];
  taps.forEach((tap, k) => {
    const angle = 2 * Math.PI * (k * share - Math.round(k * share));
    re += tap * Math.cos(angle);
    im += tap * Math.sin(angle);
    weightedRe += k * tap * Math.cos(angle);
    weightedIm += k * tap * Math.sin(angle);
  });
  return (weightedRe * re + weightedIm * im) / (re * re + im * im);
}
