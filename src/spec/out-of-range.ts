/** Judges whether quantities and ranges are within what makes sense, and says what does. */
import { formatSpecQuantity, formatSpecRange } from '../units/format-spec';
import type { Quantity, QuantityRange, Tolerance } from '../units/quantity';
import { toleranceBounds, unitBounds } from './declaration/bounds';
import type { Bounds, Scalar, UnitBounds } from './shape';

/** What is wrong with a quantity's size or tolerance, or null; `shown` gives how it was written. */
export function boundFault(quantity: Quantity, shown: () => string, own: UnitBounds | undefined): string | null {
  const { value, unit, tolerance } = quantity;
  const bounds = own?.[unit] ?? unitBounds[unit];
  if (!isWithin(value, bounds)) return `\`${shown()}\` is out of range: ${span(quantity, bounds)}`;
  return tolerance === undefined || isSensible(tolerance)
    ? null
    : 'the tolerance is too wide: it may reach from −99 % to +1000 %';
}

/** What is wrong with a range's ends or their order, with a text that would be right; or null. */
export function rangeFault(
  range: QuantityRange,
  scalar: Scalar,
): { readonly message: string; readonly meant: string | null } | null {
  const { low, high } = range;
  if (high.value === Infinity && scalar.endless !== true) {
    return { message: `\`${formatSpecRange(range)}\` has no upper end: one is needed here`, meant: null };
  }
  for (const end of [low, high]) {
    const fault =
      Number.isFinite(end.value) || Number.isNaN(end.value)
        ? boundFault(end, () => formatSpecQuantity(end), scalar.bounds)
        : null;
    if (fault !== null) return { message: fault, meant: null };
  }
  if (low.unit !== high.unit || low.value <= high.value) return null;
  return { message: `\`${formatSpecRange(range)}\` runs backwards`, meant: formatSpecRange({ low: high, high: low }) };
}

const isWithin = (value: number, { low, high, zero }: Bounds) =>
  (value === 0 && zero === true) || (value >= low && value <= high);

const isSensible = ({ low, high, perKelvin = 0 }: Tolerance) =>
  low >= toleranceBounds.low && high <= toleranceBounds.high && perKelvin >= 0 && perKelvin <= toleranceBounds.perKelvin;

function span({ unit }: Quantity, { low, high, zero }: Bounds): string {
  const shown = `from ${signed({ value: low, unit })} to ${signed({ value: high, unit })}`;
  return zero === true ? `${shown}, or 0` : shown;
}

const signed = (quantity: Quantity) => formatSpecQuantity(quantity).replace('-', '−');
