/** Taps scaled to a wanted gain at one frequency. */
import { firAmplitude, tapSymmetry } from './fir-amplitude';

/**
 * Symmetric taps times the constant that makes their amplitude 1 at a frequency.
 *
 * @param taps even-symmetric.
 * @param share the frequency as a share of the rate; 0 makes their sum 1.
 * @throws RangeError where they are not symmetric, or have no gain there.
 * Source: elementary.
 * @example withUnitGain([1, 2, 1], 0)[1] // 0.5
 */
export function withUnitGain(taps: readonly number[], share: number): readonly number[] {
  if (tapSymmetry(taps) !== 'even') throw new RangeError('Only symmetric taps have an amplitude that can be made 1.');
  const amplitude = firAmplitude(taps);
  const gain = amplitude.at(share);
  if (!(Math.abs(gain) > amplitude.rounding)) throw new RangeError(`The taps have no gain at ${share} of their rate.`);
  return taps.map((tap) => tap / gain);
}
