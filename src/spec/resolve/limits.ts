/** Resolves limits in short and long form to one form. */
import type { LevelLimit, Limit, LimitKey } from '../channel';
import type { LimitsModel } from '../declaration/limits';
import type { Quantity, QuantityRange } from '../../units/quantity';
import { levelDb } from './levels';
import type { Scale } from './levels';
import type { Report } from './report';

/** The limits that are one value, in the order they stand, or null where one of them is faulty. */
export function resolveLimits(stated: LimitsModel): readonly Limit[] | null {
  const limits = Object.keys(stated).flatMap((key) => (isValueKey(key) ? [limitOf(key, stated[key] ?? null)] : []));
  const whole = limits.flatMap((limit) => limit ?? []);
  return whole.length === limits.length ? whole : null;
}

const isValueKey = (key: string): key is LimitKey =>
  key !== 'level' && key !== 'response' && key !== 'through' && key !== 'output';

/** A limit as it was written, whatever its key. */
type Written = NonNullable<LimitsModel[LimitKey]>;

function limitOf(key: LimitKey, written: Written | null): Limit | null {
  if (written === null) return null;
  if ('value' in written) return { key, ...valueOf(written), ref: null, margin: null, withUnwanted: false, sum: false };
  const sum = 'sum' in written;
  const at = sum ? written.sum : written.at;
  if (!at || written.ref === null || written.margin === null) return null;
  return {
    key,
    ...valueOf(at),
    ref: written.ref ?? null,
    margin: written.margin?.value ?? null,
    withUnwanted: 'with' in written && written.with === 'unwanted',
    sum,
  };
}

function valueOf({ value, unit }: Quantity): Pick<Limit, 'at' | 'unit'> {
  return { at: value, unit: unit === 'dBFS' || unit === 'dBc' || unit === 's' ? unit : 'dB' };
}

/** The range of the output's level, or null with a fault where it cannot be one. */
export function resolveLevelLimit(stated: NonNullable<LimitsModel['level']>, scale: Scale, report: Report): LevelLimit | null {
  if ('low' in stated) return levelRange(stated, ['limits', 'level'], { ref: null, margin: null }, scale, report);
  if (!stated.at || stated.ref === null || stated.margin === null) return null;
  const rest = { ref: stated.ref ?? null, margin: stated.margin?.value ?? null };
  return levelRange(stated.at, ['limits', 'level', 'at'], rest, scale, report);
}

function levelRange(
  { low, high }: QuantityRange,
  path: readonly string[],
  rest: Pick<LevelLimit, 'ref' | 'margin'>,
  scale: Scale,
  report: Report,
): LevelLimit | null {
  const lowDb = low.value === -Infinity ? -Infinity : levelDb(low, scale, path, report);
  const highDb = lowDb === null || high.value === Infinity ? Infinity : levelDb(high, scale, path, report);
  if (lowDb === null || highDb === null) return null;
  if (lowDb > highDb) return report.fault(path, 'out-of-range', 'the range of the level runs backwards');
  return { lowDb, highDb, ...rest };
}
