/** The change of a stage's corner: how far each limit lets it go, and the nearest sensible value that satisfies all. */
import { editValue, spanOf, type Place } from '../spec';
import { formatFrequency } from '../units/format';
import type { Change } from './change';
import { cornerWalk, type CornerWalk, type Direction } from './corner-walk';
import { fromGrid, roundedTowards } from './corner-grid';
import { rewriteFrequency } from './quantity-text';
import type { Session } from './session';
import type { FamilyStage } from './stages';
import { works, worksCleanly, type Trial } from './trial';

/** A limit's demand on the corner: at most this, or at least this. */
export interface CornerBound {
  readonly limit: string;
  readonly hz: number;
  readonly sense: 'or less' | 'or more';
}

/** Two limits that no corner satisfies together: the finding's own, and the one in its way. */
export interface CornerConflict {
  readonly own: CornerBound;
  readonly other: CornerBound;
}

/** What a search over one corner has found. */
export interface CornerOutcome {
  readonly trial: Trial | null;
  readonly conflict: CornerConflict | null;
}

const nothing: CornerOutcome = { trial: null, conflict: null };

/** Searches for a corner of one stage, on top of changes that are made anyway. */
export function* cornerSearch(
  session: Session,
  stage: FamilyStage,
  base: readonly Change[] = [],
): Generator<void, CornerOutcome> {
  const change = (hz: number): Change | null => cornerChange(session, stage, hz);
  const walk = yield* cornerWalk(session, stage.form.cornerHz, base, change);
  if (walk === null) return nothing;
  const edge = yield* walk.nearest(walk.aim);
  if (edge === null) return nothing;
  const atEdge = yield* walk.at(edge);
  if (atEdge !== null && works(atEdge)) return { trial: yield* sensible(walk, edge), conflict: null };
  return base.length > 0 ? nothing : { trial: null, conflict: yield* conflictAt(session, walk, edge) };
}

/** The change to one corner, written as the spec writes the present one. */
function cornerChange({ reading, channel }: Session, stage: FamilyStage, hz: number): Change | null {
  const place: Place = { channel: channel.name, path: ['filter', stage.index, 'corner'] };
  const { start, end } = spanOf(reading, place);
  const edit = editValue(reading, place, rewriteFrequency(reading.text.slice(start, end), stage.form.cornerHz, hz));
  const verb = hz > stage.form.cornerHz ? 'Raise' : 'Lower';
  return edit === null
    ? null
    : {
        kind: 'corner',
        says: `${verb} the corner of ${stage.words} to ${formatFrequency(hz)}`,
        about: stage.words,
        edits: [edit],
      };
}

/** From the first corner that works: the nearest that leaves no new warning, or that one; then a round value just beyond it. */
function* sensible(walk: CornerWalk, edge: number): Generator<void, Trial | null> {
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

/** Both bounds on the corner, where the finding's limit is satisfied only behind the point at which another breaks. */
function* conflictAt(session: Session, walk: CornerWalk, edge: number): Generator<void, CornerConflict | null> {
  const broken = yield* walk.nearest((trial) => trial.newErrors.length > 0);
  if (broken === null) return null;
  const breaking = yield* walk.at(broken);
  const last = broken - walk.direction;
  const limit = breaking?.newErrors[0]?.limit ?? null;
  if (limit === null) return null;
  const own = session.finding.limit ?? 'headroom';
  return {
    own: { limit: own, hz: fromGrid(edge), sense: senseOf(walk.direction) },
    other: { limit, hz: fromGrid(last), sense: senseOf(walk.direction === 1 ? -1 : 1) },
  };
}

function senseOf(direction: Direction): CornerBound['sense'] {
  return direction < 0 ? 'or less' : 'or more';
}
