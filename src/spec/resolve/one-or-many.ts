/** A single item that stands where a list may stand is a list of one. */

/** Whether a value is a list, for unions with one list in them. */
export function isList<T>(value: T): value is Extract<T, readonly unknown[]> {
  return Array.isArray(value);
}

/** The items of a list, or the one item. */
export function oneOrMany<T>(value: T | readonly T[]): readonly T[] {
  return Array.isArray(value) ? (value as readonly T[]) : [value as T];
}
