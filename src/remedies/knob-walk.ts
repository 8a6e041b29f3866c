/** Walks a value away from where it is in the direction that helps, and finds where a condition begins to hold. */
import type { Change } from './change';
import { fromGrid, toGrid } from './figure-grid';
import { ownMargin, type Session } from './session';
import type { Trial } from './trial';

/** Towards higher or lower values. */
export type Direction = 1 | -1;

/** A walk in one direction. Values are indices of the grid. */
export interface KnobWalk {
  readonly direction: Direction;
  /** What the walk is for: to clear the finding, or, where other changes have cleared it, the errors that they brought. */
  readonly aim: (trial: Trial) => boolean;
  at(index: number): Generator<void, Trial | null>;
  /** The first value, from the present or a given one on, at which the condition holds; null where it never does. */
  nearest(good: (trial: Trial) => boolean, from?: number): Generator<void, number | null>;
}

/** Finds the direction that helps; null where neither does. */
export function* knobWalk(
  session: Session,
  present: number,
  base: readonly Change[],
  change: (value: number) => Change | null,
): Generator<void, KnobWalk | null> {
  const at = (index: number): Generator<void, Trial | null> => session.attempt([...base, change(fromGrid(index))]);
  const start = base.length === 0 ? null : yield* session.attempt(base);
  const forFinding = start === null || start.remaining.length > 0;
  const score = (trial: Trial | null): number => (trial === null ? -Infinity : forFinding ? own(session, trial) : others(trial));
  const now = start !== null ? score(start) : (ownMargin(session.finding, session.figures) ?? -Infinity);
  const up = score(yield* at(Math.round(toGrid(present * firstStride))));
  const down = score(yield* at(Math.round(toGrid(present / firstStride))));
  if (Math.max(up, down) <= now) return null;
  const direction: Direction = up > down ? 1 : -1;
  const aim = forFinding ? clears : (trial: Trial): boolean => trial.newErrors.length === 0;
  const here = direction > 0 ? Math.floor(toGrid(present)) : Math.ceil(toGrid(present));
  return { direction, aim, at, nearest: (good, from = here) => nearest({ at, direction, from }, good) };
}

/** Factors by which a value is moved until a condition holds; it is then closed in on. */
const strides: readonly number[] = [1.02, 1.05, 1.1, 1.2, 1.4, 2, 3, 5, 10];
const firstStride = 1.05;

interface Route {
  readonly at: KnobWalk['at'];
  readonly direction: Direction;
  readonly from: number;
}

function* nearest({ at, direction, from }: Route, good: (trial: Trial) => boolean): Generator<void, number | null> {
  const holds = function* (index: number): Generator<void, boolean> {
    const trial = yield* at(index);
    return trial !== null && good(trial);
  };
  if (yield* holds(from)) return from;
  let failing = from;
  for (const stride of strides) {
    const index = Math.round(toGrid(fromGrid(from) * stride ** direction));
    if (yield* holds(index)) return yield* closedIn(holds, failing, index);
    failing = index;
  }
  return null;
}

/** Bisects between a value where the condition fails and one where it holds. */
function* closedIn(
  holds: (index: number) => Generator<void, boolean>,
  failing: number,
  holding: number,
): Generator<void, number> {
  let [low, high] = [failing, holding];
  while (Math.abs(high - low) > 1) {
    const middle = Math.trunc((low + high) / 2);
    if (yield* holds(middle)) high = middle;
    else low = middle;
  }
  return high;
}

function clears(trial: Trial): boolean {
  return trial.remaining.length === 0;
}

function own({ finding }: Session, trial: Trial): number {
  return ownMargin(finding, trial.figures) ?? -Infinity;
}

/** How far the worst new error is from being none; 0 where there is none. */
function others(trial: Trial): number {
  return Math.min(0, ...trial.newErrors.map((finding) => finding.figures?.margin ?? -Infinity));
}
