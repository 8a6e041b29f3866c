/** Quotes and brackets that are never closed: the fault is where they open, not where the parser notices. */
import { isFlow, scalars, visits } from '../tree-walk';
import type { TreeNode } from '../tree';
import { contentEnd, passed } from './diagnosis';
import type { Diagnosis } from './diagnosis';

/** The quote whose text runs on into other lines up to where the parser noticed, or null. */
export function unclosedQuote(text: string, tree: TreeNode | null, noticed: number): Diagnosis | null {
  let opening = -1;
  for (const { node } of scalars(tree)) {
    if (!node.quoted || node.start >= noticed || !text.slice(node.start, node.end).includes('\n')) continue;
    if (node.end >= noticed || !text.slice(node.end, noticed).includes('\n')) opening = node.start;
  }
  if (opening < 0) return null;
  return closeQuote(text, opening);
}

/** A quote that opens at `opening` and is to be closed in its own line. */
export function closeQuote(text: string, opening: number): Diagnosis {
  const quote = text.charAt(opening);
  const lineEnd = contentEnd(text, opening);
  const start = text.lastIndexOf('\n', opening) + 1;
  const inBrackets = /[[{]/.test(text.slice(start, opening));
  const stop = inBrackets ? text.slice(opening, lineEnd).search(/,|[\]}]/) : -1;
  const end = stop < 0 ? lineEnd : opening + stop;
  const at = opening + text.slice(opening, end).trimEnd().length;
  const mends = [{ start: at, end: at, newText: quote }];
  const message = `This ${quote === '"' ? 'double' : 'single'} quote is never closed in its line: close it with \`${quote}\`.`;
  return passed(opening, lineEnd, message, mends, [{ title: `Close it with \`${quote}\``, mends }]);
}

/** The last bracket that opens before the parser noticed and has no counterpart, or null. */
export function unclosedBracket(text: string, tree: TreeNode | null, noticed: number): Diagnosis | null {
  let open: TreeNode | null = null;
  for (const { node } of visits(tree)) {
    if (node.start < noticed && isFlow(text, node) && text.charAt(node.end - 1) !== closerOf(text.charAt(node.start)))
      open = node;
  }
  if (open === null) return null;
  const opener = text.charAt(open.start);
  const closer = closerOf(opener);
  const at = lastEnd(open);
  const mends = [{ start: at, end: at, newText: opener === '{' ? ' }' : ']' }];
  const message = `This \`${opener}\` is never closed: close it with \`${closer}\`.`;
  return passed(open.start, open.start + 1, message, mends, [{ title: `Close it with \`${closer}\``, mends }]);
}

function closerOf(opener: string): string {
  return opener === '{' ? '}' : ']';
}

function lastEnd(node: TreeNode): number {
  if (node.form === 'scalar') return node.end;
  if (node.form === 'list') return node.items.findLast((item) => item !== null)?.end ?? node.start + 1;
  const last = node.pairs.at(-1);
  return last === undefined ? node.start + 1 : (last.value?.end ?? last.keyEnd);
}
