/** Reads what stands behind a value as its tolerance: `± 5 %`, `+ 80 % - 20 %`, and a temperature coefficient. */
import { notAQuantity } from './fault';
import type { QuantityFault } from './fault';
import { numberAhead, scaled } from './number-text';
import type { Kind, Tolerance } from './quantity';
import { readSingle } from './read-single';

/** A tolerance, or why there is none. */
export type ToleranceReading = { readonly tolerance: Tolerance } | { readonly fault: QuantityFault };

/** One signed piece of a tolerance, e.g. "±" and "5 %". */
interface Piece {
  readonly sign: '±' | '+' | '-';
  readonly text: string;
}

/**
 * Reads a tolerance. An absolute deviation in the value's own unit is taken too and made relative.
 * @param tail text in its one spelling, from the first sign on
 * @param value the value it stands behind, in its base unit
 */
export function readTolerance(tail: string, value: number, kinds: readonly Kind[]): ToleranceReading {
  const pieces = piecesOf(tail);
  const last = pieces.at(-1);
  const perKelvin = last?.sign === '±' ? coefficient(last.text) : null;
  const plain = perKelvin === null ? pieces : pieces.slice(0, -1);
  const spread =
    plain.length === 0 && perKelvin !== null ? { tolerance: { low: 0, high: 0 } } : readSpread(plain, value, kinds, tail);
  if ('fault' in spread || perKelvin === null) return spread;
  return { tolerance: { ...spread.tolerance, perKelvin } };
}

function piecesOf(tail: string): readonly Piece[] {
  const pieces: Piece[] = [];
  // A sign right behind an exponent's e belongs to its number.
  for (const match of tail.matchAll(/([±+-])((?:[eE][+-]\d|[^±+-])*)/g)) {
    pieces.push({ sign: match[1] === '±' ? '±' : match[1] === '+' ? '+' : '-', text: (match[2] ?? '').trim() });
  }
  return pieces;
}

/** "30 ppm/°C" as a relative change per kelvin, or null where it is not a coefficient. */
function coefficient(text: string): number | null {
  const ahead = numberAhead(text);
  const unit = /^ *(ppm|%) ?\/ ?(?:°C|K)$/.exec(ahead?.rest ?? '')?.[1];
  if (ahead === null || unit === undefined) return null;
  return scaled(ahead.digits, unit === '%' ? -2 : -6);
}

function readSpread(pieces: readonly Piece[], value: number, kinds: readonly Kind[], tail: string): ToleranceReading {
  const [first, second] = pieces;
  if (first === undefined || pieces.length > 2) return { fault: unreadable(tail) };
  if (second === undefined) {
    if (first.sign !== '±') return { fault: unreadable(tail) };
    const both = deviation(first.text, value, kinds);
    return typeof both === 'number' ? { tolerance: { low: 0 - both, high: both } } : { fault: both };
  }
  if (first.sign === second.sign || first.sign === '±' || second.sign === '±') return { fault: unreadable(tail) };
  const up = deviation((first.sign === '+' ? first : second).text, value, kinds);
  const down = deviation((first.sign === '+' ? second : first).text, value, kinds);
  if (typeof up !== 'number') return { fault: up };
  if (typeof down !== 'number') return { fault: down };
  return { tolerance: { low: 0 - down, high: up } };
}

function deviation(text: string, value: number, kinds: readonly Kind[]): number | QuantityFault {
  const read = readSingle(text, ['share', ...kinds]);
  if ('fault' in read) return read.fault;
  if (read.unit === '%' || read.unit === 'ppm') return read.value;
  return value === 0 ? notAQuantity(`a deviation of \`${text}\` from zero has no relative size`) : Math.abs(read.value / value);
}

const unreadable = (tail: string) =>
  notAQuantity(
    `\`${tail}\` is not a tolerance: write \`± 5 %\`, or \`+ 80 % - 20 %\` for an uneven one, with \`± 30 ppm/°C\` behind it if need be`,
  );
