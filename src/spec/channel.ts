/** One whole channel as the analysis takes it: names and `like` resolved, defaults applied, plain numbers in SI units, levels in dBFS. */
import type { Tolerance } from '../units/quantity';
import type { LevelLimit, Limit, MaskLimit } from './model-limit';
import type { Gate, Pulse, Slots } from './model-pulse';
import type { Band, Source } from './model-source';
import type { Stage } from './model-stage';

export type * from './model-limit';
export type * from './model-pulse';
export type * from './model-source';
export type * from './model-stage';

/** A band that the channel exists to carry. */
export interface WantedBand extends Band {
  readonly name: string | null;
  /** Level in dBFS of a tone anywhere in it. */
  readonly levelDb: number;
}

/** The sampling rate and where it comes from. */
export interface Rate {
  readonly hz: number;
  /** Relative tolerance of the clock (zero for a plain rate without one). */
  readonly tolerance: Tolerance;
  /** The clock it is derived from, or null for a plain frequency. */
  readonly clock: ClockShare | null;
}

/** A rate as clock · multiply / divide. */
export interface ClockShare {
  readonly name: string;
  readonly frequencyHz: number;
  readonly jitterSeconds: number;
  readonly multiply: number;
  readonly divide: number;
}

/** What a fix may choose a rate from; null in a channel means any rate. */
export type RateChoices =
  | { readonly kind: 'list'; readonly ratesHz: readonly number[] }
  | { readonly kind: 'range'; readonly lowHz: number; readonly highHz: number; readonly stepHz: number | null }
  | {
      readonly kind: 'clock';
      readonly clock: ClockShare;
      readonly divides: readonly number[] | { readonly from: number; readonly to: number };
    };

/** A whole channel. The same object is handed out as long as its own text and all it names are unchanged, so it can key a cache. */
export interface Channel {
  readonly name: string;
  readonly direction: 'capture' | 'generate' | 'relay';
  readonly ref: string | null;
  readonly wanted: readonly WantedBand[];
  readonly guardHz: number;
  readonly levelsAt: 'input' | 'sampler';
  readonly referenceHz: number;
  readonly unwanted: readonly Source[];
  /** Ranges after sampling in which a landing counts; null: the wanted bands as they appear there. */
  readonly protect: readonly Band[] | null;
  readonly fullScaleVpp: number | null;
  readonly impedanceOhm: number | null;
  readonly rate: Rate;
  readonly rateChoices: RateChoices | null;
  /** Capture: the aperture, at the input frequency. Generate and relay without a gate: the hold, at the output frequency. With a gate: `instant`. */
  readonly pulse: Pulse;
  /** Relay only: natural sampling or track and hold; null for flat-top sampling, where `pulse` is the hold. */
  readonly gate: Gate | null;
  /** Relay only. */
  readonly slots: Slots | null;
  /** The whole analogue path, in order; in relay the input filter, then the output filter. */
  readonly stages: readonly Stage[];
  /** Those of `stages` before the sampler: all in capture, none in generate. */
  readonly inputStages: readonly Stage[];
  /** Those of `stages` behind it: none in capture, all in generate. */
  readonly outputStages: readonly Stage[];
  readonly testTone: { readonly frequencyHz: number; readonly levelDb: number };
  /** The sampler's own rms jitter; the clock's is in `rate.clock`. */
  readonly jitterSeconds: number;
  readonly bits: number | null;
  /** The limits that are one value. */
  readonly limits: readonly Limit[];
  readonly levelLimit: LevelLimit | null;
  /** The masks of `response`, `through` and `output`. */
  readonly masks: readonly MaskLimit[];
}
