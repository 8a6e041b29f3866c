/** The few operations on enclosures that bounds are made of. */
import type { Enclosure } from './response';

/**
 * −x for every x of an enclosure.
 *
 * @example negated({ low: -1, high: 3 }).low // -3
 */
export function negated({ low, high }: Enclosure): Enclosure {
  return { low: -high, high: -low };
}

/**
 * x/c for every x and every c > 0.
 *
 * @example dividedBy({ low: -1, high: 3 }, { low: 0.5, high: 2 }).high // 6
 */
export function dividedBy(value: Enclosure, divisor: Enclosure): Enclosure {
  return {
    low: Math.min(value.low / divisor.low, value.low / divisor.high),
    high: Math.max(value.high / divisor.low, value.high / divisor.high),
  };
}

/**
 * x·c for every x and every c ≥ 0.
 *
 * @example times({ low: -1, high: 3 }, { low: 0, high: 2 }).low // -2
 */
export function times(value: Enclosure, factor: Enclosure): Enclosure {
  return {
    low: Math.min(value.low * factor.low, value.low * factor.high),
    high: Math.max(value.high * factor.low, value.high * factor.high),
  };
}

/**
 * The sum of two enclosures, or null where one is missing or infinities cancel.
 *
 * @example plus({ low: -Infinity, high: 1 }, { low: Infinity, high: Infinity }) // null
 */
export function plus(one: Enclosure | null, other: Enclosure | null): Enclosure | null {
  if (one === null || other === null) return null;
  const low = one.low + other.low;
  const high = one.high + other.high;
  return Number.isNaN(low) || Number.isNaN(high) ? null : { low, high };
}

/**
 * The value, or what stands for it where infinities cancelled.
 *
 * @example unlessNaN(Infinity - Infinity, -1) // -1
 */
export function unlessNaN(value: number, otherwise: number): number {
  return Number.isNaN(value) ? otherwise : value;
}
