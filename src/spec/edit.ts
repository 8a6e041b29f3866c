/** Changes a spec's text at a place: one value, or a key that is not there yet; comments and layout stay. */
import { insideOf } from './inside';
import { locate } from './locate';
import type { Located } from './locate';
import type { Place } from './place';
import type { Edit, Reading } from './reading';
import { scalarText } from './scalar-text';
import type { MapNode, Pair } from './tree';

/**
 * The edit that gives a place another value; null where the place cannot be written to.
 * A key that is missing is put into its map, behind the last one.
 * @param newText the value as it is to stand in the text, on one line
 */
export function editValue(reading: Reading, place: Place, newText: string): Edit | null {
  const located = locate(insideOf(reading), place);
  if (located === null) return null;
  const { base, node, pair, missing } = located;
  if (missing.length > 0) return insertion(reading.text, located, newText);
  if (node !== null) return { span: { start: base + node.start, end: base + node.end }, newText };
  return pair === null ? null : insertValue(reading.text, base + pair.keyEnd, newText);
}

/** Applies edits that do not overlap; of two that do, the one that starts later is left out. */
export function applyEdits(text: string, edits: readonly Edit[]): string {
  const pieces: string[] = [];
  let from = 0;
  for (const { span, newText } of edits.toSorted((a, b) => a.span.start - b.span.start || a.span.end - b.span.end)) {
    if (span.start < from) continue;
    pieces.push(text.slice(from, span.start), newText);
    from = span.end;
  }
  pieces.push(text.slice(from));
  return pieces.join('');
}

/** Behind the colon of a key without a value. */
function insertValue(text: string, keyEnd: number, newText: string): Edit | null {
  const colon = /^[ \t]*:/.exec(text.slice(keyEnd, keyEnd + 200));
  if (colon === null) return null;
  const at = keyEnd + colon[0].length;
  return { span: { start: at, end: at }, newText: ` ${newText}` };
}

function insertion(text: string, { base, node, pair, missing }: Located, newText: string): Edit | null {
  const keys = missing.filter((step) => typeof step === 'string');
  const [first, ...below] = keys;
  if (first === undefined || keys.length < missing.length) return null;
  const value = below.reduceRight((inner, key) => `{ ${scalarText(key)}: ${inner} }`, newText);
  const line = `${scalarText(first)}: ${value}`;
  if (node?.form === 'map') {
    const last = node.pairs.at(-1);
    return text.charAt(base + node.start) === '{' && node.start !== node.pairs[0]?.keyStart
      ? intoBrackets(text, base, node, line)
      : last === undefined
        ? null
        : newLine(text, base + lastEnd(last), columnOf(text, base + (node.pairs[0]?.keyStart ?? 0)), line);
  }
  // A key with nothing below it yet.
  if (node === null && pair !== null) return newLine(text, base + pair.keyEnd, columnOf(text, base + pair.keyStart) + 2, line);
  return null;
}

function intoBrackets(text: string, base: number, map: MapNode, line: string): Edit {
  const last = map.pairs.at(-1);
  if (last === undefined) {
    const span = { start: base + map.start, end: base + map.end };
    return { span, newText: `{ ${line} }` };
  }
  // Behind a key without a value comes its colon, if it has one.
  const colon =
    last.value === null ? (/^\s*:/.exec(text.slice(base + last.keyEnd, base + last.keyEnd + 200))?.[0].length ?? 0) : 0;
  const at = base + lastEnd(last) + colon;
  return { span: { start: at, end: at }, newText: `, ${line}` };
}

function lastEnd(pair: Pair): number {
  return pair.value?.end ?? pair.keyEnd;
}

/** A line of its own behind the line that holds `offset`, with the line end that the text has. */
function newLine(text: string, offset: number, column: number, line: string): Edit {
  const lineFeed = text.indexOf('\n', offset);
  const end = lineFeed < 0 ? text.length : lineFeed;
  const at = text.charAt(end - 1) === '\r' ? end - 1 : end;
  const lineEnd = text.includes('\r\n') ? '\r\n' : '\n';
  return { span: { start: at, end: at }, newText: `${lineEnd}${' '.repeat(column)}${line}` };
}

function columnOf(text: string, offset: number): number {
  return offset - (text.lastIndexOf('\n', offset - 1) + 1);
}
