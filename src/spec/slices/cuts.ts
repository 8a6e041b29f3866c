/** Collects where slices begin, and the faults of lines that belong to none. */
import { fault } from '../slips/fault';
import type { Fault } from '../slips/fault';
import { lineEndAt } from './content-lines';
import type { ContentLines } from './content-lines';
import { keyLineAt } from './key-line';
import type { KeyLine } from './key-line';

/** The beginning of a slice. */
export interface Cut {
  readonly kind: 'top' | 'channel';
  readonly start: number;
  readonly lead: string;
}

/** A text being cut. */
export class Cutting {
  readonly cuts: Cut[] = [];
  readonly faults: Fault[] = [];
  /** Lines, by index, that are read as blank. */
  readonly blankLines: Set<number>;
  readonly doubtful: { start: number; end: number }[] = [];

  constructor(
    readonly text: string,
    readonly lines: ContentLines,
    blankLines: ReadonlySet<number>,
  ) {
    this.blankLines = new Set(blankLines);
  }

  startOf(line: number): number {
    return this.lines.start[line] ?? this.text.length;
  }

  contentOf(line: number): number {
    return this.lines.content[line] ?? this.text.length;
  }

  endOf(line: number): number {
    return lineEndAt(this.text, this.contentOf(line));
  }

  indentOf(line: number): number {
    return this.contentOf(line) - this.startOf(line);
  }

  keyOf(line: number): KeyLine | null {
    return keyLineAt(this.text, this.contentOf(line), this.endOf(line));
  }

  contentText(line: number): string {
    return this.text.slice(this.contentOf(line), this.endOf(line));
  }

  /** The next line that is not blank, before `limit`; or null. */
  after(line: number, limit: number): number | null {
    let next = line + 1;
    while (next < limit && this.blankLines.has(next)) next += 1;
    return next < limit ? next : null;
  }

  /** A line that is passed over with a fault of its own. */
  passOver(line: number, message: string): void {
    this.blankLines.add(line);
    this.note(line, message);
  }

  /** A fault on a line's text that leaves its slice in doubt. */
  note(line: number, message: string, cures: Fault['cures'] = []): void {
    const start = this.contentOf(line);
    const end = this.endOf(line);
    this.faults.push(fault(start, end, message, cures));
    this.doubtful.push({ start, end });
  }

  /** The edit that gives a line another indentation. */
  indented(line: number, width: number): Fault['cures'][number] {
    const mends = [{ start: this.startOf(line), end: this.contentOf(line), newText: ' '.repeat(width) }];
    return { title: width === 0 ? 'Move it to the left edge' : `Indent it by ${width}`, mends };
  }
}

/** Whether a column-0 line goes on with the slice above it: `- item`, `}` or `]`. */
export function goesOn(content: string): boolean {
  return /^(?:-(?:[ \t]|$)|[}\]])/.test(content);
}
