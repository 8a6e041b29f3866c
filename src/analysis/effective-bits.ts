/** Effective number of bits from a signal-to-noise-and-distortion ratio. */
import type { Figures } from './figures';

/** dB a bit: 20·log10 2, by which each bit lowers quantisation noise (W. R. Bennett, 1948). */
const dbPerBit = 20 * Math.log10(2);

/** A full-scale sine's power over that of an error spread evenly over one step, at 0 bits: 10·log10 1.5 (same source). */
const sineOverStepDb = 10 * Math.log10(1.5);

/** Bits at the test tone, and referred to full scale by the tone's own level; null without noise. */
export function effectiveBits(sinadDb: number | null, toneDb: number): Pick<Figures, 'enob' | 'enobFullScale'> {
  if (sinadDb === null) return { enob: null, enobFullScale: null };
  return { enob: (sinadDb - sineOverStepDb) / dbPerBit, enobFullScale: (sinadDb - toneDb - sineOverStepDb) / dbPerBit };
}
