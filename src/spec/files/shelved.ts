/** What a reading keeps of other files, so that the next one need not read them again. */
import type { Names, PlacedSlice } from '../placed';
import type { TableReading } from '../tables/spec-table';

/** Another spec whose names are used. */
export interface UsedSpec {
  readonly path: string;
  readonly text: string;
  readonly slices: readonly PlacedSlice[];
  readonly names: Names;
}

/** A table with the text it was read from. */
export interface ReadTable {
  readonly text: string;
  readonly reading: TableReading;
}

/** What a reading keeps of other files. */
export interface Shelved {
  readonly specs: ReadonlyMap<string, UsedSpec>;
  readonly tables: ReadonlyMap<string, ReadTable>;
}

/** Nothing yet. */
export const nothingShelved: Shelved = { specs: new Map(), tables: new Map() };
