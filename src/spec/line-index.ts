/** Turns UTF-16 offsets of a text into lines and characters and back, as the language server protocol counts them. */

/** A zero-based line and a zero-based UTF-16 character in it. */
export interface LineAndCharacter {
  readonly line: number;
  readonly character: number;
}

/** The lines of one text. A byte order mark counts as nothing: an editor does not see it. */
export interface LineIndex {
  readonly lineCount: number;
  /** An offset beyond either end gives that end; one between \r and \n gives the end of the line. */
  positionAt(offset: number): LineAndCharacter;
  /** A line or a character beyond its end gives that end. */
  offsetAt(position: LineAndCharacter): number;
}

// The protocol lets a lone carriage return end a line, although in a spec it is a fault.
const lineBreak = /\r\n|\n|\r/g;

/** The index of a text, in time linear in its length. */
export function lineIndex(text: string): LineIndex {
  const starts = [text.startsWith('\uFEFF') ? 1 : 0];
  const ends: number[] = [];
  for (const match of text.matchAll(lineBreak)) {
    ends.push(match.index);
    starts.push(match.index + match[0].length);
  }
  ends.push(text.length);
  const startOf = (line: number): number => starts[line] ?? text.length;
  const endOf = (line: number): number => ends[line] ?? text.length;
  return {
    lineCount: starts.length,
    positionAt: (offset) => {
      const line = lastAtOrBefore(starts, offset);
      const within = Math.min(Math.max(offset, startOf(line)), endOf(line));
      return { line, character: within - startOf(line) };
    },
    offsetAt: ({ line, character }) => {
      if (line < 0) return startOf(0);
      if (line >= starts.length) return text.length;
      return Math.min(startOf(line) + Math.max(0, character), endOf(line));
    },
  };
}

/** The index of the last start that is not behind the offset; 0 where all are. */
function lastAtOrBefore(starts: readonly number[], offset: number): number {
  let low = 0;
  let high = starts.length - 1;
  while (low < high) {
    const middle = Math.ceil((low + high) / 2);
    if ((starts[middle] ?? Infinity) <= offset) low = middle;
    else high = middle - 1;
  }
  return low;
}
