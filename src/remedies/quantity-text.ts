/** A new value in the words of the old one: its unit, its spacing and its tolerance stay. */
import { formatSpecQuantity } from '../units/format-spec';
import type { Quantity } from '../units/quantity';

/** A quantity written as `oldText` writes `oldValue`, with at most fifteen digits; a text without a number is written afresh in `unit`. */
export function rewriteQuantity(oldText: string, oldValue: number, newValue: number, unit: Quantity['unit']): string {
  const parts = /^([+]?\d+(?:\.\d+)?(?:[eE][+-]?\d+)?)(.*)$/su.exec(oldText);
  const scale = oldValue / Number(parts?.[1]);
  const number = String(Number((newValue / scale).toPrecision(15)));
  if (parts === null || !Number.isFinite(scale) || number.includes('e')) return formatSpecQuantity({ value: newValue, unit });
  return `${number}${parts[2] ?? ''}`;
}
