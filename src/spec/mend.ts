/** A text whose certain slips have been put right, so that reading can go on, with the way back to the offsets of the source. */

/** A replacement of [start, end) by `newText`. */
export interface Mend {
  readonly start: number;
  readonly end: number;
  readonly newText: string;
}

/** A mended text. */
export interface Mended {
  readonly text: string;
  /** The source's offset that an offset of the mended text came from. */
  readonly toSource: (offset: number) => number;
}

/** A text that needed no mending. */
export function unmended(text: string): Mended {
  return { text, toSource: (offset) => offset };
}

/** Mends an already mended text further; `mends` are offsets into it, sorted and apart. */
export function mend(before: Mended, mends: readonly Mend[]): Mended {
  const pieces: string[] = [];
  // For each mend: where its new text starts in the result.
  const newStarts: number[] = [];
  let length = 0;
  let from = 0;
  for (const { start, end, newText } of mends) {
    pieces.push(before.text.slice(from, start), newText);
    length += start - from;
    newStarts.push(length);
    length += newText.length;
    from = end;
  }
  pieces.push(before.text.slice(from));
  return { text: pieces.join(''), toSource: (offset) => before.toSource(backOneStep(mends, newStarts, offset)) };
}

function backOneStep(mends: readonly Mend[], newStarts: readonly number[], offset: number): number {
  let low = 0;
  let high = newStarts.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    if ((newStarts[middle] ?? Infinity) <= offset) low = middle + 1;
    else high = middle;
  }
  const last = mends[low - 1];
  const lastStart = newStarts[low - 1];
  if (last === undefined || lastStart === undefined) return offset;
  const inside = offset - lastStart;
  if (inside < last.newText.length) return last.start + Math.min(inside, last.end - last.start);
  return last.end + inside - last.newText.length;
}

/** The same text with stretches turned to spaces (line ends stay), so that no offset moves. */
export function blanked(text: string, stretches: readonly { readonly start: number; readonly end: number }[]): string {
  const pieces: string[] = [];
  let from = 0;
  for (const { start, end } of stretches) {
    if (start < from) continue;
    pieces.push(text.slice(from, start), text.slice(start, end).replace(/[^\r\n]/g, ' '));
    from = end;
  }
  pieces.push(text.slice(from));
  return pieces.join('');
}
