/** Prints values for people: figures rounded to the digits that matter, a true minus sign, a prefix that keeps them short. */
import { printedPrefixes } from './prefixes';

/**
 * A frequency for a message, "41.2 kHz".
 * @param hz frequency in Hz; Infinity gives "∞ Hz"
 * @param resolutionHz smallest difference that must show; without it four significant digits are printed
 */
export function formatFrequency(hz: number, resolutionHz?: number): string {
  return formatPrefixed(hz, 'Hz', significantFor(hz, resolutionHz));
}

/** A time for a message, "300 ns". */
export function formatTime(seconds: number): string {
  return formatPrefixed(seconds, 's', 4);
}

/** A voltage for a message, "1.414 V"; `unit` may be "V rms" or "V pp". */
export function formatVoltage(volts: number, unit: 'V' | 'V rms' | 'V pp' | 'V pk' = 'V'): string {
  return formatPrefixed(volts, unit, 4);
}

/** A level or ratio for a message, "−91.2 dBFS", at most `decimals` decimals and none that are zero; "−∞ dBFS" for nothing at all. */
export function formatDb(db: number, unit = 'dB', decimals = 1): string {
  return `${plainNumber(db, decimals)} ${unit}`;
}

/** A level, a ratio or a time in its unit: "−91.2 dBFS", "30.2 µs"; `decimals` are those of a level. */
export function formatAmount(value: number, unit: string, decimals = 1): string {
  return unit === 's' ? formatTime(value) : formatDb(value, unit, decimals);
}

/** A ratio as a percentage, "4 %". */
export function formatPercent(ratio: number): string {
  return `${plainNumber(ratio * 100, 3)} %`;
}

/** A ratio as a percentage with its sign, "+4 %" or "−4 %". */
export function formatSignedPercent(ratio: number): string {
  const text = formatPercent(ratio);
  return text.startsWith('−') || text.startsWith('0 ') ? text : `+${text}`;
}

/** A count with its noun, "1 fault", "2 faults". */
export function formatCount(count: number, singular: string, plural = `${singular}s`): string {
  return `${plainNumber(count, 0)} ${count === 1 ? singular : plural}`;
}

/** A value in a base unit, with the prefix that keeps it between 1 and 1000, rounded to significant digits. */
export function formatPrefixed(value: number, unit: string, digits: number): string {
  if (value === 0 || !Number.isFinite(value)) return `${plainNumber(value, 0)} ${unit}`;
  // Rounded first, so that 999.96 kHz becomes 1 MHz and not 1000 kHz.
  const rounded = Number(value.toPrecision(Math.min(digits, 17)));
  const { prefix, power } = prefixFor(rounded);
  const exponent = Math.floor(Math.log10(Math.abs(rounded)));
  const decimals = Math.max(0, digits - 1 - (exponent - power));
  return `${plainNumber(rounded / 10 ** power, decimals)} ${prefix}${unit}`;
}

/** A number with at most so many decimals, trailing zeros dropped, and U+2212 for its minus. */
export function plainNumber(value: number, decimals: number): string {
  if (value === Infinity) return '∞';
  if (value === -Infinity) return '−∞';
  const text = Math.abs(value).toFixed(Math.min(decimals, 20));
  const short = text.includes('.') ? text.replace(/\.?0+$/, '') : text;
  return value < 0 && short !== '0' ? `−${short}` : short;
}

/** The printed prefix under which a value stands between 1 and 1000. */
export function prefixFor(value: number): { readonly prefix: string; readonly power: number } {
  const size = Math.abs(value);
  // 10 ** power is not exact below zero; the slack keeps 1e-9 at 1 n.
  const fitting = printedPrefixes.filter(({ power }) => size >= 10 ** power * (1 - 1e-12));
  return fitting.at(-1) ?? { prefix: 'f', power: -15 };
}

function significantFor(hz: number, resolutionHz: number | undefined): number {
  if (resolutionHz === undefined || !(resolutionHz > 0) || !Number.isFinite(hz) || hz === 0) return 4;
  const needed = Math.floor(Math.log10(Math.abs(hz))) - Math.floor(Math.log10(resolutionHz)) + 1;
  return Math.max(4, Math.min(needed, 15));
}
