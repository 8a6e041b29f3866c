/** The search for changes that cure a finding: single changes first, cheapest kind first, then two at once. */
import { remediesOf, type Finding, type Judgement, type Store } from '../findings';
import type { Cure, Fix } from './fix';
import { kindsFor } from './kinds-for';
import { noteOf } from './note';
import { beginSession } from './session';
import { singleTrials } from './singles';
import { fixOf } from './title';
import type { Trial } from './trial';
import { pairTrials } from './two-at-once';

/** How many fixes are offered for one finding. */
const mostFixes = 5;

/** Searches for the fixes of a finding at once. */
export function cure(judgement: Judgement, finding: Finding, store: Store): Cure {
  const steps = curing(judgement, finding, store);
  let step = steps.next();
  while (step.done !== true) step = steps.next();
  return step.value;
}

/** Searches for the fixes of a finding, in steps of one trial each. */
export function* curing(judgement: Judgement, finding: Finding, store: Store): Generator<void, Cure> {
  const session = remediesOf(finding.code).length === 0 ? null : beginSession(judgement, finding, store);
  const kinds = new Set(session === null ? [] : kindsFor(finding, session.channel));
  if (session === null || kinds.size === 0) return { fixes: [], blockedBy: null, note: null, analyses: 0 };
  const { trials: singles, cornerConflict } = yield* singleTrials(session, kinds);
  const sound = singles.filter(isSound);
  const trials = sound.length > 0 ? sound : [...(yield* pairTrials(session, kinds)), ...singles];
  const fixes = inOrder(trials.map((trial) => fixOf(session, trial)));
  const blockedBy = fixes.length > 0 ? null : session.nearest;
  const note = noteOf(session.channel, finding, { cornerConflict, blockedBy, isCured: fixes.length > 0 });
  return { fixes, blockedBy, note, analyses: session.analyses };
}

/** A fix that takes another broken limit even further away leads round in circles; it is offered only where no other works. */
function isSound(trial: Trial): boolean {
  return trial.worsened.length === 0;
}

/** Each kind in its place, but those that leave something behind last; the sort keeps the order of equals. */
function inOrder(fixes: readonly Fix[]): readonly Fix[] {
  return [...fixes].sort((a, b) => Number(a.leaves !== null) - Number(b.leaves !== null)).slice(0, mostFixes);
}
