/** Recognises a line that begins with a key, without parsing it. */

/** A key at the head of a line. */
export interface KeyLine {
  /** The key as written, without quotes. */
  readonly key: string;
  /** Where the key ends, in front of the colon. */
  readonly keyEnd: number;
  /** What stands behind the colon on the same line, without a comment. */
  readonly rest: string;
}

// Characters that cannot begin a plain key; `-`, `?` and `:` can where no space follows.
const notKeyStart = new Set([',', '[', ']', '{', '}', '#', '|', '>', '@', '`', '%', '"', "'"]);

/** The key that the line's content [at, end) begins with, or null. */
export function keyLineAt(text: string, at: number, end: number): KeyLine | null {
  const first = text.charAt(at);
  if (first === '"' || first === "'") return quotedKey(text.slice(at, end), at);
  if (notKeyStart.has(first)) return null;
  if (/[-?:]/.test(first) && isSpaceOrEnd(text, at + 1, end)) return null;
  return plainKey(text, at, end);
}

function quotedKey(line: string, at: number): KeyLine | null {
  const match = /^(?:"(?:[^"\\]|\\.)*"|'(?:[^']|'')*')(?=[ \t]*:(?:[ \t]|$))/.exec(line);
  if (match === null) return null;
  const keyEnd = match[0].length;
  const colon = line.indexOf(':', keyEnd);
  return { key: line.slice(1, keyEnd - 1), keyEnd: at + keyEnd, rest: withoutComment(line.slice(colon + 1)) };
}

function plainKey(text: string, at: number, end: number): KeyLine | null {
  for (let colon = text.indexOf(':', at); colon >= 0 && colon < end; colon = text.indexOf(':', colon + 1)) {
    if (!isSpaceOrEnd(text, colon + 1, end)) continue;
    const key = text.slice(at, colon);
    if (/[ \t]#/.test(key)) return null;
    const trimmed = key.trimEnd();
    return { key: trimmed, keyEnd: at + trimmed.length, rest: withoutComment(text.slice(colon + 1, end)) };
  }
  return null;
}

function isSpaceOrEnd(text: string, at: number, end: number): boolean {
  return at >= end || text.charAt(at) === ' ' || text.charAt(at) === '\t';
}

/** What stands before a comment; a ` #` inside quotes is taken for one too, which does no harm to what asks here. */
function withoutComment(rest: string): string {
  const comment = /(?:^|[ \t])#/.exec(rest);
  return (comment === null ? rest : rest.slice(0, comment.index)).trim();
}
