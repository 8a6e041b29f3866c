/** What a proved search is asked and what it answers. */
import type { Enclosure, Response } from '../response';

/** How far a search goes. */
export interface SearchOptions {
  /** The gap at which a result counts as proved, in dB; 0.001 unless given. */
  readonly gapDb?: number;
  /** After how many evaluations it gives up and reports the gap as it stands. */
  readonly evaluationLimit?: number;
}

/** A proved maximum. */
export interface Extreme {
  /** ln of the largest gain: a proved upper bound, at most `gapDb` above what `frequencyHz` really gives. */
  readonly logGain: number;
  /** Where it is reached; Infinity where it is only approached. */
  readonly frequencyHz: number;
  readonly gapDb: number;
  /** Points and bounds that were evaluated. */
  readonly evaluations: number;
}

/** The largest gain over every frequency k·rate ± x. */
export interface FoldQuestion {
  /** Low = high for an exact rate; F then ranges over k·rate ± x, else over [k·low ± …, k·high ± …]. */
  readonly rateHz: Enclosure;
  /** Taken at F = k·rate ± x. */
  readonly outer: Response;
  /** Taken at x, in series; only with an exact rate. */
  readonly inner: Response | null;
  /** The ranges of x, 0 … rate/2. */
  readonly bands: readonly Enclosure[];
  /** F counts only inside these (high may be Infinity); null: everywhere. A zero-width meeting at fold 0 does not count. */
  readonly within: readonly Enclosure[] | null;
  /** 0 for F = x itself. */
  readonly firstFold: number;
  /** Infinity allowed. */
  readonly lastFold: number;
  readonly sides: 'both' | 'upper' | 'lower';
}

/** A proved maximum over folds. */
export interface FoldExtreme extends Extreme {
  readonly fold: number;
  /** Fold 0 is `upper`. */
  readonly side: 'upper' | 'lower';
  /** The x that belongs to `frequencyHz`. */
  readonly landsHz: number;
}
