/** What a channel is judged by, as the analysis takes it: single values, the range of the output level, and masks. */
import type { Band } from './model-source';

/** The limits that are one value. */
export type LimitKey = 'alias' | 'image' | 'flatness' | 'delay' | 'delay-spread' | 'snr' | 'headroom' | 'crosstalk';

/** A limit that is one value, short or long form alike. */
export interface Limit {
  readonly key: LimitKey;
  readonly at: number;
  readonly unit: 'dBFS' | 'dBc' | 'dB' | 's';
  readonly ref: string | null;
  /** The margin in dB (or in the limit's unit) that it must pass by without a warning; null for the default. */
  readonly margin: number | null;
  /** snr only: whether unwanted sources' jitter and landings count. */
  readonly withUnwanted: boolean;
  /** alias only: whether all landings of all sources count together, as powers. */
  readonly sum: boolean;
}

/** The range that the wanted output must stay in over its whole band. */
export interface LevelLimit {
  /** In dBFS; an end that was left out is −Infinity or Infinity. */
  readonly lowDb: number;
  readonly highDb: number;
  readonly ref: string | null;
  readonly margin: number | null;
}

/** Straight over a segment's band, in its own way along: `fromDb` at the lower end, `toDb` at the upper one. */
export interface MaskEdge {
  readonly fromDb: number;
  readonly toDb: number;
}

/** One segment of a mask: what must not be passed in a band. */
export interface MaskSegment extends Band {
  /** How it was written. */
  readonly sense: 'within' | 'below' | 'above';
  /** What must not be fallen below; null for `below`. */
  readonly lower: MaskEdge | null;
  /** What must not be exceeded; null for `above`. */
  readonly upper: MaskEdge | null;
  /** Whether a slope is straight over frequency or over its logarithm. */
  readonly along: 'linear' | 'log';
}

/** A mask: `response` and `through` in dB relative to the gain at `reference`, `output` in dBFS outside the wanted band. */
export interface MaskLimit {
  readonly key: 'response' | 'through' | 'output';
  /** The name under `masks`, or null where the segments stand in place. */
  readonly mask: string | null;
  readonly segments: readonly MaskSegment[];
  readonly ref: string | null;
  readonly margin: number | null;
}
