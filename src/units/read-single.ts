/** Reads one number with one unit, of text in its one spelling: the piece that quantities, ranges and tolerances are made of. */
import { notAQuantity, orList, wrongUnit } from './fault';
import type { QuantityFault } from './fault';
import { numberAhead, scaled } from './number-text';
import { readPartCode } from './part-code';
import type { Kind, Unit } from './quantity';
import { meantUnits, readUnit } from './read-unit';
import { kindProse, unitsOf } from './unit-table';
import type { UnitEntry } from './unit-table';

/** A number and its unit, or why there is none. */
export type SingleReading = { readonly value: number; readonly unit: Unit } | { readonly fault: QuantityFault };

/** Reads `<number> <unit>`, a part code where a part is asked for, or a zero without a unit. */
export function readSingle(text: string, kinds: readonly Kind[]): SingleReading {
  const part = readPartCode(text, kinds);
  if (part !== null) return part;
  const ahead = numberAhead(text);
  if (ahead === null) return { fault: noNumber(text, kinds) };
  const unitText = ahead.rest.trim();
  const odd = oddNumber(text, ahead.digits, ahead.rest);
  if (odd !== null) return { fault: odd };
  if (unitText === '') return withoutUnit(ahead.digits, kinds);
  const read = readUnit(unitText);
  if (read === null) return { fault: unknownUnit(ahead.digits, unitText, kinds) };
  if (!read.kinds.some((kind) => kinds.includes(kind))) return { fault: otherKind(text, ahead.digits, read.kinds, kinds) };
  return { value: scaled(ahead.digits, read.power), unit: read.unit };
}

/** What these kinds are called: "a frequency", "a time or a percentage". */
export const called = (kinds: readonly Kind[]): string => orList([...new Set(kinds.map((kind) => kindProse[kind].called))]);

/** An example of the first of these kinds. */
export const exampleOf = (kinds: readonly Kind[]): string => kinds.map((kind) => kindProse[kind].example)[0] ?? '';

/** More choices than this help nobody. */
const mostSuggestions = 4;

function withoutUnit(digits: string, kinds: readonly Kind[]): SingleReading {
  const units = unitsOf(kinds);
  const [first] = units;
  if (first !== undefined && scaled(digits, 0) === 0) return { value: 0, unit: first.unit };
  const prefixed = first?.unit === 'Hz' ? ['Hz', 'kHz', 'MHz'] : first?.unit === 's' ? ['s', 'ms', 'µs', 'ns'] : null;
  const meant = prefixed ?? units.filter(({ unit }) => !(digits.startsWith('-') && unit.startsWith('V'))).map(spelled);
  const suggestions = meant.slice(0, mostSuggestions).map((unit) => `${digits} ${unit}`);
  return {
    fault: notAQuantity(`\`${digits}\` has no unit: ${called(kinds)} is written like \`${exampleOf(kinds)}\``, ...suggestions),
  };
}

function noNumber(text: string, kinds: readonly Kind[]): QuantityFault {
  const signed = /^([+-]) +(?=[\d.])/.exec(text);
  if (signed !== null) {
    const meant = text.replace(/^([+-]) +/, '$1');
    return notAQuantity(`a space stands between the sign and the number in \`${text}\``, meant);
  }
  const shown = text === '' ? 'nothing stands here' : `\`${text}\` is not ${called(kinds)}`;
  return notAQuantity(`${shown}: write a number and a unit, such as \`${exampleOf(kinds)}\``);
}

/** Slips inside the number: a decimal comma, separated thousands, a point at its end. */
function oddNumber(text: string, digits: string, rest: string): QuantityFault | null {
  const commas = /^(?:,\d+)+/.exec(rest)?.[0];
  if (commas !== undefined) return commaFault(digits, commas, rest.slice(commas.length));
  if (/^\.(?!\.)/.test(rest)) {
    const meant = digits + rest.slice(1);
    return notAQuantity(`the number in \`${text}\` ends in a point`, meant);
  }
  if (/^[ _']\d/.test(rest)) {
    const meant = text.replace(/(?<=\d)[ _'](?=\d)/g, '');
    return notAQuantity(`\`${text}\` has its digits in groups: write them without a gap`, meant);
  }
  return null;
}

function commaFault(digits: string, commas: string, unit: string): QuantityFault {
  const groups = commas.split(',').slice(1);
  if (groups.length === 1 && !digits.includes('.')) {
    const meant = `${digits}.${groups.join('')}${unit}`;
    return notAQuantity(`\`${digits}${commas}${unit}\` has a decimal comma: decimals stand behind a point`, meant);
  }
  return notAQuantity(
    `\`${digits}${commas}${unit}\` has commas between its digits: write them without`,
    `${digits}${groups.join('')}${unit}`,
  );
}

function unknownUnit(digits: string, unitText: string, kinds: readonly Kind[]): QuantityFault {
  const meant = meantUnits(unitText, kinds);
  const written = `\`${digits} ${unitText}\``;
  if (meant.length === 0) return wrongUnit(`${written} has no unit of ${bare(kinds)}: it is given in ${unitNames(kinds)}`);
  const units = orList(meant.map((unit) => `\`${unit}\``));
  return wrongUnit(`${written}: the unit is written ${units}`, ...meant.map((unit) => `${digits} ${unit}`));
}

function otherKind(text: string, digits: string, got: readonly Kind[], wanted: readonly Kind[]): QuantityFault {
  const suggestions = got.includes('decibel') ? decibelSuggestions(digits, wanted) : [];
  const message = `\`${text}\` is ${called(got.slice(0, 1))}, where ${called(wanted)} (${unitNames(wanted)}) is needed`;
  return wrongUnit(message, ...suggestions);
}

/** A level written in plain dB is the one mistake of kind with an evident meaning. */
function decibelSuggestions(digits: string, wanted: readonly Kind[]): readonly string[] {
  return unitsOf(wanted)
    .filter((known) => known.unit === 'dBFS' || known.unit === 'dBc')
    .map((known) => `${digits} ${known.unit}`);
}

const bare = (kinds: readonly Kind[]) => called(kinds).replace(/^an? /, '');

const unitNames = (kinds: readonly Kind[]) => orList(unitsOf(kinds).map(spelled));

const spelled = ({ spellings, unit }: UnitEntry) => spellings[0] ?? unit;
