/** Best-first branch and bound: keeps the best point found and the open nodes, and splits the most promising until the gap is proved. */

/** A stretch of the question that may still hold the largest value. */
export interface Node {
  /** No value in it is larger, in natural-log gain. */
  readonly upper: number;
  /** Cuts it up: evaluates points, and opens what may still win. */
  split(frontier: Frontier): void;
}

/** Past this many evaluations a search gives up and reports the gap as it stands; reached only where bounds do not tighten. */
const evaluationLimit = 5_000;

/** The same for a search that runs inside every evaluation of another: both limits multiply, and absurd input must still end soon. */
export const nestedEvaluationLimit = 500;

/** The open nodes as a heap, largest upper bound first, beside the best point so far. */
export class Frontier {
  /** Points and bounds evaluated so far. */
  evaluations = 0;
  /** The largest value found at a point. */
  best = -Infinity;
  bestHz = NaN;
  /** Which curve the best point lies on; what it means is the asker's. */
  bestTag = NaN;
  private readonly heap: Node[] = [];
  private settled = -Infinity;

  constructor(
    private readonly gap: number,
    private readonly limit = evaluationLimit,
  ) {}

  /** Takes note of an evaluated point. */
  note(logGain: number, frequencyHz: number, tag: number): void {
    if (logGain > this.best || Number.isNaN(this.bestHz)) {
      this.best = logGain;
      this.bestHz = frequencyHz;
      this.bestTag = tag;
    }
  }

  /** Whether something bounded by this may still beat the best point. */
  mayWin(upper: number): boolean {
    return upper > this.best;
  }

  /** Opens a node, unless it cannot win. */
  open(node: Node): void {
    if (!this.mayWin(node.upper)) return;
    let index = this.heap.push(node) - 1;
    while (index > 0) {
      const parent = (index - 1) >> 1;
      const above = this.heap[parent];
      if (above === undefined || above.upper >= node.upper) break;
      this.heap[index] = above;
      index = parent;
    }
    this.heap[index] = node;
  }

  /** Keeps the bound of a stretch that is too narrow for double precision to split. */
  settle(upper: number): void {
    this.settled = Math.max(this.settled, upper);
  }

  /** Splits until no open node can exceed the best point by more than the gap. Returns the proved upper bound. */
  prove(): number {
    for (;;) {
      const top = this.heap[0];
      if (top === undefined) return Math.max(this.best, this.settled);
      if (top.upper <= this.best + this.gap || this.evaluations >= this.limit) {
        return Math.max(this.best, this.settled, top.upper);
      }
      this.removeTop();
      top.split(this);
    }
  }

  private removeTop(): void {
    const last = this.heap.pop();
    if (last === undefined || this.heap.length === 0) return;
    let index = 0;
    for (;;) {
      const left = this.heap[2 * index + 1];
      const right = this.heap[2 * index + 2];
      const rightWins = left !== undefined && right !== undefined && right.upper > left.upper;
      const child = rightWins ? right : left;
      if (child === undefined || child.upper <= last.upper) break;
      this.heap[index] = child;
      index = 2 * index + (rightWins ? 2 : 1);
    }
    this.heap[index] = last;
  }
}
