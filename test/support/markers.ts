/** Reads the expectations that a fixture carries in its own comments: carets under the text that a finding must cover, then its code. */

/** One expectation: a finding of this code over exactly this stretch of the text. */
export interface Marker {
  readonly code: string;
  /** UTF-16 offsets into the whole text, end exclusive. */
  readonly start: number;
  readonly end: number;
  /** Zero-based line that the carets stand under. */
  readonly line: number;
  /** What follows the code: words that the message must hold, or an empty string. */
  readonly words: string;
}

// `#   ^^^^ code words…`; `#<^^^ code` starts at the column of the `#` itself, for text in that column; `#< code` is that column alone.
const markerLine =
  /^(?<indent>\s*)#(?<from>[<]?)(?<gap>\s*)(?<carets>\^+|(?<=#<))\s+(?<code>[a-z][a-z-]*)(?:\s+(?<words>.*?))?\s*$/u;

/** All markers of a text, in the order they are written. Marker lines may be stacked; they all speak of the line above the stack. */
export function readMarkers(text: string): Marker[] {
  const markers: Marker[] = [];
  let offset = 0;
  let marked = { start: 0, line: 0 };
  text.split('\n').forEach((line, index) => {
    const parts = markerLine.exec(line)?.groups;
    if (parts === undefined) marked = { start: offset, line: index };
    else markers.push(markerOf(parts, marked));
    offset += line.length + 1;
  });
  return markers;
}

function markerOf(parts: Record<string, string | undefined>, marked: { start: number; line: number }): Marker {
  const hash = (parts['indent'] ?? '').length;
  const carets = hash + 1 + (parts['from'] ?? '').length + (parts['gap'] ?? '').length;
  const from = parts['from'] === '<' ? hash : carets;
  return {
    code: parts['code'] ?? '',
    start: marked.start + from,
    end: parts['carets'] === '' ? marked.start + hash + 1 : marked.start + carets + (parts['carets'] ?? '').length,
    line: marked.line,
    words: parts['words'] ?? '',
  };
}

/** The markers as short lines "line:column-column code", for comparing with findings written by `findingLine`. */
export function markerLines(text: string): string[] {
  return readMarkers(text)
    .map((marker) => findingLine(text, marker))
    .sort();
}

/** A finding or marker as "line:column-column code" (one-based line, zero-based columns), so that a failed comparison can be read. */
export function findingLine(text: string, found: { code: string; start: number; end: number }): string {
  const before = text.slice(0, found.start).split('\n');
  const column = before.at(-1)?.length ?? 0;
  return `${String(before.length).padStart(4)}:${column}-${column + found.end - found.start} ${found.code}`;
}
