/** A new value in the words of the old one: its unit, its spacing and its tolerance stay. */
import { formatSpecFrequency } from '../units/format-spec';

/** A frequency written as `oldText` writes `oldHz`, with at most fifteen digits. */
export function rewriteFrequency(oldText: string, oldHz: number, newHz: number): string {
  const parts = /^([+]?\d+(?:\.\d+)?(?:[eE][+-]?\d+)?)(.*)$/su.exec(oldText);
  const scale = oldHz / Number(parts?.[1]);
  const number = String(Number((newHz / scale).toPrecision(15)));
  if (parts === null || !Number.isFinite(scale) || number.includes('e')) return formatSpecFrequency(newHz);
  return `${number}${parts[2] ?? ''}`;
}
