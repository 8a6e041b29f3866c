/** Walks over a slice's tree. */
import type { MapNode, Pair, ScalarNode, TreeNode } from './tree';

/** A node with what it belongs to. */
export interface Visit {
  readonly node: TreeNode;
  readonly parent: TreeNode | null;
  /** The pair whose value it is, if it is one's. */
  readonly pair: Pair | null;
}

/** Every node, outer ones first, in the order of the text. */
export function* visits(tree: TreeNode | null, parent: TreeNode | null = null, pair: Pair | null = null): Generator<Visit> {
  if (tree === null) return;
  yield { node: tree, parent, pair };
  if (tree.form === 'list') for (const item of tree.items) yield* visits(item, tree);
  if (tree.form === 'map') for (const child of tree.pairs) yield* visits(child.value, tree, child);
}

/** Every scalar. */
export function* scalars(tree: TreeNode | null): Generator<Visit & { readonly node: ScalarNode }> {
  for (const visit of visits(tree)) if (visit.node.form === 'scalar') yield { ...visit, node: visit.node };
}

/** Every map. */
export function* maps(tree: TreeNode | null): Generator<MapNode> {
  for (const { node } of visits(tree)) if (node.form === 'map') yield node;
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
