/** Phrases that several hovers share. */
import { formatDb, formatFrequency } from '../../units/format';

/** "4.8 dB over the limit", "0.8 dB inside the limit". */
export function marginWords(marginDb: number, decimals = 1): string {
  return `${formatDb(Math.abs(marginDb), 'dB', decimals)} ${marginDb < 0 ? 'over' : 'inside'} the limit`;
}

/** A small loss with two digits that matter, at least to a hundredth of a decibel. */
export function lossWords(lossDb: number): string {
  const size = Math.abs(lossDb);
  const decimals = size === 0 || !Number.isFinite(size) ? 2 : Math.min(Math.max(2, 1 - Math.floor(Math.log10(size))), 6);
  return formatDb(lossDb, 'dB', decimals);
}

/** A stretch of frequencies; infinity is an open end. */
export function bandWords(lowHz: number, highHz: number): string {
  return Number.isFinite(highHz) ? `${formatFrequency(lowHz)} .. ${formatFrequency(highHz)}` : `${formatFrequency(lowHz)} ..`;
}

/** A frequency that may be missing or approached at infinity. */
export function frequencyOr(hz: number | null | undefined, none: string): string {
  if (hz === null || hz === undefined) return none;
  return Number.isFinite(hz) ? formatFrequency(hz) : 'ever higher frequencies';
}

/** How a band or a landing lies after folding. */
export function turnWords(inverted: boolean): string {
  return inverted ? 'inverted' : 'upright';
}
