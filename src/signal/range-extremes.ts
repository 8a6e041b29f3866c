/** The smallest and largest of any run of neighbours in a list, without looking at each of them. */
import type { Enclosure } from './response';

/** A list that has been prepared for such questions. */
export class RangeExtremes {
  private readonly size: number;
  /** Two binary trees of extremes: the leaves stand at `size` and up, the parent of node i is i/2. */
  private readonly lows: Float64Array;
  private readonly highs: Float64Array;

  /** @param values any finite numbers, in order; kept as a copy. */
  constructor(values: readonly number[]) {
    this.size = values.length;
    this.lows = new Float64Array(2 * this.size).fill(Infinity);
    this.highs = new Float64Array(2 * this.size).fill(-Infinity);
    this.lows.set(values, this.size);
    this.highs.set(values, this.size);
    for (let node = this.size - 1; node >= 1; node -= 1) {
      this.lows[node] = Math.min(this.lows[2 * node] ?? Infinity, this.lows[2 * node + 1] ?? Infinity);
      this.highs[node] = Math.max(this.highs[2 * node] ?? -Infinity, this.highs[2 * node + 1] ?? -Infinity);
    }
  }

  /**
   * The extremes of the values from `first` up to, but not with, `end`; low > high where there are none.
   *
   * Source: segment tree, common practice; takes 2·log2(n) steps.
   * @example new RangeExtremes([3, -1, 4]).between(0, 2).high // 3
   */
  between(first: number, end: number): Enclosure {
    let low = Infinity;
    let high = -Infinity;
    const look = (node: number): void => {
      low = Math.min(low, this.lows[node] ?? Infinity);
      high = Math.max(high, this.highs[node] ?? -Infinity);
    };
    let from = Math.max(0, first) + this.size;
    let to = Math.min(this.size, end) + this.size;
    for (; from < to; from >>= 1, to >>= 1) {
      if (from % 2 === 1) look(from++);
      if (to % 2 === 1) look(--to);
    }
    return { low, high };
  }
}
