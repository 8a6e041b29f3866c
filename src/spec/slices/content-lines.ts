/** The lines of a text that hold more than space and a comment, as arrays of offsets, since a large file has many. */

/** Parallel arrays, one entry a content line. */
export interface ContentLines {
  /** Where the line starts. */
  readonly start: readonly number[];
  /** Where its first character that is no space stands. */
  readonly content: readonly number[];
  /** Where it ends, without the line end. */
  readonly end: readonly number[];
}

const space = 0x20;
const tab = 0x09;
const noBreakSpace = 0xa0;
const hash = 0x23;
const carriageReturn = 0x0d;

/** The content lines of a text; tabs and no-break spaces in front of a line count as indentation, although they are faults. */
export function contentLines(text: string): ContentLines {
  const lines = { start: [] as number[], content: [] as number[], end: [] as number[] };
  let start = text.startsWith('\uFEFF') ? 1 : 0;
  while (start < text.length) {
    const lineFeed = text.indexOf('\n', start);
    const next = lineFeed < 0 ? text.length : lineFeed + 1;
    let end = lineFeed < 0 ? text.length : lineFeed;
    if (end > start && text.charCodeAt(end - 1) === carriageReturn) end -= 1;
    const content = firstContent(text, start, end);
    if (content < end && text.charCodeAt(content) !== hash) {
      lines.start.push(start);
      lines.content.push(content);
      lines.end.push(end);
    }
    start = next;
  }
  return lines;
}

function firstContent(text: string, start: number, end: number): number {
  let at = start;
  while (at < end) {
    const code = text.charCodeAt(at);
    if (code !== space && code !== tab && code !== noBreakSpace) break;
    at += 1;
  }
  return at;
}
