/** A reading with what the spec layer itself keeps of it: slices, names, resolutions; other layers see only `Reading`. */
import { noFiles } from './files/file-source';
import type { FileSource } from './files/file-source';
import { nothingShelved } from './files/shelved';
import type { Shelved } from './files/shelved';
import { lineIndex } from './line-index';
import type { LineIndex } from './line-index';
import type { Names, PlacedSlice } from './placed';
import type { Reading } from './reading';
import type { NameLists, Resolved } from './resolver';

export type { Names, PlacedName, PlacedSlice } from './placed';

/** What the spec layer keeps. */
export interface Inside {
  readonly slices: readonly PlacedSlice[];
  readonly names: Names;
  readonly lists: NameLists;
  readonly resolved: ReadonlyMap<string, Resolved>;
  /** Other files that were read. */
  readonly shelved: Shelved;
  /** Where their contents came from. */
  readonly files: FileSource;
}

/** A reading as `read` makes it. */
export class SpecReading implements Reading {
  readonly text: string;
  readonly title: string | null;
  readonly entries: Reading['entries'];
  readonly names: Reading['names'];
  readonly problems: Reading['problems'];
  readonly acceptances: Reading['acceptances'];
  readonly paths: Reading['paths'];
  readonly counts: Reading['counts'];
  private index: LineIndex | null = null;

  constructor(
    shown: Reading,
    readonly inside: Inside,
  ) {
    this.text = shown.text;
    this.title = shown.title;
    this.entries = shown.entries;
    this.names = shown.names;
    this.problems = shown.problems;
    this.acceptances = shown.acceptances;
    this.paths = shown.paths;
    this.counts = shown.counts;
  }

  /** Made when it is first asked for, and kept. */
  get lines(): LineIndex {
    this.index ??= lineIndex(this.text);
    return this.index;
  }
}

/** What the spec layer keeps of a reading; throws RangeError for one that `read` has not made. */
export function insideOf(reading: Reading): Inside {
  return ownReading(reading).inside;
}

/** The line index of a reading's text. */
export function lineIndexOf(reading: Reading): LineIndex {
  return ownReading(reading).lines;
}

function ownReading(reading: Reading): SpecReading {
  if (!(reading instanceof SpecReading)) throw new RangeError('a reading that `read` has not made');
  return reading;
}

/** What there is before anything has been read. */
export const nothingRead: Inside = {
  slices: [],
  names: { clocks: new Map(), filters: new Map(), sources: new Map(), masks: new Map(), channels: new Map() },
  lists: { clocks: [], filters: [], sources: [], masks: [], channels: [] },
  resolved: new Map(),
  shelved: nothingShelved,
  files: noFiles,
};
