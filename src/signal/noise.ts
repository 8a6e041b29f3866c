/** Noise of sampling: quantisation, jitter, and power integrated under a response. */
import type { Response } from './response';

export function quantisationSnrDb(bits: number): number {
  throw new RangeError(`not yet ${String(bits)}`);
}
export function jitterNoiseDb(frequencyHz: number, sigmaSeconds: number): number {
  throw new RangeError(`not yet ${String(frequencyHz)} ${String(sigmaSeconds)}`);
}
/** ∫ |H|² df over [lowHz, highHz] in Hz, with a bound on its error. */
export function integratePower(
  response: Response,
  lowHz: number,
  highHz: number,
): { readonly value: number; readonly errorBound: number } {
  throw new RangeError(`not yet ${String(response.logGain(0))} ${String(lowHz)} ${String(highHz)}`);
}
