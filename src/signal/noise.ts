/** Noise of sampling: quantisation, jitter, and power integrated under a response. */
import { integrate, type Integral } from './quadrature';
import type { Response } from './response';

/** dB of signal-to-noise ratio that one bit buys: 20·log10(2) = 6.0206 dB. */
export const dbPerBit = 20 * Math.log10(2);

/** A full-scale sine's power over that of a uniform error of one step, at 0 bits: 10·log10(3/2) = 1.7609 dB. */
export const sineOverStepDb = 10 * Math.log10(1.5);

/**
 * Signal-to-quantisation-noise ratio of a full-scale sine, noise over 0 … half the rate: 20·N·log10(2) + 10·log10(3/2) dB.
 *
 * @param bits N, ≥ 1.
 * Source: W. R. Bennett, "Spectra of quantized signals", Bell System Technical Journal 27 (1948) 446–472.
 * @example quantisationSnrDb(16) // 98.0905112
 */
export function quantisationSnrDb(bits: number): number {
  return dbPerBit * bits + sineOverStepDb;
}

/**
 * Noise of a jittered sampling instant against the tone that is sampled: 20·log10(2π·f·σ) dB.
 *
 * @param frequencyHz the tone's frequency where it is sampled (input of a capture, output of a generate), ≥ 0.
 * @param sigmaSeconds rms jitter, ≥ 0.
 * @returns −Infinity at 0 Hz or without jitter. The small-angle rule: within 0.01 dB of a Gaussian jitter's exact noise below 2π·f·σ = 0.09.
 * Source: common practice; checked against the exact E|e|² = 2(1 − exp(−(2πfσ)²/2)).
 * @example jitterNoiseDb(100e6, 100e-15) // -84.0364026
 */
export function jitterNoiseDb(frequencyHz: number, sigmaSeconds: number): number {
  return 20 * Math.log10(2 * Math.PI * frequencyHz * sigmaSeconds);
}

/**
 * The power that a response lets through: ∫ |H(f)|² df, by adaptive Gauss–Kronrod quadrature to 1e−9 relative.
 *
 * @param response |H|; times a one-sided density in 1/Hz the result is noise power.
 * @param lowHz ≥ 0.
 * @param highHz ≥ low, finite.
 * @returns Hz, with a bound on the error: the difference of the two nested rules, which overstates that of the finer one.
 * Source: R. Piessens et al., QUADPACK (1983).
 * @example integratePower(constantResponse(Math.log(2)), 0, 1000).value // 4000
 */
export function integratePower(response: Response, lowHz: number, highHz: number): Integral {
  if (!(lowHz >= 0 && lowHz <= highHz && highHz < Infinity))
    throw new RangeError(`Power needs a finite band from 0 Hz up, not ${lowHz} .. ${highHz}.`);
  if (lowHz === highHz) return { value: 0, errorBound: 0 };
  return integrate((frequencyHz) => Math.exp(2 * response.logGain(frequencyHz)), lowHz, highHz, 1e-9);
}
