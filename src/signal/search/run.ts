/** A run of rungs, bounded as one interval before any of them is looked at; the tail to infinity is one more run. */
import type { Enclosure } from '../response';
import type { Frontier, Node } from './frontier';
import { openInterval, type Curve } from './interval';
import type { Ladder } from './ladder';

/** The curves of one ladder: what is maximised on each rung, and an upper bound over a run of them. */
export interface LadderCurves {
  readonly ladder: Ladder;
  /** An upper bound over everything in a stretch of frequencies. */
  upper(hull: Enclosure): number;
  /** The curve of one rung. */
  curve(rung: number): Curve;
  /** Notes the value that is approached at infinity. */
  noteInfinity(frontier: Frontier): void;
}

/** Opens the rungs from `first` to `last`, bounded together; `length` is how many to split off first. */
export function openRun(frontier: Frontier, curves: LadderCurves, first: number, last: number, length = 1): void {
  const { ladder } = curves;
  if (first > last) return;
  if (first === last) {
    openRung(frontier, curves, first);
    return;
  }
  const hull = ladder.hull(first, last);
  if (hull.low > hull.high) return;
  frontier.evaluations += 1;
  const upper = curves.upper(hull);
  if (!frontier.mayWin(upper)) return;
  probe(frontier, curves, first);
  frontier.open(new RunNode(curves, first, last, length, upper));
}

function openRung(frontier: Frontier, curves: LadderCurves, rung: number): void {
  const interval = curves.ladder.interval(rung);
  if (interval === null) return;
  const curve = curves.curve(rung);
  if (interval.low < interval.high && frontier.best > -Infinity) {
    frontier.evaluations += 1;
    if (!frontier.mayWin(curve.upper(interval.low, interval.high))) return;
  }
  openInterval(frontier, curve, interval.low, interval.high);
}

/** The lowest frequency of a run is where a low-pass lets most through: often the answer, and always a good start. */
function probe(frontier: Frontier, curves: LadderCurves, rung: number): void {
  const interval = curves.ladder.interval(rung);
  if (interval === null) return;
  frontier.evaluations += 1;
  const curve = curves.curve(rung);
  frontier.note(curve.logGain(interval.low), interval.low, curve.tag);
}

class RunNode implements Node {
  constructor(
    private readonly curves: LadderCurves,
    private readonly first: number,
    private readonly last: number,
    private readonly length: number,
    readonly upper: number,
  ) {}

  split(frontier: Frontier): void {
    const { stride } = this.curves.ladder;
    if (this.last === Infinity) this.curves.noteInfinity(frontier);
    // Short runs first, since paths fall; doubling, since some do not.
    const count = Math.min(this.length, Math.ceil((this.last - this.first) / stride / 2));
    const cut = this.first + (count - 1) * stride;
    openRun(frontier, this.curves, this.first, cut, Math.ceil(count / 2));
    openRun(frontier, this.curves, cut + stride, this.last, this.length * 2);
  }
}
