/** Walks over a slice's tree. */
import type { Pair, ScalarNode, TreeNode } from './tree';

/** A node with what it belongs to. */
export interface Visit {
  readonly node: TreeNode;
  readonly parent: TreeNode | null;
  /** The pair whose value it is, if it is one's. */
  readonly pair: Pair | null;
}

/** Every node, outer ones first, in the order of the text. */
export function visits(tree: TreeNode | null): readonly Visit[] {
  const found: Visit[] = [];
  if (tree !== null) visit({ node: tree, parent: null, pair: null }, found);
  return found;
}

function visit(here: Visit, found: Visit[]): void {
  found.push(here);
  const { node } = here;
  if (node.form === 'list') {
    for (const item of node.items) if (item !== null) visit({ node: item, parent: node, pair: null }, found);
  } else if (node.form === 'map') {
    for (const pair of node.pairs) if (pair.value !== null) visit({ node: pair.value, parent: node, pair }, found);
  }
}

/** Every scalar. */
export function scalars(tree: TreeNode | null): readonly (Visit & { readonly node: ScalarNode })[] {
  return visits(tree).flatMap((found) => (found.node.form === 'scalar' ? [{ ...found, node: found.node }] : []));
}

/** Whether a list or a map is written with brackets. */
export function isFlow(text: string, node: TreeNode): boolean {
  if (node.form === 'scalar') return false;
  const first = text.charAt(node.start);
  return node.form === 'list' ? first === '[' : first === '{' && node.pairs[0]?.keyStart !== node.start;
}

/** The innermost list or map with brackets around an offset, or null. */
export function flowAround(text: string, tree: TreeNode | null, offset: number): TreeNode | null {
  let innermost: TreeNode | null = null;
  for (const { node } of visits(tree)) if (node.start < offset && offset <= node.end && isFlow(text, node)) innermost = node;
  return innermost;
}
