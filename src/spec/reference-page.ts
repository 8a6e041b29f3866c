/** The reference page of the language as Markdown: every map with its keys, made from the declaration that the program reads by. */
import { unitsOf } from '../units/unit-table';
import { declaration } from './declaration/top-level';
import type { Fields, Key, Scalar, Shape } from './shape';

/** The page. */
export function referencePage(): string {
  const chapters = mapsBelow(declaration).map(chapterOf);
  return `# The spec language\n\n${introduction}\n\n${chapters.join('\n\n')}\n`;
}

const introduction = `Every key that a spec may hold, made from the declaration by which specs are read. Where a value may take several forms, the text
decides. A key that is marked *later* is in the language but not computed yet; using it is an error that says so.`;

/** Every map with known keys, each once, those nearer to the top first. */
function mapsBelow(top: Shape<unknown>): readonly Fields[] {
  const found: Fields[] = [];
  let level: readonly Shape<unknown>[] = [top];
  while (level.length > 0) {
    for (const { map } of level) if (map !== undefined && 'fields' in map && isNew(found, map)) found.push(map);
    level = level.flatMap((shape) => innerOf(shape)).filter((shape) => !isKnown(found, shape));
  }
  return found;
}

/** Some maps, such as that of a limit, are declared once for each key: one of each kind is told. */
function isNew(found: readonly Fields[], map: Fields): boolean {
  return !found.some((other) => other === map || signatureOf(other) === signatureOf(map));
}

function signatureOf({ called, fields }: Fields): string {
  return `${called}: ${Object.keys(fields).join(' ')}`;
}

function isKnown(found: readonly Fields[], { map, list }: Shape<unknown>): boolean {
  return list === undefined && map !== undefined && 'fields' in map && found.includes(map);
}

function innerOf({ map, list }: Shape<unknown>): readonly Shape<unknown>[] {
  const items = list === undefined ? [] : [list.each];
  if (map === undefined) return items;
  return [...items, ...('each' in map ? [map.each] : Object.values(map.fields).map(({ shape }) => shape))];
}

function chapterOf(map: Fields): string {
  const keys = Object.entries(map.fields);
  const rows = keys.filter(([, { later }]) => later !== true).map(([name, key]) => rowOf(name, key));
  const later = keys.filter(([, key]) => key.later === true).map(([name]) => `\`${name}\``);
  const words = keys.flatMap(([name, { shape }]) => wordsOf(name, shape.scalar));
  const parts = [
    `## ${titleOf(map)}`,
    `| key | holds | without it |\n|---|---|---|\n${rows.join('\n')}`,
    words.join('\n'),
    later.length === 0 ? '' : `*Later*: ${later.join(', ')}.`,
  ];
  return parts.filter((part) => part !== '').join('\n\n');
}

/** "A channel", "The limits"; of the limits' long forms the one with its own keys is told apart. */
function titleOf({ called, fields }: Fields): string {
  const title = `${called.charAt(0).toUpperCase()}${called.slice(1)}`;
  return called === 'a limit' ? `${title} in its long form: ${Object.keys(fields).join(', ')}` : title;
}

function rowOf(name: string, key: Key): string {
  const { shape, about, only, required, fallback } = key;
  const where = only === undefined ? '' : ` (${only.join(', ')})`;
  const units = unitsIn(shape.scalar);
  const holds = [about, units === '' ? '' : `Units: ${units}.`].filter((part) => part !== '').join(' ');
  const without = required === true ? `required${besideWords(key)}` : (fallback ?? companyOf(key));
  return `| \`${name}\`${where} | ${cell(holds)} | ${cell(without)} |`;
}

/** What a key that has no default stands beside. */
function companyOf(key: Key): string {
  return key.with === undefined ? '–' : `only${besideWords(key)}`;
}

function besideWords({ with: beside }: Key): string {
  return beside === undefined ? '' : ` beside ${beside.map((other) => `\`${other}\``).join(', ')}`;
}

function unitsIn(scalar: Scalar | undefined): string {
  const kinds = [...(scalar?.quantity ?? []), ...(scalar?.range ?? [])];
  return [...new Set(unitsOf(kinds).map(({ unit, spellings }) => spellings[0] ?? unit))].join(', ');
}

function wordsOf(name: string, scalar: Scalar | undefined): string[] {
  const words = Object.entries(scalar?.words ?? {});
  return words.length === 0 ? [] : [`- \`${name}\`: ${words.map(([word, about]) => `\`${word}\` – ${about}`).join(' ')}`];
}

/** A bar would end the cell. */
function cell(text: string): string {
  return text.replaceAll('|', '\\|');
}
