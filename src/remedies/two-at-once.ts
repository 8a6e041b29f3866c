/** Two changes at once, for findings that no single change cures: a higher order or another rate, with the corner that suits it. */
import type { Change } from './change';
import { cornerKnobs } from './corner';
import { knobSearch } from './knob';
import { highestOrder, orderChange } from './order';
import { rateChange, rateTrials } from './rate';
import { rateOptions } from './rate-options';
import type { Session } from './session';
import { familyStages, type FamilyStage } from './stages';
import { works, type Trial } from './trial';

/** How many steps of the first change are tried with the second. */
const steps = 4;

/** Proved pairs of changes: rate and corner, order and corner, order and rate; the first of each that works. */
export function* pairTrials(session: Session, kinds: ReadonlySet<string>): Generator<void, readonly Trial[]> {
  const found: Trial[] = [];
  for (const stage of familyStages(session.channel)) {
    if (kinds.has('rate') && kinds.has('corner')) found.push(...(yield* rateAndCorner(session, stage)));
    if (kinds.has('order') && kinds.has('corner')) found.push(...(yield* orderAndCorner(session, stage)));
    if (kinds.has('order') && kinds.has('rate')) found.push(...(yield* orderAndRate(session, stage)));
  }
  return found.filter(works);
}

function* rateAndCorner(session: Session, stage: FamilyStage): Generator<void, readonly Trial[]> {
  const above = rateOptions(session.channel)[0]?.above ?? [];
  // Strides that double reach far up a long list in few steps.
  const options = Array.from({ length: steps }, (_, index) => above[2 ** index - 1]).filter((option) => option !== undefined);
  for (const option of options) {
    const change = rateChange(session, option);
    const trial = change === null ? null : yield* withCorner(session, stage, change);
    if (trial !== null) return [trial];
  }
  return [];
}

function* orderAndCorner(session: Session, stage: FamilyStage): Generator<void, readonly Trial[]> {
  for (const change of higherOrders(session, stage)) {
    const trial = yield* withCorner(session, stage, change);
    if (trial !== null) return [trial];
  }
  return [];
}

function* orderAndRate(session: Session, stage: FamilyStage): Generator<void, readonly Trial[]> {
  for (const change of higherOrders(session, stage)) {
    const trials = yield* rateTrials(session, [change]);
    if (trials.length > 0) return trials.slice(0, 1);
  }
  return [];
}

/** A change with the corner that suits it: of a band filter its width. */
function* withCorner(session: Session, stage: FamilyStage, change: Change): Generator<void, Trial | null> {
  const [knob] = cornerKnobs(session, stage);
  return knob === undefined ? null : (yield* knobSearch(session, knob, [change])).trial;
}

function higherOrders(session: Session, stage: FamilyStage): readonly Change[] {
  const orders = Array.from({ length: steps }, (_, index) => stage.form.order + 1 + index).filter(
    (order) => order <= highestOrder,
  );
  return orders.map((order) => orderChange(session, stage, order)).filter((change) => change !== null);
}
