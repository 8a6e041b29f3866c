/** What a file that a spec names holds, once it has been read. */
import type { Unit } from '../../units/quantity';
import type { ResponseTable } from '../model-stage';

/** A use of a table in a spec: what for, the spec's own file (null for the one that is read), and the path as it stands there. */
export interface TableUse {
  readonly role: 'response' | 'spectrum';
  readonly file: string | null;
  readonly path: string;
}

/** One string for a use, so that uses can be compared. */
export const markOf = ({ role, file, path }: TableUse): string => JSON.stringify([role, file, path]);

/** The use that a mark stands for. */
export function useOf(mark: string): TableUse {
  const [role, file, path] = JSON.parse(mark) as [TableUse['role'], string | null, string];
  return { role, file, path };
}

/** A two-port as measured between equal reference resistances. */
export interface Network {
  readonly referenceOhm: number;
  readonly frequenciesHz: readonly number[];
  readonly s11: readonly Complex[];
  readonly s21: readonly Complex[];
  readonly s12: readonly Complex[];
  readonly s22: readonly Complex[];
}

/** A complex number. */
export interface Complex {
  readonly re: number;
  readonly im: number;
}

/** Levels over frequency, in the unit of the table's header. */
export interface SpectrumTable {
  readonly kind: 'spectrum';
  readonly unit: Unit;
  readonly frequenciesHz: readonly number[];
  readonly levels: readonly number[];
}

/** A table that has been read. */
export type SpecTable =
  | { readonly kind: 'response'; readonly table: ResponseTable }
  | { readonly kind: 'network'; readonly network: Network }
  | SpectrumTable;

/** A table, or what is wrong with it; `line` counts from 1, null where it is the file as a whole. */
export type TableReading = { readonly table: SpecTable } | TableFault;

/** What is wrong with a table. */
export interface TableFault {
  readonly fault: string;
  readonly line: number | null;
}
