/** A judgement on one place of a spec: what is wrong or worth knowing, with the numbers behind it. */
import type { Place, Span } from '../spec/place';
import type { ProblemCode } from '../spec/reading';

/** Codes of findings that follow from computed figures or from what a channel leaves out. */
export type JudgedCode =
  | 'wanted-folds'
  | 'wanted-touches'
  | 'rate-unavailable'
  | 'alias-over-limit'
  | 'headroom-short'
  | 'overdriven'
  | 'image-over-limit'
  | 'output-over-mask'
  | 'crosstalk-over-limit'
  | 'flatness-over-limit'
  | 'response-over-mask'
  | 'delay-over-limit'
  | 'delay-spread-over-limit'
  | 'level-over-limit'
  | 'snr-short'
  | 'beyond-data'
  | 'not-judged'
  | 'thin-margin'
  | 'nothing-unwanted'
  | 'no-limits'
  | 'no-filter'
  | 'unused-name'
  | 'stale-acceptance'
  | 'overlaps-wanted';

/** Every finding code there is so far. */
export type Code = ProblemCode | JudgedCode;

/** How a finding counts: an error fails the check, a warning only under --strict, a hint never. */
export type Severity = 'error' | 'warning' | 'hint';

/** The kinds of change that may cure a finding, the cheapest first; `guard` is that of time slots. */
export type RemedyKind = 'rate' | 'pulse' | 'guard' | 'corner' | 'part' | 'order' | 'family';

/** The numbers of a finding; null where a figure does not apply. */
export interface FindingFigures {
  readonly value: number | null;
  readonly nominal: number | null;
  readonly limit: number | null;
  readonly margin: number | null;
  readonly frequency: number | null;
  readonly lands: number | null;
  readonly source: string | null;
}

/** One finding. */
export interface Finding {
  readonly code: Code;
  readonly severity: Severity;
  readonly channel: string | null;
  readonly ref: string | null;
  readonly message: string;
  /** Where it stands: a place for what follows from figures, a span for faults of the text and for comments. */
  readonly at: { readonly place: Place } | { readonly span: Span };
  readonly related: readonly { readonly place: Place; readonly message: string }[];
  readonly figures: FindingFigures | null;
  /** Which limit it is about, for proofs and thin margins; null otherwise. */
  readonly limit: string | null;
  readonly accepted: { readonly reason: string; readonly downTo: number | null; readonly span: Span } | null;
}
