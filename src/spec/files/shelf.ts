/** The files of one reading: asked for by path, read once, and taken over from an earlier reading where their text is the same. */
import { readSlices } from '../read-slices';
import { namesIn } from '../names';
import { scan } from '../slices/scan';
import { readTable } from '../tables/read-table';
import type { TableReading, TableUse } from '../tables/spec-table';
import { largestSpec } from '../too-large';
import { vocabulary } from '../vocabulary';
import { largestTable } from './file-source';
import type { FileFault, FileSource } from './file-source';
import type { ReadTable, Shelved, UsedSpec } from './shelved';

/** A file's text, or why there is none. */
export type FileText = { readonly text: string } | FileProblem;

/** Why a file is of no use. */
export interface FileProblem {
  readonly code: 'file-not-read' | 'too-large';
  readonly problem: string;
}

/** Loads and reads files for one reading. */
export class Shelf {
  private readonly specs = new Map<string, UsedSpec>();
  private readonly tables = new Map<string, ReadTable>();
  private readonly asked = new Set<string>();

  constructor(
    readonly files: FileSource,
    private readonly before: Shelved,
  ) {}

  /** What was read, for the next reading; the earlier one is let go. */
  get shelved(): Shelved {
    return { specs: this.specs, tables: this.tables };
  }

  /** Every path that was asked for, from the root, in order. */
  get paths(): readonly string[] {
    return [...this.asked].sort();
  }

  /** Another spec, or why it cannot be used. */
  spec(path: string): UsedSpec | FileProblem {
    const known = this.specs.get(path);
    if (known !== undefined) return known;
    const loaded = this.load(path, largestSpec, '16 MiB');
    if ('problem' in loaded) return loaded;
    const before = this.before.specs.get(path);
    const spec = before?.text === loaded.text ? before : usedSpec(path, loaded.text, before);
    this.specs.set(path, spec);
    return spec;
  }

  /** A table, or why it cannot be used. */
  table(role: TableUse['role'], path: string): TableReading | FileProblem {
    const mark = `${role} ${path}`;
    const known = this.tables.get(mark);
    if (known !== undefined) return known.reading;
    const loaded = this.load(path, largestTable, '64 MiB');
    if ('problem' in loaded) return loaded;
    const before = this.before.tables.get(mark);
    const read = before?.text === loaded.text ? before : { text: loaded.text, reading: readTable(role, path, loaded.text) };
    this.tables.set(mark, read);
    return read.reading;
  }

  private load(path: string, largest: number, most: string): FileText {
    this.asked.add(path);
    const content = this.files.content(path);
    if (content === null) return { code: 'file-not-read', problem: `\`${path}\` has not been read` };
    if ('text' in content && content.text.length <= largest) return content;
    const fault = 'text' in content ? 'too-large' : content.fault;
    if (fault === 'too-large') return { code: 'too-large', problem: `\`${path}\` is larger than ${most}, the most that is read` };
    return { code: 'file-not-read', problem: `\`${path}\`: ${reasons[fault]}` };
  }
}

const reasons: Readonly<Record<Exclude<FileFault, 'too-large'>, string>> = {
  missing: 'there is no such file',
  unreadable: 'it cannot be read',
  outside: 'it lies outside the root, where no file may be named',
  folder: 'it is a folder',
  'not-text': 'it is not UTF-8 text',
};

function usedSpec(path: string, text: string, before: UsedSpec | undefined): UsedSpec {
  const { slices } = scan(text, vocabulary);
  const { placed } = readSlices(slices, before ?? { slices: [], names: namesIn([]) });
  return { path, text, slices: placed, names: namesIn(placed) };
}
