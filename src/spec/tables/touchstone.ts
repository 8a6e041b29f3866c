/** Reads the S parameters of a two-port from a Touchstone file, version 1 or 2 (open specification of the EIA/IBIS forum). */
import { frequencyFault } from './frequencies';
import type { Complex, Network, TableFault, TableReading } from './spec-table';
import { readOptions } from './touchstone-options';
import type { Options } from './touchstone-options';
import { keywordsOf, noKeywords } from './touchstone-keywords';
import type { Keywords } from './touchstone-keywords';

/** One line that holds data, without its comment. */
interface DataLine {
  readonly text: string;
  readonly line: number;
}

/** Reads a text; never throws. */
export function readTouchstone(text: string): TableReading {
  const lines = text
    .replace(/^\uFEFF/, '')
    .split(/\r\n|\n|\r/)
    .map((line, index) => ({ text: line.replace(/!.*$/, '').trim(), line: index + 1 }))
    .filter((line) => line.text !== '');
  const option = lines.find((line) => line.text.startsWith('#'));
  const options = readOptions(option?.text ?? '#');
  if ('fault' in options) return { fault: options.fault, line: option?.line ?? null };
  const content = lines.filter((line) => !line.text.startsWith('#'));
  const isKeyed = content.some((line) => /^\[version\]/i.test(line.text));
  const read = isKeyed ? keywordsOf(content) : { keywords: noKeywords, data: content };
  return 'fault' in read ? read : networkOf(read.data, options, read.keywords);
}

function networkOf(data: readonly DataLine[], options: Options, keywords: Keywords): TableReading {
  const records = recordsOf(data, keywords);
  if ('fault' in records) return records;
  const { rows, lines } = records;
  if (rows.length < 2) return { fault: `${rows.length} points are no response: at least two are needed`, line: null };
  const frequenciesHz = rows.map(([frequency = 0]) => Number(`${frequency}e${options.power}`));
  const fault = frequencyFault(frequenciesHz, lines, 'zero allowed');
  if (fault !== null) return fault;
  const parameter = (at: number): readonly Complex[] =>
    rows.map((row) => options.complex(row[1 + 2 * at] ?? 0, row[2 + 2 * at] ?? 0));
  const [s11, s21, s12, s22] = keywords.order.map(parameter);
  if (!s11 || !s21 || !s12 || !s22) return { fault: 'the data are not those of a two-port', line: null };
  const network: Network = { referenceOhm: keywords.referenceOhm ?? options.referenceOhm, frequenciesHz, s11, s21, s12, s22 };
  return { table: { kind: 'network', network } };
}

interface Records {
  readonly rows: readonly (readonly number[])[];
  readonly lines: readonly number[];
}

/** Puts the numbers of the lines into records, each a frequency and its parameters; noise data that follow are left alone. */
function recordsOf(data: readonly DataLine[], { order, frequencies }: Keywords): Records | TableFault {
  const width = 1 + 2 * (Math.max(...order) + 1);
  const rows: number[][] = [];
  const lines: number[] = [];
  let row: number[] = [];
  for (const { text, line } of data) {
    const numbers = text.split(/[\s,]+/).map(Number);
    const odd = numbers.findIndex((value) => !Number.isFinite(value));
    if (odd >= 0) return { fault: `\`${text.split(/[\s,]+/)[odd] ?? ''}\` is not a number`, line };
    // In version 1, noise data begin where the frequency falls back, with five numbers a line.
    const before = rows.at(-1)?.[0];
    if (row.length === 0 && numbers.length === 5 && before !== undefined && (numbers[0] ?? 0) <= before) break;
    if (row.length === 0) lines.push(line);
    row.push(...numbers);
    if (row.length > width) return { fault: `${row.length} numbers stand where a two-port has ${width}`, line };
    if (row.length === width) {
      rows.push(row);
      row = [];
    }
  }
  if (row.length > 0) return { fault: `the last point has ${row.length} numbers of ${width}`, line: lines.at(-1) ?? null };
  if (frequencies !== null && frequencies !== rows.length) {
    return { fault: `[Number of Frequencies] says ${frequencies}, and ${rows.length} points stand in the file`, line: null };
  }
  return { rows, lines };
}
