/** Lines whose indentation belongs to no level that is open there. */
import { cured, indentAt, lineStart } from './diagnosis';
import type { Diagnosis } from './diagnosis';

/** A line that is indented further than the key above it, although that key has a value already. */
export function tooDeep(text: string, valueStart: number): Diagnosis | null {
  const next = nextContent(text, valueStart);
  if (next === null) return null;
  const above = lineStart(text, valueStart);
  const width = /^ *(?:- +)*/.exec(text.slice(above, valueStart))?.[0].length ?? 0;
  if (next - lineStart(text, next) <= width) return null;
  return shifted(text, next, width);
}

/** A line that stands between two levels: it is taken to belong to the deeper one. */
export function betweenLevels(text: string, at: number): Diagnosis | null {
  const indent = indentAt(text, at);
  let level = Infinity;
  for (let line = lineStart(text, at); line > 0;) {
    line = lineStart(text, line - 1);
    const content = line + indentAt(text, line);
    if (/^[\s#]/.test(text.charAt(content))) continue;
    const own = content - line;
    if (own > indent) level = Math.min(level, own);
    else break;
  }
  if (level === Infinity || at <= 0) return null;
  return shifted(text, lineStart(text, at) + indent, level);
}

function shifted(text: string, content: number, width: number): Diagnosis {
  const start = lineStart(text, content);
  const lineFeed = text.indexOf('\n', content);
  const end = content + text.slice(content, lineFeed < 0 ? text.length : lineFeed).trimEnd().length;
  const message = `This line is indented by ${content - start}, its neighbours by ${width}.`;
  const mends = [{ start, end: content, newText: ' '.repeat(width) }];
  return cured(content, end, message, { title: `Indent it by ${width}`, mends });
}

/** The first content in the lines below, or null. */
function nextContent(text: string, from: number): number | null {
  const below = /\n[ \t]*(?=[^\s#])/g;
  below.lastIndex = from;
  const match = below.exec(text);
  return match === null ? null : match.index + match[0].length;
}
