/** Reads a CSV table of numbers: a header that names columns and units, then rows; comments begin with `#`. */
import { readUnit } from '../../units/read-unit';
import type { Unit } from '../../units/quantity';
import type { TableFault } from './spec-table';

/** What a column must be. */
export interface ColumnRole {
  /** What messages call it. */
  readonly called: string;
  /** Names it may have, in lower case. */
  readonly names: readonly string[];
  readonly units: readonly (Unit | 'rad')[];
  /** How the header names it, for messages. */
  readonly example: string;
}

/** A column of numbers in base units. */
export interface Column {
  readonly unit: Unit | 'rad';
  readonly values: readonly number[];
}

/** Columns by role; null for one that is not there. */
export interface CsvTable {
  readonly columns: readonly (Column | null)[];
  /** The line of each row, from 1. */
  readonly lines: readonly number[];
}

/** A table, or what is wrong with it. */
export type CsvReading = { readonly csv: CsvTable } | TableFault;

/** Where a role's column stands and how its numbers count. */
interface Head {
  readonly at: number;
  readonly unit: Unit | 'rad';
  readonly power: number;
}

/** Reads a text; columns that have no role are passed over. Never throws. */
export function readCsv(text: string, roles: readonly ColumnRole[]): CsvReading {
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\n|\r/);
  const first = lines.findIndex(isContent);
  const header = lines[first];
  if (header === undefined) return { fault: 'the table is empty', line: null };
  const delimiter = /\t/.test(header) ? '\t' : header.includes(';') ? ';' : ',';
  const titles = header.split(delimiter).map(unquoted);
  const heads: (Head | null)[] = [];
  for (const role of roles) {
    const head = headOf(role, titles);
    if (head !== null && 'fault' in head) return { fault: head.fault, line: first + 1 };
    heads.push(head);
  }
  return readRows(lines, first + 1, delimiter, titles.length, heads);
}

const isContent = (line: string) => /^\s*[^#\s]/.test(line);

const unquoted = (field: string) =>
  field
    .trim()
    .replace(/^"(.*)"$/, '$1')
    .trim();

function headOf(role: ColumnRole, titles: readonly string[]): Head | null | { readonly fault: string } {
  const found = titles.findIndex((title) => role.names.includes(wordsOf(title).name));
  const title = titles[found];
  if (title === undefined) return null;
  const { unit: written } = wordsOf(title);
  if (written === '') return { fault: `the column \`${title}\` names no unit: write it like \`${role.example}\`` };
  if (role.units.includes('rad') && /^rad(?:ians?)?$/i.test(written)) return { at: found, unit: 'rad', power: 0 };
  const read = readUnit(written.replace(/^°$/, 'deg'));
  if (read === null || !role.units.includes(read.unit)) {
    return { fault: `\`${written}\` is no unit for ${role.called}: write the column like \`${role.example}\`` };
  }
  return { at: found, unit: read.unit, power: read.power };
}

/** `frequency (kHz)`, `gain [dB]`, `phase/deg`, `frequency_Hz`, `level dBFS`. */
function wordsOf(title: string): { readonly name: string; readonly unit: string } {
  const parts = /^(?<name>[A-Za-z0-9|]+)\s*(?:[([/_,:]|\bin\b)?\s*(?<unit>.*?)\s*[)\]]?$/.exec(title)?.groups;
  return { name: (parts?.['name'] ?? '').toLowerCase(), unit: parts?.['unit'] ?? '' };
}

function readRows(
  lines: readonly string[],
  from: number,
  delimiter: string,
  width: number,
  heads: readonly (Head | null)[],
): CsvReading {
  const values: number[][] = heads.map(() => []);
  const rows: number[] = [];
  for (let index = from; index < lines.length; index += 1) {
    const line = lines[index] ?? '';
    if (!isContent(line)) continue;
    const fields = line.split(delimiter).map(unquoted);
    if (fields.length !== width) return { fault: wrongWidth(fields.length, width, delimiter), line: index + 1 };
    for (const [column, head] of heads.entries()) {
      if (head === null) continue;
      const value = numberOf(fields[head.at] ?? '');
      if (typeof value === 'string') return { fault: value, line: index + 1 };
      values[column]?.push(head.power === 0 ? value : Number(`${value}e${head.power}`));
    }
    rows.push(index + 1);
  }
  if (rows.length === 0) return { fault: 'the table has a header and no rows', line: null };
  const columns = heads.map((head, column) => (head === null ? null : { unit: head.unit, values: values[column] ?? [] }));
  return { csv: { columns, lines: rows } };
}

function wrongWidth(got: number, width: number, delimiter: string): string {
  const said = `${got} values stand under ${width} columns`;
  return delimiter === ',' && got > width ? `${said}: decimals take a point, a comma begins the next column` : said;
}

function numberOf(field: string): number | string {
  const plain = field.replace(/\u2212/g, '-');
  if (/^[+-]?(?:\d+\.?\d*|\.\d+)(?:[eE][+-]?\d+)?$/.test(plain)) {
    const value = Number(plain);
    return Number.isFinite(value) ? value : `\`${field}\` is too large`;
  }
  if (/^[+-]?\d+,\d+$/.test(plain)) return `\`${field}\` has a decimal comma: decimals take a point`;
  return field === '' ? 'a value is missing' : `\`${field}\` is not a number`;
}
