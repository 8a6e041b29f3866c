/** A slice's content in our own three forms, with offsets relative to the slice's start; made from the yaml parser's tree, so that nothing else knows that parser. */

/** A scalar as it was written. */
export interface ScalarNode {
  readonly form: 'scalar';
  readonly start: number;
  readonly end: number;
  /** The scalar's source text, quotes and escapes undone, block scalars folded; never YAML's resolved value. */
  readonly text: string;
  readonly quoted: boolean;
}

/** A list; an empty item is null. */
export interface ListNode {
  readonly form: 'list';
  readonly start: number;
  readonly end: number;
  readonly items: readonly (TreeNode | null)[];
}

/** A map; its span runs from its first key to the end of its last value. */
export interface MapNode {
  readonly form: 'map';
  readonly start: number;
  readonly end: number;
  readonly pairs: readonly Pair[];
}

/** One key of a map and its value; a missing value is null. */
export interface Pair {
  readonly key: string;
  readonly keyStart: number;
  readonly keyEnd: number;
  readonly value: TreeNode | null;
}

/** Any node. */
export type TreeNode = ScalarNode | ListNode | MapNode;
