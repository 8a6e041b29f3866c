/** Effective number of bits from a signal-to-noise-and-distortion ratio. */
import { dbPerBit, sineOverStepDb } from '../signal/noise';

/** The bits of an ideal converter with this ratio; null without noise. Referred to full scale, the tone's level is taken off first. */
export function effectiveBits(sinadDb: number | null): number | null {
  return sinadDb === null ? null : (sinadDb - sineOverStepDb) / dbPerBit;
}
