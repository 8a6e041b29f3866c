/** The change of a stage's order: the lowest higher one that works. */
import { editValue } from '../spec';
import type { Change } from './change';
import { ownMargin, type Session } from './session';
import type { FamilyStage } from './stages';
import { works, worksCleanly, type Trial } from './trial';

/** The highest order that is proposed: beyond it no analogue filter is built. */
export const highestOrder = 12;

/** The proved change to the lowest higher order that works without a new warning, else to the lowest that works; null for none. */
export function* orderTrial(session: Session, stage: FamilyStage): Generator<void, Trial | null> {
  let fallback: Trial | null = null;
  let margin = ownMargin(session.finding, session.figures);
  for (let order = stage.form.order + 1; order <= highestOrder; order += 1) {
    const trial: Trial | null = yield* session.attempt([orderChange(session, stage, order)]);
    if (trial === null) break;
    if (worksCleanly(trial)) return trial;
    if (works(trial)) fallback ??= trial;
    const gained: number | null = ownMargin(session.finding, trial.figures);
    if (!isMore(gained, margin)) break;
    margin = gained;
  }
  return fallback;
}

/** The change to one order. */
export function orderChange({ reading, channel }: Session, stage: FamilyStage, order: number): Change | null {
  const edit = editValue(reading, { channel: channel.name, path: ['filter', stage.index, 'order'] }, String(order));
  const verb = order > stage.form.order ? 'Raise' : 'Lower';
  return edit === null
    ? null
    : { kind: 'order', says: `${verb} ${stage.words} to order ${order}`, about: stage.words, edits: [edit] };
}

/** Going on is pointless once a step has not helped. */
function isMore(gained: number | null, before: number | null): boolean {
  return gained !== null && before !== null && gained > before + 1e-6;
}
