/** Looks at the line around the cursor: what is being typed there, and whether it stands where a key or a value would. */
import type { Span } from '../place';

/** What is being typed. */
export interface CursorText {
  /** The piece of text that a completion replaces, in offsets of the text. */
  readonly span: Span;
  /** Behind indentation and dashes only, behind a comma or bracket, or behind a colon. */
  readonly stands: 'line-start' | 'in-brackets' | 'behind-colon';
  /** Whether a colon follows already. */
  readonly hasColon: boolean;
  /** What must be written before a completion: a space right behind a colon. */
  readonly gap: '' | ' ';
  readonly indent: number;
}

/** What is being typed at an offset; null inside a comment. */
export function cursorText(text: string, offset: number): CursorText | null {
  const lineStart = text.lastIndexOf('\n', offset - 1) + 1;
  const before = text.slice(lineStart, offset);
  if (/(?:^|\s)#/.test(before)) return null;
  const from = pieceStart(before);
  const after = /^[^\n\r,\]}#:]*/.exec(text.slice(offset))?.[0].trimEnd() ?? '';
  const end = offset + after.length;
  return {
    span: { start: lineStart + from, end },
    stands: placeBehind(before.slice(0, from)),
    hasColon: text[end] === ':',
    gap: /[^\s]:$/.test(before) ? ' ' : '',
    indent: /^ */.exec(before)?.[0].length ?? 0,
  };
}

function placeBehind(before: string): CursorText['stands'] {
  if (/^\s*(?:- +)*$/.test(before)) return 'line-start';
  return /:\s*$/.test(before) ? 'behind-colon' : 'in-brackets';
}

/** Where the piece that ends at the cursor starts: behind the last separator of the line. */
function pieceStart(before: string): number {
  let start = /^\s*(?:- +)*/.exec(before)?.[0].length ?? 0;
  for (const separator of before.matchAll(/[[{,]\s*|:(?:\s+|$)/g)) {
    start = Math.max(start, separator.index + separator[0].length);
  }
  return start;
}
