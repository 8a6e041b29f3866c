/** The step of a walk over a tree along a shape, and what it knows of the place it has come to. */
import type { LocalProblem } from './local-problem';
import type { Span } from './place';
import type { Shape } from './shape';
import type { TreeNode } from './tree';

/** Where a value belongs, for what is said about it when it is missing or of the wrong form. */
export interface Home {
  /** The span of the key that the value belongs to, or of the list item that it is. */
  readonly span: Span;
  /** What messages call it: "`rate`", "channel `bearing-x`". */
  readonly called: string;
}

/** Decodes one node, adding its faults to `problems`. */
export type Walk = (shape: Shape<unknown>, node: TreeNode | null, home: Home, problems: LocalProblem[]) => unknown;
