/** Reads a table by what it is used for and by the name of its file. */
import { readResponseCsv } from './response-csv';
import { readSpectrumCsv } from './spectrum-csv';
import type { TableReading, TableUse } from './spec-table';
import { readTouchstone } from './touchstone';

/** Reads a table's text; never throws. */
export function readTable(role: TableUse['role'], path: string, text: string): TableReading {
  const touchstone = /\.s(\d+)p$/i.exec(path)?.[1];
  if (role === 'spectrum') {
    if (touchstone === undefined) return readSpectrumCsv(text);
    return { fault: 'a Touchstone file holds no levels: a spectrum is a CSV table of frequency and level', line: null };
  }
  if (touchstone === undefined) return readResponseCsv(text);
  if (touchstone === '2') return readTouchstone(text);
  return { fault: `a stage has two ports, this file has ${touchstone}: \`.s2p\` is needed`, line: null };
}
