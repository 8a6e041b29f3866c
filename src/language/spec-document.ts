/** A spec as the editor features see it: one text, read and judged, with the fixes that are proved so far. */
import type { Finding, Judgement, JudgeStore } from '../findings';
import type { Cure } from '../remedies';
import type { Reading } from '../spec';

/** One version of one open spec. It is immutable but for the fixes, which arrive as they are proved. */
export interface SpecDocument {
  readonly uri: string;
  readonly version: number;
  readonly reading: Reading;
  readonly judgement: Judgement;
  readonly store: JudgeStore;
  /** Whether a search has been made that this text cannot have changed. Cheap; `cureOf` knows for certain. */
  hasCure(finding: Finding): boolean;
  /** The outcome of the search for a finding's fixes, or null while it has not been made. */
  cureOf(finding: Finding): Cure | null;
}
