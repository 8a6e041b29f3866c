/** Writes quantities as spec text without losing a bit: read again they give the same numbers. */
import { decimalText } from './number-text';
import { prefixFor } from './format';
import { entryOf } from './unit-table';
import type { Quantity, QuantityRange, Tolerance } from './quantity';

/** A frequency as spec text, "64 kHz". */
export function formatSpecFrequency(hz: number): string {
  return formatSpecQuantity({ value: hz, unit: 'Hz' });
}

/** A quantity as spec text, tolerance included: "4.7 nF ± 5 %". */
export function formatSpecQuantity(quantity: Quantity): string {
  const value = formatSpecValue(quantity);
  return quantity.tolerance === undefined ? value : `${value} ${formatTolerance(quantity.tolerance)}`;
}

/** A range as spec text, "5 Hz .. 10 kHz", "40 kHz ..". */
export function formatSpecRange(range: QuantityRange): string {
  const low = range.low.value === -Infinity ? '' : formatSpecValue(range.low);
  const high = range.high.value === Infinity ? '' : formatSpecValue(range.high);
  return `${low} .. ${high}`.trim();
}

function formatSpecValue({ value, unit }: Quantity): string {
  const entry = entryOf(unit);
  const spelling = entry.spellings[0] ?? unit;
  if (entry.prefixes === 'none' || value === 0) return `${decimalText(value, entry.power)} ${spelling}`;
  const { prefix, power } = prefixFor(value);
  // f stands only before s and F.
  const usable = power === -15 && entry.prefixes !== 'femto' ? { prefix: 'p', power: -12 } : { prefix, power };
  return `${decimalText(value, usable.power)} ${usable.prefix}${spelling}`;
}

function formatTolerance({ low, high, perKelvin }: Tolerance): string {
  const coefficient = perKelvin === undefined ? [] : [`± ${decimalText(perKelvin, -6)} ppm/°C`];
  return [...spread(low, high, perKelvin !== undefined), ...coefficient].join(' ');
}

function spread(low: number, high: number, coefficientFollows: boolean): readonly string[] {
  if (low === 0 && high === 0 && coefficientFollows) return [];
  if (-low === high) return [`± ${percentText(high)}`];
  return [`+ ${percentText(high)} - ${percentText(-low)}`];
}

/** Small deviations read better in ppm: 20 ppm, not 0.002 %. */
function percentText(ratio: number): string {
  return ratio !== 0 && ratio < 1e-3 ? `${decimalText(ratio, -6)} ppm` : `${decimalText(ratio, -2)} %`;
}
