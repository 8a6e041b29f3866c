/** The change of one value that may be anything: how far each limit lets it go, and the nearest sensible value that satisfies all. */
import type { RemedyKind } from '../findings';
import type { Change } from './change';
import { fromGrid, roundedTowards } from './figure-grid';
import { knobWalk, type Direction, type KnobWalk } from './knob-walk';
import type { Session } from './session';
import { works, worksCleanly, type Trial } from './trial';

/** A value that a fix may turn: a corner, a bandwidth, a pulse's width. */
export interface Knob {
  readonly kind: RemedyKind;
  /** Its present value, above zero. */
  readonly present: number;
  /** A value of it as a bound is printed: "12.18 kHz". */
  words(value: number): string;
  /** The change to a value, written as the spec writes the present one; null where the text cannot be edited. */
  change(value: number): Change | null;
}

/** A limit's demand on a knob: at most this, or at least this. */
interface KnobBound {
  readonly limit: string;
  readonly words: string;
}

/** Two limits that no value satisfies together: the finding's own, and the one in its way. */
export interface KnobConflict {
  readonly own: KnobBound;
  readonly other: KnobBound;
}

/** What a search over one knob has found. */
export interface KnobOutcome {
  readonly trial: Trial | null;
  readonly conflict: KnobConflict | null;
}

const nothing: KnobOutcome = { trial: null, conflict: null };

/** Searches for a value of one knob, on top of changes that are made anyway. */
export function* knobSearch(session: Session, knob: Knob, base: readonly Change[] = []): Generator<void, KnobOutcome> {
  const walk = yield* knobWalk(session, knob.present, base, (value) => knob.change(value));
  if (walk === null) return nothing;
  const edge = yield* walk.nearest(walk.aim);
  if (edge === null) return nothing;
  const atEdge = yield* walk.at(edge);
  if (atEdge !== null && works(atEdge)) return { trial: yield* sensible(walk, edge), conflict: null };
  return base.length > 0 ? nothing : { trial: null, conflict: yield* conflictAt(session, knob, walk, edge) };
}

/** From the first value that works: the nearest that leaves no new warning, or that one; then a round value just beyond it. */
function* sensible(walk: KnobWalk, edge: number): Generator<void, Trial | null> {
  const clean = yield* walk.nearest(worksCleanly, edge);
  const good = clean === null ? works : worksCleanly;
  const from = clean ?? edge;
  for (const digits of [2, 3] as const) {
    const round = roundedTowards(from, walk.direction, digits);
    if (Math.abs(fromGrid(round) / fromGrid(from) - 1) > farthestRounding) continue;
    const trial = yield* walk.at(round);
    if (trial !== null && good(trial)) return trial;
  }
  return yield* walk.at(from);
}

/** A round value further away than this, relatively, changes more than it has to. */
const farthestRounding = 0.03;

/** Both bounds on the value, where the finding's limit is satisfied only behind the point at which another breaks. */
function* conflictAt(session: Session, knob: Knob, walk: KnobWalk, edge: number): Generator<void, KnobConflict | null> {
  const broken = yield* walk.nearest((trial) => trial.newErrors.length > 0);
  if (broken === null) return null;
  const breaking = yield* walk.at(broken);
  const last = broken - walk.direction;
  const limit = breaking?.newErrors[0]?.limit ?? null;
  if (limit === null) return null;
  const own = session.finding.limit ?? 'headroom';
  return {
    own: { limit: own, words: boundWords(knob, edge, walk.direction) },
    other: { limit, words: boundWords(knob, last, walk.direction === 1 ? -1 : 1) },
  };
}

function boundWords(knob: Knob, index: number, direction: Direction): string {
  return `${knob.words(fromGrid(index))} ${direction < 0 ? 'or less' : 'or more'}`;
}
