/** Every single change that may cure a finding, tried kind by kind, the cheapest first. */
import type { RemedyKind } from '../findings';
import { cornerKnobs } from './corner';
import { familyTrial } from './family';
import { knobSearch, type KnobConflict, type KnobOutcome } from './knob';
import { orderTrial } from './order';
import { partTrials } from './part';
import { pulseTrials } from './pulse';
import { rateTrials } from './rate';
import { windowTrial } from './rate-window';
import type { Session } from './session';
import { guardTrial } from './slot-guard';
import { familyStages, type FamilyStage } from './stages';
import type { Trial } from './trial';

/** What single changes have come to. */
export interface Singles {
  /** Proved changes in the order of their cost. */
  readonly trials: readonly Trial[];
  /** Why no corner alone does it; null where one does, or where none was in the way. */
  readonly cornerConflict: KnobConflict | null;
}

/** Tries the kinds that are worth it. */
export function* singleTrials(session: Session, kinds: ReadonlySet<RemedyKind>): Generator<void, Singles> {
  const corners = kinds.has('corner') ? yield* cornerOutcomes(session) : [];
  const stages = familyStages(session.channel);
  const trials = [
    ...(kinds.has('rate') ? [yield* windowTrial(session), ...(yield* rateTrials(session))] : []),
    ...(kinds.has('pulse') ? yield* pulseTrials(session) : []),
    ...(kinds.has('guard') ? [yield* guardTrial(session)] : []),
    ...corners.map(({ trial }) => trial),
    ...(kinds.has('part') ? yield* partTrials(session) : []),
    ...(kinds.has('order') ? yield* ofEach(session, stages, orderTrial) : []),
    ...(kinds.has('family') ? yield* ofEach(session, stages, familyTrial) : []),
  ];
  const found = [...new Set(trials.filter((trial) => trial !== null))];
  const conflict = corners.some(({ trial }) => trial !== null) ? undefined : corners.flatMap((one) => one.conflict ?? [])[0];
  return { trials: found, cornerConflict: conflict ?? null };
}

/** For each stage the first of its knobs that cures the finding, else what stood in the way of the first. */
function* cornerOutcomes(session: Session): Generator<void, readonly KnobOutcome[]> {
  const outcomes: KnobOutcome[] = [];
  for (const stage of familyStages(session.channel)) {
    const ofStage: KnobOutcome[] = [];
    for (const knob of cornerKnobs(session, stage)) {
      const outcome = yield* knobSearch(session, knob);
      ofStage.push(outcome);
      if (outcome.trial !== null) break;
    }
    const [first] = ofStage;
    const best = ofStage.find(({ trial }) => trial !== null) ?? first;
    if (best !== undefined) outcomes.push(best);
  }
  return outcomes;
}

function* ofEach(
  session: Session,
  stages: readonly FamilyStage[],
  trialOf: (session: Session, stage: FamilyStage) => Generator<void, Trial | null>,
): Generator<void, readonly (Trial | null)[]> {
  const trials: (Trial | null)[] = [];
  for (const stage of stages) trials.push(yield* trialOf(session, stage));
  return trials;
}
