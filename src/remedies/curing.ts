/** The search for changes that cure a finding: single changes first, cheapest kind first, then two at once. */
import { decimalsFor, remediesOf, type Finding, type Judgement, type Store } from '../findings';
import { formatDb, formatFrequency } from '../units/format';
import { cornerSearch, type CornerBound, type CornerConflict, type CornerOutcome } from './corner';
import type { Blocked, Cure, Fix } from './fix';
import { kindsFor } from './kinds-for';
import { orderTrial } from './order';
import { rateTrials } from './rate';
import { beginSession, type Session } from './session';
import { familyStages } from './stages';
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
  const kinds = new Set<string>(session === null ? [] : kindsFor(finding, session.channel));
  if (session === null || kinds.size === 0) return { fixes: [], blockedBy: null, note: null, analyses: 0 };
  const corners = kinds.has('corner') ? yield* cornerOutcomes(session) : [];
  const singles = [
    ...(kinds.has('rate') ? yield* rateTrials(session) : []),
    ...corners.flatMap(({ trial }) => (trial === null ? [] : [trial])),
    ...(kinds.has('order') ? yield* orderTrials(session) : []),
  ];
  const sound = singles.filter(isSound);
  const trials = sound.length > 0 ? sound : [...(yield* pairTrials(session, kinds)), ...singles];
  const fixes = inOrder(trials.map((trial) => fixOf(session, trial)));
  const blockedBy = fixes.length > 0 ? null : session.nearest;
  return { fixes, blockedBy, note: noteOf(corners, blockedBy), analyses: session.analyses };
}

/** A fix that takes another broken limit even further away leads round in circles; it is offered only where no other works. */
function isSound(trial: Trial): boolean {
  return trial.worsened.length === 0;
}

function* cornerOutcomes(session: Session): Generator<void, readonly CornerOutcome[]> {
  const outcomes: CornerOutcome[] = [];
  for (const stage of familyStages(session.channel)) outcomes.push(yield* cornerSearch(session, stage));
  return outcomes;
}

function* orderTrials(session: Session): Generator<void, readonly Trial[]> {
  const trials: (Trial | null)[] = [];
  for (const stage of familyStages(session.channel)) trials.push(yield* orderTrial(session, stage));
  return trials.filter((trial) => trial !== null);
}

/** Each kind in its place, but those that leave something behind last; the sort keeps the order of equals. */
function inOrder(fixes: readonly Fix[]): readonly Fix[] {
  return [...fixes].sort((a, b) => Number(a.leaves !== null) - Number(b.leaves !== null)).slice(0, mostFixes);
}

/** Why a corner alone does not do it, and, where nothing does, what comes nearest. */
function noteOf(corners: readonly CornerOutcome[], blockedBy: Blocked | null): string | null {
  const conflicts = corners.some(({ trial }) => trial !== null) ? [] : corners.flatMap(({ conflict }) => conflict ?? []);
  const [conflict] = conflicts;
  const corner = conflict === undefined ? [] : [`No corner alone does it: ${conflictWords(conflict)}.`];
  const nearest = blockedBy === null ? [] : [blockedWords(blockedBy)];
  const words = [...corner, ...nearest].join(' ');
  return words === '' ? null : words;
}

function conflictWords({ own, other }: CornerConflict): string {
  const bound = ({ hz, sense }: CornerBound): string => `${formatFrequency(hz)} ${sense}`;
  return `the ${own.limit} limit asks for ${bound(own)}, the ${other.limit} limit for ${bound(other)}`;
}

function blockedWords({ limit, misses, candidate }: Blocked): string {
  return `Nothing simple works. What comes nearest (${candidate}) misses the ${limit} limit by ${formatDb(misses, 'dB', decimalsFor(limit, misses))}.`;
}
