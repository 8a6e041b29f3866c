/** The change of a stage's order: the nearest that works, higher where that helps and lower where a limit asks for less delay. */
import { editValue } from '../spec';
import type { Change } from './change';
import type { Session } from './session';
import type { FamilyStage } from './stages';
import { stepwiseTrial } from './stepwise';
import type { Trial } from './trial';

/** The highest order that is proposed: beyond it no analogue filter is built. */
export const highestOrder = 12;

/** The proved change to the nearest order that works; null for none. */
export function* orderTrial(session: Session, stage: FamilyStage): Generator<void, Trial | null> {
  const change = (step: number): Change | null => orderChange(session, stage, stage.form.order + step);
  return yield* stepwiseTrial(session, { change, most: highestOrder });
}

/** The change to one order; null where no filter of that order is built. */
export function orderChange({ reading, channel }: Session, stage: FamilyStage, order: number): Change | null {
  if (order < 1 || (order > highestOrder && order > stage.form.order)) return null;
  const edit = editValue(reading, { channel: channel.name, path: [...stage.path, 'order'] }, String(order));
  const verb = order > stage.form.order ? 'Raise' : 'Lower';
  return edit === null
    ? null
    : { kind: 'order', says: `${verb} ${stage.words} to order ${order}`, about: stage.words, edits: [edit] };
}
