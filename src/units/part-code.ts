/** Part values in the form of IEC 60062, where the letter stands in the place of the decimal point: 4k7, 2n2, R47, 10k, 100n. */
import { scaled } from './number-text';
import type { Kind, Unit } from './quantity';

/** A part value that has been read. */
export interface PartValue {
  readonly value: number;
  readonly unit: Unit;
}

const letters: Readonly<Record<string, { readonly unit: Unit; readonly powers: Readonly<Record<string, number>> }>> = {
  resistance: { unit: 'Ω', powers: { R: 0, m: -3, k: 3, K: 3, M: 6, G: 9, T: 12 } },
  capacitance: { unit: 'F', powers: { F: 0, f: -15, p: -12, n: -9, µ: -6, u: -6, m: -3 } },
  inductance: { unit: 'H', powers: { H: 0, p: -12, n: -9, µ: -6, u: -6, m: -3 } },
};

/** The value that a code stands for where a part of one of these kinds is asked for, or null. */
export function readPartCode(text: string, kinds: readonly Kind[]): PartValue | null {
  if (!kinds.some((kind) => Object.hasOwn(letters, kind))) return null;
  const match = /^(\d*)([A-Za-zµ])(\d*)$/.exec(text);
  if (match === null) return null;
  const [, whole = '', letter = '', fraction = ''] = match;
  if (whole === '' && fraction === '') return null;
  const digits = `${whole === '' ? '0' : whole}${fraction === '' ? '' : `.${fraction}`}`;
  for (const kind of kinds) {
    const known = letters[kind];
    const power = known !== undefined && Object.hasOwn(known.powers, letter) ? known.powers[letter] : undefined;
    if (known !== undefined && power !== undefined) return { value: scaled(digits, power), unit: known.unit };
  }
  return null;
}
