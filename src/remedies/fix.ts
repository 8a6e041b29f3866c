/** A change to a spec that has been proved, by reading and judging the changed text, to clear a finding. */
import type { Edit } from '../spec/reading';
import type { RemedyKind } from '../findings/finding';

/** A proved change. */
export interface Fix {
  /** What it changes and the margin it leaves, e.g. "Raise the rate to 64 kHz (÷384): alias margin 4.6 dB". */
  readonly title: string;
  /** The kind of change, or `two` where only two changes together work. */
  readonly kind: RemedyKind | 'two';
  /** The margin of the cured limit after the change, in the limit's unit; null where the finding has no limit. */
  readonly margin: number | null;
  readonly edits: readonly Edit[];
  /** What it leaves behind that was not there before (a new warning), as the title's tail says it; null for nothing. */
  readonly leaves: string | null;
}

/** What stands in the way where no candidate works. */
export interface Blocked {
  readonly limit: string;
  /** By how much the nearest candidate misses, in that limit's unit. */
  readonly misses: number;
  /** What the nearest candidate was. */
  readonly candidate: string;
}

/** The outcome of a search for fixes. */
export interface Cure {
  /** At most five, cheapest change first. */
  readonly fixes: readonly Fix[];
  readonly blockedBy: Blocked | null;
  /** A sentence such as "No corner alone does it: …", or null. */
  readonly note: string | null;
  /** How many analyses it took. */
  readonly analyses: number;
}
