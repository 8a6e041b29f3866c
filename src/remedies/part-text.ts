/** A part's value written anew in the form that the old one has, its tolerance kept: `4k7 ± 1 %` becomes `5k6 ± 1 %`. */
import { formatSpecQuantity } from '../units/format-spec';
import type { Quantity } from '../units/quantity';

/** The text of a part with another value, of at most three figures. */
export function rewritePart(oldText: string, value: number, unit: Quantity['unit']): string {
  const tail = /\s*(?:±|\+\/-|\+-|\+\s*\d).*$/su.exec(oldText)?.[0] ?? '';
  const head = oldText.slice(0, oldText.length - tail.length);
  const isCode = /^\d*[A-Za-zµμ]\d*$/u.test(head.trim());
  return `${isCode ? codeOf(value, unit) : formatSpecQuantity({ value, unit })}${tail}`;
}

/** The letters of IEC 60062 from small to large, with the power of ten that each stands for. */
const letters: readonly (readonly [letter: string, power: number])[] = [
  ['p', -12],
  ['n', -9],
  ['u', -6],
  ['m', -3],
  ['R', 0],
  ['k', 3],
  ['M', 6],
  ['G', 9],
];

/** The letter stands in the place of the decimal point. */
function codeOf(value: number, unit: Quantity['unit']): string {
  // Only a resistor has R, and nothing smaller than it in this form.
  const usable = letters.filter(([letter, power]) => (unit === 'Ω' ? power >= 0 : letter !== 'R' && power < 0));
  const fitting = usable.filter(([, power]) => value >= 10 ** power * (1 - 1e-9)).at(-1) ?? usable[0];
  if (fitting === undefined) return formatSpecQuantity({ value, unit });
  const [letter, power] = fitting;
  const [whole = '0', fraction = ''] = String(Number((value / 10 ** power).toPrecision(3))).split('.');
  return `${whole}${letter}${fraction}`;
}
