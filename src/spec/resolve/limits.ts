/** Resolves limits in short and long form to one form. */
import type { Limit, LimitKey } from '../channel';
import type { LimitsModel } from '../declaration/limits';
import type { Quantity } from '../../units/quantity';

/** The limits in the order they stand, or null where one of them is faulty. */
export function resolveLimits(stated: LimitsModel): readonly Limit[] | null {
  const limits = (Object.keys(stated) as StatedKey[]).map((key) => limitOf(key, stated[key] ?? null));
  const whole = limits.flatMap((limit) => limit ?? []);
  return whole.length === limits.length ? whole : null;
}

/** The keys that are computed so far. */
type StatedKey = Extract<LimitKey, keyof LimitsModel>;

/** A limit as it was written, whatever its key. */
type Written = NonNullable<LimitsModel[StatedKey]>;

function limitOf(key: LimitKey, written: Written | null): Limit | null {
  if (written === null) return null;
  if ('value' in written) return { key, ...valueOf(written), ref: null, margin: null, withUnwanted: false, sum: false };
  if (!written.at || written.ref === null || written.margin === null) return null;
  return {
    key,
    ...valueOf(written.at),
    ref: written.ref ?? null,
    margin: written.margin?.value ?? null,
    withUnwanted: 'with' in written && written.with === 'unwanted',
    sum: false,
  };
}

function valueOf({ value, unit }: Quantity): Pick<Limit, 'at' | 'unit'> {
  return { at: value, unit: unit === 'dBFS' || unit === 'dBc' ? unit : 'dB' };
}
