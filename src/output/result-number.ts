/** Numbers as the machine-readable result writes them: JSON has no infinities and no NaN. */
import type { ResultNumber } from './result-file';

/** The number itself, "inf" or "-inf", or null for null and for NaN, which stands for "cannot be computed". */
export function resultNumber(value: number | null | undefined): ResultNumber {
  if (value === null || value === undefined || Number.isNaN(value)) return null;
  if (value === Infinity) return 'inf';
  if (value === -Infinity) return '-inf';
  return value;
}
