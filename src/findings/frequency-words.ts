/** Frequencies in messages, with the digits that matter: a hundredth of the protected width. */
import type { Figures } from '../analysis/figures';
import { formatFrequency } from '../units/format';

/** A frequency of a channel, in words; infinity is where a response never falls further. */
export function frequencyWords(figures: Pick<Figures, 'protected'>, hz: number): string {
  if (!Number.isFinite(hz)) return 'ever higher frequencies';
  const widths = figures.protected.map((range) => range.high - range.low).filter((width) => width > 0 && Number.isFinite(width));
  return widths.length === 0 ? formatFrequency(hz) : formatFrequency(hz, Math.min(...widths) / 100);
}

/** A stretch of frequencies: "5 Hz .. 10 kHz". */
export function bandWords(lowHz: number, highHz: number): string {
  return `${formatFrequency(lowHz)} .. ${Number.isFinite(highHz) ? formatFrequency(highHz) : ''}`.trim();
}
