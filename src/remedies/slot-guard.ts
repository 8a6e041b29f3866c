/** The change of the guard between time slots: the nearest that keeps one slot out of the next. */
import { editValue, exists, spanOf } from '../spec';
import { formatTime } from '../units/format';
import { knobSearch, type Knob } from './knob';
import { rewriteQuantity } from './quantity-text';
import type { Session } from './session';
import type { Trial } from './trial';

/** The proved change of a guard that is stated; one that is not fills its slot already. */
export function* guardTrial(session: Session): Generator<void, Trial | null> {
  const { reading, channel } = session;
  const place = { channel: channel.name, path: ['slots', 'guard'] };
  const present = channel.slots?.guardSeconds ?? 0;
  if (present <= 0 || !exists(reading, place)) return null;
  const knob: Knob = {
    kind: 'guard',
    present,
    words: formatTime,
    change: (seconds) => {
      const { start, end } = spanOf(reading, place);
      const edit = editValue(reading, place, rewriteQuantity(reading.text.slice(start, end), present, seconds, 's'));
      const verb = seconds > present ? 'Lengthen' : 'Shorten';
      const says = `${verb} the guard between the slots to ${formatTime(seconds)}`;
      return edit === null ? null : { kind: 'guard', says, about: null, edits: [edit] };
    },
  };
  return (yield* knobSearch(session, knob)).trial;
}
