/** What is wrong with a text that should be a quantity, and what it may have been meant as. */

/** A fault of a quantity or range. */
export interface QuantityFault {
  readonly code: 'not-a-quantity' | 'wrong-unit';
  /** A sentence for people. */
  readonly message: string;
  /** Texts that would be right in its place, likeliest first. */
  readonly suggestions: readonly string[];
}

/** A fault with the code `not-a-quantity`. */
export const notAQuantity = (message: string, ...suggestions: readonly string[]): QuantityFault => ({
  code: 'not-a-quantity',
  message,
  suggestions,
});

/** A fault with the code `wrong-unit`. */
export const wrongUnit = (message: string, ...suggestions: readonly string[]): QuantityFault => ({
  code: 'wrong-unit',
  message,
  suggestions,
});

/** "a", "a or b", "a, b or c". */
export function orList(items: readonly string[]): string {
  if (items.length < 2) return items.join('');
  return `${items.slice(0, -1).join(', ')} or ${items.at(-1) ?? ''}`;
}
