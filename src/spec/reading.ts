/** What reading a spec's text gives: a partial model, every fault of the text, and the comments that accept findings. */
import type { Channel } from './channel';
import type { Place, Span } from './place';

/** Codes of findings about the text itself; none of them can be accepted. */
export type ProblemCode =
  | 'syntax'
  | 'unknown-key'
  | 'missing-key'
  | 'duplicate-name'
  | 'unknown-name'
  | 'wrong-unit'
  | 'not-a-quantity'
  | 'out-of-range'
  | 'contradiction'
  | 'file-not-read'
  | 'too-large'
  | 'text-cut-short';

/** A change of the text: the span is replaced by `newText`. */
export interface Edit {
  readonly span: Span;
  readonly newText: string;
}

/** A fault of the text. */
export interface Problem {
  readonly code: ProblemCode;
  /** Only `text-cut-short` is a warning. */
  readonly severity: 'error' | 'warning';
  readonly channel: string | null;
  readonly span: Span;
  readonly message: string;
  /** Edits that cure it, best first, with a title each ("Write it as `310 kHz`"). */
  readonly cures: readonly { readonly title: string; readonly edits: readonly Edit[] }[];
}

/** A comment `# bandkeep: accept CODE [down to X], reason`. */
export interface Acceptance {
  readonly code: string;
  readonly reason: string;
  /** The margin in the finding's unit below which it lapses; null without a bound. */
  readonly downTo: number | null;
  /** What that margin is in; null where there is none. */
  readonly downToUnit: 'dB' | 's' | null;
  /** The comment's own text. */
  readonly span: Span;
  /** The line of text it speaks for, without its line end. */
  readonly line: Span;
}

/** A channel as it stands in the file; `channel` is null where a fault of the text keeps it from being whole. */
export interface ChannelEntry {
  readonly name: string;
  readonly direction: 'capture' | 'generate' | 'relay' | null;
  readonly ref: string | null;
  readonly channel: Channel | null;
}

/** A name defined in this file under `clocks`, `filters`, `sources` or `masks`, and the channels that use it. */
export interface DefinedName {
  readonly space: 'clocks' | 'filters' | 'sources' | 'masks';
  readonly name: string;
  readonly users: readonly string[];
  readonly place: Place;
}

/** One reading of one text. It is immutable; a newer text gives a newer reading, which shares all that did not change. */
export interface Reading {
  readonly text: string;
  readonly title: string | null;
  readonly entries: readonly ChannelEntry[];
  readonly names: readonly DefinedName[];
  readonly problems: readonly Problem[];
  readonly acceptances: readonly Acceptance[];
  /** The other files that the spec leans on, from the root, with `/`: load them, and read again with their contents. */
  readonly paths: readonly string[];
  /** How much work this reading was, for tests and benchmarks. */
  readonly counts: { readonly slices: number; readonly slicesRead: number; readonly channelsResolved: number };
}
