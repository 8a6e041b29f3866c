/** What a slip was meant to be: its fault, and how the text is put right so that reading goes on behind it. */
import type { Mend } from '../mend';
import { fault } from './fault';
import type { CureText, Fault } from './fault';

/** One slip. Offsets are into the text that was parsed. */
export interface Diagnosis {
  readonly fault: Fault;
  /** Changes after which the parser gets past it; null where none is known. */
  readonly mends: readonly Mend[] | null;
  /** Whether nothing is lost by the mend, so that what is then missing is really missing. */
  readonly certain: boolean;
}

/** A slip that has one certain cure, which is how it is read. */
export function cured(start: number, end: number, message: string, cure: CureText): Diagnosis {
  return { fault: fault(start, end, message, [cure]), mends: cure.mends, certain: true };
}

/** A slip that can be passed over, but what was meant is not known for certain. */
export function passed(
  start: number,
  end: number,
  message: string,
  mends: readonly Mend[] | null,
  cures: CureText[] = [],
): Diagnosis {
  return { fault: fault(start, end, message, cures), mends, certain: false };
}

/** Puts a stretch of text in quotes; single ones where it holds double ones or a backslash. */
export function quotes(text: string, start: number, end: number): CureText {
  return { title: 'Put it in quotes', mends: [{ start, end, newText: inQuotes(text.slice(start, end)) }] };
}

/** A text in quotes. */
function inQuotes(text: string): string {
  return /["\\]/.test(text) ? `'${text.replaceAll("'", "''")}'` : `"${text}"`;
}

/** A stretch turned to spaces. */
export function spaces(start: number, end: number): Mend {
  return { start, end, newText: ' '.repeat(end - start) };
}

// Lines are looked along no further than this, so that many slips in one huge line cost no more than many lines.
const longestLine = 10_000;

/** Where the line of an offset starts. */
export function lineStart(text: string, offset: number): number {
  const from = Math.max(0, offset - longestLine);
  return from + text.slice(from, offset).lastIndexOf('\n') + 1;
}

/** Where the content of the line of an offset ends, without trailing space; `from` where it holds only a comment from there. */
export function contentEnd(text: string, from: number): number {
  const ahead = text.slice(from, from + longestLine);
  const lineFeed = ahead.indexOf('\n');
  const line = lineFeed < 0 ? ahead : ahead.slice(0, lineFeed);
  const comment = /(?:^|[ \t])#/.exec(line);
  const content = comment === null ? line : line.slice(0, comment.index);
  return from + content.trimEnd().length;
}

/** The number of characters in front of the first that is no space, in the line of an offset. */
export function indentAt(text: string, offset: number): number {
  const start = lineStart(text, offset);
  let at = start;
  while (text.charAt(at) === ' ') at += 1;
  return at - start;
}
