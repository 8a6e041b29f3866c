/** Reads one physical value with its unit and, behind it, its tolerance. */
import { notAQuantity } from './fault';
import type { QuantityFault } from './fault';
import { numberAhead } from './number-text';
import { oneSpelling } from './one-spelling';
import type { Kind, Quantity } from './quantity';
import { readSingle } from './read-single';
import { readTolerance } from './read-tolerance';

/** A quantity, or why there is none. */
export type QuantityReading = { readonly quantity: Quantity } | { readonly fault: QuantityFault };

/**
 * Reads `<number> <unit>`, with a tolerance if one stands behind it.
 * @param text a scalar's source text; all alike spellings are read alike
 * @param kinds the kinds of quantity that may stand here; the first decides the unit of a bare zero
 */
export function readQuantity(text: string, kinds: readonly Kind[]): QuantityReading {
  const plain = oneSpelling(text);
  if (plain.includes('..')) return { fault: notAQuantity(`\`${plain}\` is a range where one value is needed`) };
  const { head, tail } = splitAtTolerance(plain);
  const single = readSingle(head, kinds);
  if ('fault' in single) return { fault: withTail(single.fault, tail) };
  if (tail === '') return { quantity: { value: single.value, unit: single.unit } };
  const dash = rangeWrittenWithDash(head, tail, kinds);
  if (dash !== null) return { fault: dash };
  const read = readTolerance(tail, single.value, kinds);
  return 'fault' in read ? read : { quantity: { value: single.value, unit: single.unit, tolerance: read.tolerance } };
}

/** Cuts a text in its one spelling before the first sign that is not its number's own. */
export function splitAtTolerance(plain: string): { readonly head: string; readonly tail: string } {
  // A sign at the very start is the number's, or a slip that the head's own fault names.
  const from = numberAhead(plain)?.digits.length ?? 1;
  const found = plain.slice(from).search(/[±+]|-(?![a-zA-Z])/);
  const cut = found < 0 ? plain.length : from + found;
  return { head: plain.slice(0, cut).trim(), tail: plain.slice(cut) };
}

function withTail(fault: QuantityFault, tail: string): QuantityFault {
  if (tail === '') return fault;
  return { ...fault, suggestions: fault.suggestions.map((suggestion) => `${suggestion} ${tail}`) };
}

function rangeWrittenWithDash(head: string, tail: string, kinds: readonly Kind[]): QuantityFault | null {
  if (!tail.startsWith('-')) return null;
  const upper = tail.slice(1).trim();
  if ('fault' in readSingle(upper, kinds)) return null;
  return notAQuantity(`\`${head} ${tail}\` is not one value; a range is written with two points`, `${head} .. ${upper}`);
}
