/** Small type guards from which those of the messages are built. */
import type { PlaceName } from './position';

/** A plain object. */
export function isRecord(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null && !Array.isArray(value);
}

/** A string. */
export function isText(value: unknown): value is string {
  return typeof value === 'string';
}

/** A finite number. */
export function isFiniteNumber(value: unknown): value is number {
  return typeof value === 'number' && Number.isFinite(value);
}

/** A whole number from 0 up. */
export function isCount(value: unknown): value is number {
  return Number.isSafeInteger(value) && (value as number) >= 0;
}

/** Nothing, or what the other guard asks for. */
export function isNullOr<T>(value: unknown, guard: (inner: unknown) => inner is T): value is T | null {
  return value === null || guard(value);
}

/** A list of what the other guard asks for. */
export function isListOf<T>(value: unknown, guard: (inner: unknown) => inner is T): value is readonly T[] {
  return Array.isArray(value) && value.every((inner) => guard(inner));
}

/** A channel and a path below it. */
export function isPlaceName(value: unknown): value is PlaceName {
  if (!isRecord(value) || !isNullOr(value['channel'], isText)) return false;
  return isListOf(value['path'], (step): step is string | number => isText(step) || isCount(step));
}
