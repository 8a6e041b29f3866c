/** Text that YAML cuts short at a ` #`, such as `Gate #3`. */
import type { TreeNode } from '../tree';
import { scalars } from '../tree-walk';
import { contentEnd, quotes } from './diagnosis';
import type { Fault } from './fault';

const freeText: ReadonlySet<string> = new Set(['title', 'notes', 'name', 'ref']);

/** A warning for every text behind which a comment begins without a space. Quantities cannot be cut short that way. */
export function* cutShort(text: string, tree: TreeNode | null): Generator<Fault> {
  if (!/[ \t]#[^\s#]/.test(text)) return;
  for (const { node, pair } of scalars(tree)) {
    if (node.quoted || /^[|>]/.test(text.charAt(node.start))) continue;
    const isText = /^[^\d.+−±-]/.test(node.text) || (pair !== null && freeText.has(pair.key));
    if (!isText || !/^[ \t]+#(?!bandkeep:)[^\s#]/.test(text.slice(node.end, node.end + 80))) continue;
    yield cutAt(text, node.start, node.end);
  }
}

function cutAt(text: string, start: number, end: number): Fault {
  const lineFeed = text.indexOf('\n', end);
  const whole = start + text.slice(start, lineFeed < 0 ? text.length : lineFeed).trimEnd().length;
  const message = `The text ends in front of \` #\`, where a comment begins: it reads \`${text.slice(start, contentEnd(text, start))}\`. Put the whole in quotes, or a space behind the \`#\`.`;
  return { code: 'text-cut-short', start, end: whole, message, cures: [quotes(text, start, whole)] };
}
