/** Slips of single characters: lone carriage returns, and tabs or no-break spaces in the indentation. */
import type { Mend } from '../mend';
import type { ParsedSlice } from '../yaml-tree';
import { scalars } from '../tree-walk';
import { cured, indentAt, lineStart } from './diagnosis';
import type { Diagnosis } from './diagnosis';

/** A carriage return without a line feed behind it, which YAML's parser takes for text. */
export function loneReturns(text: string): Diagnosis | null {
  const otherEnds = text.includes('\n');
  const mends = [...text.matchAll(/\r(?!\n)/g)].map(({ index }) => {
    return { start: index, end: index + 1, newText: !otherEnds || endsLine(text, index) ? '\n' : ' ' };
  });
  const first = mends[0];
  if (first === undefined) return null;
  const message = 'A lone carriage return does not end a line here: use a line feed, or a space where none is meant.';
  const title = `Replace ${mends.length === 1 ? 'it' : 'them'} by ${first.newText === ' ' ? 'a space' : 'line feeds'}`;
  return cured(first.start, first.end, message, { title, mends });
}

/** Whether a line end was meant: what follows is indented as its line is, or one level deeper. */
function endsLine(text: string, at: number): boolean {
  if (text.charAt(at + 1) === '\r') return true;
  const deeper = indentBehind(text, at + 1) - indentAt(text, at);
  return deeper === 0 || deeper === 2;
}

function indentBehind(text: string, from: number): number {
  let at = from;
  while (text.charAt(at) === ' ') at += 1;
  return at - from;
}

const indentation = /^[ \t\u00a0]+(?=[^\s#])/gm;

/** Tabs and no-break spaces in front of a line, unless they are text: inside a scalar of several lines. */
export function badIndents(text: string, parsed: ParsedSlice): Diagnosis | null {
  if (!/^[ \t\u00a0]*[\t\u00a0]/m.test(text)) return null;
  const tabs = parsed.error?.code === 'TAB_AS_INDENT';
  const several = [...scalars(parsed.tree)].flatMap(({ node }) =>
    text.slice(node.start, node.end).includes('\n') &&
    (node.quoted || /[|>]/.test(text.charAt(node.start)) || parsed.error === null)
      ? [node]
      : [],
  );
  const bad = [...text.matchAll(indentation)].filter(
    ({ index, 0: lead }) =>
      (lead.includes('\u00a0') || (tabs && lead.includes('\t'))) &&
      !several.some(({ start, end }) => start < index && index < end),
  );
  const first = bad[0];
  if (first === undefined) return null;
  const at = first.index + first[0].search(/[\t\u00a0]/);
  const character = text.charAt(at) === '\t' ? 'a tab' : 'a no-break space';
  const message = `There is ${character} in the indentation: use spaces.`;
  const mends = reindented(
    text,
    bad.map(({ index, 0: lead }) => ({ start: index, lead })),
  );
  return cured(at, first.index + first[0].length, message, { title: 'Indent with spaces', mends });
}

/** No-break spaces are as wide as spaces; a line with tabs goes as deep as the lines before it make likely. */
function reindented(text: string, lines: readonly { start: number; lead: string }[]): Mend[] {
  const widths = new Map<string, number>();
  return lines.map(({ start, lead }) => {
    const width = lead.includes('\t') ? (widths.get(lead) ?? likelyIndent(text, start, widths)) : lead.length;
    widths.set(lead, width);
    return { start, end: start + lead.length, newText: ' '.repeat(width) };
  });
}

/** As deep as the line above, or two deeper where that line opens a block. */
function likelyIndent(text: string, start: number, widths: ReadonlyMap<string, number>): number {
  let above = start;
  let line = '';
  while (above > 0 && /^\s*(?:#|$)/.test(line)) {
    const end = above - 1;
    above = lineStart(text, end);
    line = text.slice(above, end);
  }
  const lead = /^[ \t\u00a0]*/.exec(line)?.[0] ?? '';
  const depth = widths.get(lead) ?? lead.length;
  return /:[ \t]*(?:#.*)?\r?$/.test(line) ? depth + 2 : depth;
}
