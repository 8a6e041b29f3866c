/** Phrases that several hovers share. */
import type { WorstAt } from '../../analysis';
import { formatAmount, formatDb, formatFrequency, formatSignedPercent } from '../../units/format';

/** What a limit's margin depends on for its wording. */
interface Margin {
  readonly limit: string;
  readonly sense: 'at-most' | 'at-least' | 'inside';
  readonly margin: number;
  readonly unit?: string;
}

/** "4.8 dB over the limit", "2 dB short of the limit", "0.8 dB inside the limit". */
export function marginWords({ limit, sense, margin, unit }: Margin): string {
  const beyond = { 'at-most': 'over', 'at-least': 'short of', inside: 'outside' }[sense];
  return `${formatAmount(Math.abs(margin), unit === 's' ? 's' : 'dB', decimalsOf(limit))} ${margin < 0 ? beyond : 'inside'} the limit`;
}

/** Digits behind the point that a limit's figures are printed with. */
export function decimalsOf(limit: string): number {
  return hundredths.has(limit) ? 2 : 1;
}

/** Limits whose hundredths matter. */
const hundredths: ReadonlySet<string> = new Set(['flatness', 'level', 'response', 'through']);

/** Below this a loss is none. */
const negligibleDb = 1e-5;

/** A small loss with two digits that matter, at least to a hundredth of a decibel. */
export function lossWords(lossDb: number): string {
  const size = Math.abs(lossDb);
  if (size < negligibleDb) return formatDb(0);
  const decimals = Number.isFinite(size) ? Math.max(2, 1 - Math.floor(Math.log10(size))) : 2;
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

/** Which tolerances a worst case is reached at, those that are at nominal left out; null where none is at work. */
export function worstAtWords(worstAt: WorstAt | null): string | null {
  const moved = Object.entries(worstAt ?? {}).filter(([, deviation]) => deviation !== 0);
  return moved.length === 0 ? null : moved.map(([label, deviation]) => `${label} ${formatSignedPercent(deviation)}`).join(', ');
}
