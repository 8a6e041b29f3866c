/** The fixes that are proved so far, kept by content: an edit drops those it could have changed and moves the others along. */
import type { Finding, Judgement } from '../findings';
import { targetOf, type Cure } from '../remedies';
import { applyEdits, read, type Channel, type Edit, type Reading } from '../spec';

/** A search's outcome with what it was proved on. */
interface Kept {
  /** The finding's own channel; another object in a newer reading means that something it rests on has changed. */
  readonly channel: Channel;
  /** Every channel that one of the fixes changes: each was judged in the proof. */
  readonly changed: ReadonlySet<Channel>;
  cure: Cure;
  /** The reading for which this is known to hold. */
  checkedFor: Reading;
}

/** Keeps proofs for one open spec. */
export interface CureShelf {
  /** Whether an outcome is kept; without the check that `cureOf` makes. */
  has(judgement: Judgement, finding: Finding): boolean;
  /** The kept outcome for a finding of this judgement, or null. */
  cureOf(judgement: Judgement, finding: Finding): Cure | null;
  /** Keeps the outcome of a search that was made on this judgement. */
  keep(judgement: Judgement, finding: Finding, cure: Cure): void;
}

/** An empty shelf. */
export function createCureShelf(): CureShelf {
  const kept = new Map<string, Kept>();
  let current: Reading | null = null;

  const follow = (reading: Reading): void => {
    if (current === reading) return;
    if (current !== null) moveAlong(kept, current, reading);
    current = reading;
  };

  return {
    has(judgement, finding) {
      follow(judgement.reading);
      return kept.has(targetOf(finding));
    },
    cureOf(judgement, finding) {
      follow(judgement.reading);
      const key = targetOf(finding);
      const found = kept.get(key);
      if (found === undefined) return null;
      if (holds(found, judgement.reading)) return found.cure;
      kept.delete(key);
      return null;
    },
    keep(judgement, finding, cure) {
      follow(judgement.reading);
      const channel = channelOf(judgement.reading, finding.channel);
      if (channel === null) return;
      const changed = new Set(cure.fixes.flatMap((fix) => channelsChangedBy(judgement.reading, fix.edits)));
      kept.set(targetOf(finding), { channel, changed, cure, checkedFor: judgement.reading });
    },
  };
}

function channelOf(reading: Reading, name: string | null): Channel | null {
  return reading.entries.find((entry) => entry.name === name)?.channel ?? null;
}

/** The channels, as they stand in the reading, that would be other ones after the edits. */
function channelsChangedBy(reading: Reading, edits: readonly Edit[]): Channel[] {
  const after = new Set(read(applyEdits(reading.text, edits), reading).entries.map((entry) => entry.channel));
  return reading.entries.flatMap(({ channel }) => (channel === null || after.has(channel) ? [] : [channel]));
}

/** Whether a kept outcome still holds: its channel is the same, and no fix reaches a channel that the proof has not judged. */
function holds(kept: Kept, reading: Reading): boolean {
  if (kept.checkedFor === reading) return true;
  const reached = kept.cure.fixes.flatMap((fix) => channelsChangedBy(reading, fix.edits));
  if (!reached.every((channel) => kept.changed.has(channel))) return false;
  kept.checkedFor = reading;
  return true;
}

/** Shifts every kept edit from the old text to the new one; what the change touches, or whose channel is another one now, goes. */
function moveAlong(kept: Map<string, Kept>, from: Reading, to: Reading): void {
  const alive = new Set(to.entries.map((entry) => entry.channel));
  const shift = shiftBetween(from.text, to.text);
  for (const [key, entry] of kept) {
    const fixes = entry.cure.fixes.map((fix) => ({ ...fix, edits: fix.edits.map(shift) }));
    const whole = fixes.every((fix) => fix.edits.every((edit) => edit !== null));
    if (!whole || !alive.has(entry.channel)) kept.delete(key);
    else
      entry.cure = { ...entry.cure, fixes: fixes.map((fix) => ({ ...fix, edits: fix.edits.filter((edit) => edit !== null) })) };
  }
}

/** How an edit of the old text reads in the new one, or null where the texts differ at it. */
function shiftBetween(from: string, to: string): (edit: Edit) => Edit | null {
  const shorter = Math.min(from.length, to.length);
  let head = 0;
  while (head < shorter && from.charCodeAt(head) === to.charCodeAt(head)) head += 1;
  let tail = 0;
  while (tail < shorter - head && from.charCodeAt(from.length - 1 - tail) === to.charCodeAt(to.length - 1 - tail)) tail += 1;
  const grown = to.length - from.length;
  return (edit) => {
    if (edit.span.end <= head) return edit;
    if (edit.span.start < from.length - tail) return null;
    return { ...edit, span: { start: edit.span.start + grown, end: edit.span.end + grown } };
  };
}
