/** The lines of a text that hold more than space and a comment, as arrays of offsets, since a large file has many. */

/** Parallel arrays, one entry a content line. */
export interface ContentLines {
  /** Where the line starts. */
  readonly start: readonly number[];
  /** Where its first character that is no space stands. */
  readonly content: readonly number[];
}

const space = 0x20;
const tab = 0x09;
const noBreakSpace = 0xa0;
const hash = 0x23;
const lineFeed = 0x0a;
const carriageReturn = 0x0d;

/** The content lines of a text; tabs and no-break spaces in front of a line count as indentation, although they are faults. */
export function contentLines(text: string): ContentLines {
  const starts: number[] = [];
  const contents: number[] = [];
  const length = text.length;
  let start = text.startsWith('\uFEFF') ? 1 : 0;
  while (start < length) {
    let at = start;
    let code = text.charCodeAt(at);
    while (code === space || code === tab || code === noBreakSpace) code = text.charCodeAt((at += 1));
    const blank = at >= length || code === lineFeed || code === hash;
    if (!blank && !(code === carriageReturn && isLineEnd(text, at + 1))) {
      starts.push(start);
      contents.push(at);
    }
    const end = text.indexOf('\n', at);
    start = end < 0 ? length : end + 1;
  }
  return { start: starts, content: contents };
}

/** Where the line that an offset lies in ends, without its line end. */
export function lineEndAt(text: string, offset: number): number {
  const next = text.indexOf('\n', offset);
  const end = next < 0 ? text.length : next;
  return end > offset && text.charCodeAt(end - 1) === carriageReturn ? end - 1 : end;
}

function isLineEnd(text: string, at: number): boolean {
  return at >= text.length || text.charCodeAt(at) === lineFeed;
}
