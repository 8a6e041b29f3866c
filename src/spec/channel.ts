/** One whole channel as the analysis takes it: names and `like` resolved, defaults applied, plain numbers in SI units, levels in dBFS. */
import type { Tolerance } from '../units/quantity';

/** A frequency interval in Hz; `highHz` may be Infinity. */
export interface Band {
  readonly lowHz: number;
  readonly highHz: number;
}

/** A band that the channel exists to carry. */
export interface WantedBand extends Band {
  readonly name: string | null;
  /** Level in dBFS of a tone anywhere in it. */
  readonly levelDb: number;
}

/** Something that arrives and is not wanted; `name` is what messages call it, made up from kind and frequency where none is given. */
export type Source = ToneSource | BandSource | AnythingSource;

/** A tone that may stand anywhere within its tolerance. */
export interface ToneSource {
  readonly kind: 'tone';
  readonly name: string;
  readonly ref: string | null;
  readonly frequencyHz: number;
  readonly tolerance: Tolerance;
  readonly levelDb: number;
}

/** One tone of the given level that may stand anywhere in a band. */
export interface BandSource extends Band {
  readonly kind: 'band';
  readonly name: string;
  readonly ref: string | null;
  readonly levelDb: number;
}

/** One tone of the given level that may stand anywhere outside the wanted bands. */
export interface AnythingSource {
  readonly kind: 'anything';
  readonly name: string;
  readonly ref: string | null;
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

/** A pulse's width: a time, or a share of the sampling period. */
export type PulseWidth = { readonly seconds: number } | { readonly share: number };

/** The pulse of an aperture or a hold. `zero-order` is a rectangle of share 1. */
export type Pulse = { readonly shape: 'instant' } | { readonly shape: 'rectangle'; readonly width: PulseWidth };

/** One stage of the analogue path. */
export interface Stage {
  /** The stage's own name, or null. */
  readonly name: string | null;
  /** What messages call it: "stage 2", "pick-up guard, stage 2", or its name. */
  readonly label: string;
  readonly form: StageForm;
  /** Relative tolerance of the corner (for rc: that of 1/(RC)), as factors minus one; zero where none is given. */
  readonly cornerTolerance: Tolerance;
  /** Relative tolerance of the gain. */
  readonly gainTolerance: Tolerance;
}

/** How a stage is given. */
export type StageForm =
  | { readonly kind: 'butterworth'; readonly order: number; readonly cornerHz: number }
  | {
      readonly kind: 'chebyshev';
      readonly order: number;
      readonly cornerHz: number;
      readonly rippleDb: number;
      readonly cornerAt: 'half-power' | 'ripple';
    }
  | { readonly kind: 'rc'; readonly ohm: number; readonly farad: number }
  | { readonly kind: 'bandwidth'; readonly cornerHz: number };

/** The limits that can be judged so far. */
export type LimitKey = 'alias' | 'image' | 'flatness' | 'snr' | 'headroom';

/** A limit, short or long form alike. */
export interface Limit {
  readonly key: LimitKey;
  readonly at: number;
  readonly unit: 'dBFS' | 'dBc' | 'dB';
  readonly ref: string | null;
  /** The margin in dB (or in the limit's unit) that it must pass by without a warning; null for the default. */
  readonly margin: number | null;
  /** snr only: whether unwanted sources' jitter and landings count. */
  readonly withUnwanted: boolean;
}

/** A whole channel. The same object is handed out as long as its own text and all it names are unchanged, so it can key a cache. */
export interface Channel {
  readonly name: string;
  readonly direction: 'capture' | 'generate';
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
  /** Capture: the aperture, at the input frequency. Generate: the hold, at the output frequency. */
  readonly pulse: Pulse;
  readonly stages: readonly Stage[];
  readonly testTone: { readonly frequencyHz: number; readonly levelDb: number };
  /** The sampler's own rms jitter; the clock's is in `rate.clock`. */
  readonly jitterSeconds: number;
  readonly bits: number | null;
  readonly limits: readonly Limit[];
}
