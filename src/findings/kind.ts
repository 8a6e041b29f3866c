/** What there is to know about one finding code: its help, how it counts, how it is found, and what may cure it. */
import type { Figures } from '../analysis/figures';
import type { Channel } from '../spec/channel';
import type { Reading } from '../spec/reading';
import type { Code, Finding, RemedyKind, Severity } from './finding';

/** The chapters of the list of codes. */
export type Group = 'the text' | 'sampling' | 'copies' | 'the wanted band' | 'advice';

/** A whole spec that has the finding, and the one replacement that cures it; a test judges both. */
export interface Example {
  readonly spec: string;
  readonly from: string;
  readonly to: string;
}

/** The help of one code; the documentation page and `explain` are made from it. */
export interface Help {
  /** One sentence, without the numbers of a case. */
  readonly summary: string;
  readonly means: string;
  readonly matters: string;
  readonly cure: string;
  /** Null where no short spec can show it; then `cure` carries an example in words. */
  readonly example: Example | null;
}

/** One whole channel and what has been computed of it. */
export interface Subject {
  readonly channel: Channel;
  readonly figures: Figures;
}

/** A finding before acceptances are applied; checks build these. */
type Check = (subject: Subject) => readonly Finding[];

/** A check of the file as a whole, from its text alone. */
type FileCheck = (reading: Reading) => readonly Finding[];

/** One finding code. Codes of the text have no check: the reading itself brings them. */
export interface FindingKind {
  readonly code: Code;
  readonly severity: Severity;
  readonly group: Group;
  readonly help: Help;
  /** Kinds of change that may cure it, tried in the order of their cost. */
  readonly remedies: readonly RemedyKind[];
  /** Runs on every whole channel. Its result may depend on nothing but the channel and its figures, since it is kept with the channel. */
  readonly check?: Check;
  readonly checkFile?: FileCheck;
}
