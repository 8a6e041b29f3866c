/** The change of an aperture, a hold or a gate: another width of the same shape, or another way to hold. */
import { editValue, exists, spanOf, type Channel, type Path, type PulseWidth } from '../spec';
import { formatPercent, formatTime } from '../units/format';
import type { Change } from './change';
import { knobSearch, type Knob } from './knob';
import { rewriteQuantity } from './quantity-text';
import type { Session } from './session';
import { works, worksCleanly, type Trial } from './trial';

/** Proved changes of the pulse: the nearest width that works, and the first other hold. */
export function* pulseTrials(session: Session): Generator<void, readonly Trial[]> {
  const knob = widthKnob(session);
  const width = knob === null ? null : (yield* knobSearch(session, knob)).trial;
  const hold = yield* otherHold(session);
  return [width, hold].filter((trial) => trial !== null);
}

/** The width of a channel's pulse, and where it stands. */
interface Width {
  readonly key: 'aperture' | 'hold' | 'gate';
  readonly width: PulseWidth;
  readonly inner: 'width' | 'track';
}

function widthOf({ direction, pulse, gate }: Channel): Width | null {
  if (gate?.kind === 'track') return { key: 'gate', width: gate.track, inner: 'track' };
  const own = gate === null ? pulse : gate.pulse;
  if (own.shape === 'instant' || own.shape === 'linear') return null;
  const key = gate !== null ? 'gate' : direction === 'capture' ? 'aperture' : 'hold';
  return { key, width: own.width, inner: 'width' };
}

function widthKnob(session: Session): Knob | null {
  const found = widthOf(session.channel);
  if (found === null) return null;
  const { key, width, inner } = found;
  const isShare = 'share' in width;
  const present = isShare ? width.share : width.seconds;
  const words = isShare ? formatPercent : formatTime;
  const what = inner === 'track' ? 'tracking' : `the ${key}`;
  return {
    kind: 'pulse',
    present,
    words,
    change: (value) => {
      // No hold or gate that lasts longer than its period is proposed: the next one begins there.
      if (isShare && value > Math.max(1, present)) return null;
      const place = { channel: session.channel.name, path: widthPath(session, key, inner) };
      const { start, end } = spanOf(session.reading, place);
      const text = rewriteQuantity(session.reading.text.slice(start, end), present, value, isShare ? '%' : 's');
      const edit = editValue(session.reading, place, text);
      const verb = value > present ? 'Widen' : 'Narrow';
      return edit === null ? null : { kind: 'pulse', says: `${verb} ${what} to ${words(value)}`, about: null, edits: [edit] };
    },
  };
}

/** A width stands alone or in a map. */
function widthPath({ reading, channel }: Session, key: string, inner: string): Path {
  return exists(reading, { channel: channel.name, path: [key, inner] }) ? [key, inner] : [key];
}

/** A way to hold: how the spec writes it, and what a title calls it. */
interface Hold {
  readonly text: string;
  readonly says: string;
}

const zeroOrder: Hold = { text: 'zero-order', says: 'Hold each sample for the whole period' };
const linear: Hold = { text: 'linear', says: 'Draw straight lines from sample to sample (`hold: linear`)' };
const half: Hold = { text: '50 %', says: 'Hold each sample for half the period' };
const split: Hold = {
  text: '{ shape: split, width: 100 % }',
  says: 'Hold each sample for half the period and its negative for the other half',
};

/** The first other hold that works: in higher zones a split pulse stands strongest, about 0 Hz a smoother one weakens the copies most. */
function* otherHold(session: Session): Generator<void, Trial | null> {
  const { direction, gate } = session.channel;
  if (direction === 'capture' || gate !== null) return null;
  const holds = (session.figures.zone ?? 1) > 1 ? [split, half] : [zeroOrder, linear, half];
  let fallback: Trial | null = null;
  for (const hold of holds) {
    const trial: Trial | null = yield* session.attempt([holdChange(session, hold)]);
    if (trial !== null && worksCleanly(trial)) return trial;
    if (trial !== null && works(trial)) fallback ??= trial;
  }
  return fallback;
}

function holdChange({ reading, channel }: Session, { text, says }: Hold): Change | null {
  const edit = editValue(reading, { channel: channel.name, path: ['hold'] }, text);
  return edit === null ? null : { kind: 'pulse', says, about: null, edits: [edit] };
}
