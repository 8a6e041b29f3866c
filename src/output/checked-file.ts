/** One spec as a check leaves it: judged, with the proved fixes of each finding; every output format is made from this. */
import type { Finding, Judgement } from '../findings';
import type { Cure } from '../remedies';

/** A checked spec. */
export interface CheckedFile {
  /** Relative to the root, with `/` on every system. */
  readonly path: string;
  readonly judgement: Judgement;
  /** The outcome of the search for fixes, for each finding that has one. */
  readonly cures: ReadonlyMap<Finding, Cure>;
}

/** A file that was read for a check. */
export interface InputFile {
  readonly path: string;
  /** Lower-case hexadecimal. */
  readonly sha256: string;
}
