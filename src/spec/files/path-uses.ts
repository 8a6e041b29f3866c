/** Finds the paths that a slice names, with their places. */
import type { Span } from '../place';
import type { Pair, ScalarNode, TreeNode } from '../tree';

/** A path as it stands in a slice; the span counts from the slice's start. */
export interface PathUse {
  readonly role: 'use' | 'response' | 'spectrum';
  readonly written: string;
  readonly span: Span;
}

/** All paths in the pairs of a slice. A value of these keys that is no scalar is a fault of its own. */
export function pathUses(text: string, pairs: readonly Pair[]): readonly PathUse[] {
  if (!/\b(?:use|measured|spectrum)\b/.test(text)) return [];
  const found: PathUse[] = [];
  for (const pair of pairs) {
    if (pair.key === 'use') for (const item of itemsOf(pair.value)) found.push(useAt('use', item));
    else if (pair.value !== null && pair.key !== 'clocks' && pair.key !== 'masks') collect(pair.value, found);
  }
  return found;
}

function itemsOf(node: TreeNode | null): readonly ScalarNode[] {
  if (node?.form !== 'list') return [];
  return node.items.flatMap((item) => (item?.form === 'scalar' ? [item] : []));
}

function collect(node: TreeNode, found: PathUse[]): void {
  if (node.form === 'list') for (const item of node.items) if (item !== null) collect(item, found);
  if (node.form !== 'map') return;
  for (const { key, value } of node.pairs) {
    if (value?.form !== 'scalar') {
      if (value !== null) collect(value, found);
    } else if (key === 'measured') found.push(useAt('response', value));
    else if (key === 'spectrum') found.push(useAt('spectrum', value));
  }
}

const useAt = (role: PathUse['role'], { text, start, end }: ScalarNode): PathUse => ({
  role,
  written: text,
  span: { start, end },
});
