/** What arrives and is not wanted, as the analysis takes it. */
import type { Tolerance } from '../units/quantity';

/** A frequency interval in Hz; `highHz` may be Infinity. */
export interface Band {
  readonly lowHz: number;
  readonly highHz: number;
}

/** Where a source enters: at the input, in front of a stage (an index into the channel's `stages`), or at the sampler, behind the filter. */
export type Entrance = 'input' | 'sampler' | { readonly stage: number };

/** Harmonics of a tone or band: harmonic m stands `slopeDbPerDecade`·log10(m) dB from the level of the first. */
export interface Harmonics {
  /** The highest that counts. */
  readonly to: number;
  /** Negative where they fall. */
  readonly slopeDbPerDecade: number;
  /** Whether only odd ones stand. */
  readonly odd: boolean;
}

/** What every source has; `name` is what messages call it, made up from kind and frequency where none is given. */
interface AnySource {
  readonly name: string;
  readonly ref: string | null;
  readonly enters: Entrance;
}

/** A tone that may stand anywhere within its tolerance. */
export interface ToneSource extends AnySource {
  readonly kind: 'tone';
  readonly frequencyHz: number;
  readonly tolerance: Tolerance;
  readonly levelDb: number;
  readonly harmonics: Harmonics | null;
}

/** One tone of the given level that may stand anywhere in a band. */
export interface BandSource extends AnySource, Band {
  readonly kind: 'band';
  readonly levelDb: number;
  readonly harmonics: Harmonics | null;
}

/** One tone of the given level that may stand anywhere outside the wanted bands. */
export interface AnythingSource extends AnySource {
  readonly kind: 'anything';
  readonly levelDb: number;
}

/** One row of a table of levels. */
export interface SpectrumPoint {
  readonly frequencyHz: number;
  readonly levelDb: number;
}

/** A table of levels: an envelope, straight in dB over log frequency, under which a tone may stand anywhere; or lines. */
export interface SpectrumSource extends AnySource {
  readonly kind: 'spectrum';
  /** The path as the spec names it. */
  readonly path: string;
  /** Rising in frequency, at least one for lines and two for an envelope. */
  readonly points: readonly SpectrumPoint[];
  /** Whether each row is a tone. */
  readonly lines: boolean;
  /** The highest level of the table. */
  readonly levelDb: number;
}

/** Something that arrives and is not wanted. */
export type Source = ToneSource | BandSource | AnythingSource | SpectrumSource;
