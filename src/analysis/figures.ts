/** Everything that is computed of one channel, in SI units, levels in dB; the JSON result is this, with places added. Infinity is allowed where a value is unbounded. */
import type { LimitKey, MaskLimit } from '../spec/channel';

/** Where an extreme is reached. */
export interface Where {
  readonly frequency: number;
  /** Alias: where it lands after sampling. Image: the wanted frequency it copies. */
  readonly lands?: number;
  readonly source?: string;
}

/** Tolerance values at a worst case by label, e.g. { "pick-up guard, stage 2, corner": 0.04 }; relative deviations. */
export type WorstAt = Readonly<Record<string, number>>;

/** Every limit that is judged: the single values, the level's range and the masks. */
export type JudgedKey = LimitKey | 'level' | MaskLimit['key'];

/** One limit, judged. */
export interface LimitFigure {
  readonly limit: JudgedKey;
  readonly ref: string | null;
  readonly unit: 'dBFS' | 'dBc' | 'dB' | 's';
  /** `inside` for a range and for masks: `at` is then the bound that `value` comes nearest to, or passes furthest. */
  readonly sense: 'at-most' | 'at-least' | 'inside';
  readonly at: number;
  /** Worst case over all tolerances; null where it was not judged. */
  readonly value: number | null;
  readonly nominal: number | null;
  /** Positive: inside the limit. */
  readonly margin: number | null;
  /** The gap between the proved bounds of `value`, in the same unit. */
  readonly gap: number | null;
  readonly judged: boolean;
  readonly passes: boolean;
  readonly where: Where | null;
  readonly worstAt: WorstAt | null;
}

/** A wanted band and where it appears after sampling (capture) or leaves (generate). */
export interface WantedFigure {
  readonly name: string | null;
  readonly low: number;
  readonly high: number;
  readonly level: number;
  readonly appearsLow: number;
  readonly appearsHigh: number;
  readonly zone: number;
  readonly inverted: boolean;
}

/** The strongest landing of one source in a protected range; frequency null where none lands. */
export interface AliasFigure {
  readonly source: string;
  /** Index into the channel's `unwanted`. */
  readonly index: number;
  /** Which harmonic lands so: 1 for the source itself, and where nothing lands. */
  readonly harmonic: number;
  readonly frequency: number | null;
  readonly lands: number | null;
  readonly fold: number | null;
  readonly inverted: boolean | null;
  /** dBFS, worst case; null where none lands. */
  readonly level: number | null;
  readonly nominal: number | null;
  /** All its harmonics and lines that land, as powers, each at its own worst; dBFS, null where none lands. */
  readonly sum: number | null;
  /** dB against the wanted tone at `reference` as it comes out. */
  readonly relative: number | null;
  readonly limit: number | null;
  readonly margin: number | null;
  readonly gap: number | null;
  readonly worstAt: WorstAt | null;
}

/** The strongest point of one copy and side. */
export interface ImageFigure {
  readonly copy: number;
  readonly side: 'lower' | 'upper' | 'baseband';
  readonly from: number;
  readonly frequency: number;
  readonly level: number;
  readonly nominal: number;
  readonly relative: number;
  readonly limit: number | null;
  readonly margin: number | null;
  readonly gap: number;
  readonly worstAt: WorstAt | null;
}

/** What stands at the worst point of an `output` mask. */
export interface MaskOrigin {
  /** An unwanted source's name; null for a copy of the wanted band. */
  readonly source: string | null;
  /** Where it arrives, or in generate the wanted frequency that it copies. */
  readonly frequency: number;
}

/** The worst point of one segment of a mask; in dB against the gain at `reference`, or in dBFS for `output`. */
export interface MaskFigure {
  readonly limit: MaskLimit['key'];
  /** Index into the mask's segments. */
  readonly segment: number;
  /** Which of the segment's bounds is nearest. */
  readonly side: 'lower' | 'upper';
  readonly frequency: number;
  readonly value: number;
  readonly nominal: number;
  readonly bound: number;
  /** Positive: inside the mask. */
  readonly margin: number;
  readonly gap: number;
  readonly worstAt: WorstAt | null;
  /** `output` only, where anything leaves in the segment. */
  readonly from?: MaskOrigin;
}

/** Noise in the wanted band as it comes out, dBFS; null where that part does not exist. */
export interface NoiseFigures {
  readonly quantisation: number | null;
  readonly jitter: number | null;
  readonly jitterUnwanted: number | null;
  readonly sources: number | null;
  readonly stages: number | null;
  readonly thermal: number | null;
  readonly converter: number | null;
  readonly total: number | null;
  /** V rms; null without full scale. */
  readonly volts: number | null;
}

/** A fault in how a wanted band is sampled. */
export interface SamplingFault {
  readonly kind: 'wanted-folds' | 'wanted-touches';
  /** Index into `wanted`. */
  readonly index: number;
  /** The other wanted band it falls onto, or null where it folds onto itself. */
  readonly onto: number | null;
  /** The multiple of half the rate that is crossed or touched, in Hz; null with `onto`. */
  readonly edgeHz: number | null;
}

/** A stretch of a source that lies inside a wanted band: not an alias, reported once. */
export interface Overlap {
  /** Index into `unwanted`. */
  readonly index: number;
  /** 1 for the source itself. */
  readonly harmonic: number;
  readonly lowHz: number;
  readonly highHz: number;
}

/** A measured table that refuses to be asked outside its range, and is. */
export interface BeyondData {
  /** Index into the channel's `stages`. */
  readonly stage: number;
  /** Which end of the table it is about, and that end in Hz at the worst of the corner's tolerance. */
  readonly side: 'below' | 'beyond';
  readonly endHz: number;
  /** The farthest frequency asked; it may be Infinity. */
  readonly askedHz: number;
  /** Who asks there. */
  readonly asks: 'wanted' | 'test tone' | 'source' | 'copies' | 'landings' | MaskLimit['key'];
  /** Its name, where a source asks. */
  readonly source: string | null;
  /** The limits that can then not be judged. */
  readonly keys: readonly JudgedKey[];
}

/** All figures of one channel. */
export interface Figures {
  readonly name: string;
  readonly direction: 'capture' | 'generate' | 'relay';
  readonly ref: string | null;
  readonly rate: number;
  readonly outputRate: number;
  readonly halfRate: number;
  readonly zone: number | null;
  readonly inverted: boolean | null;
  readonly reference: number;
  readonly rateWindow: { readonly low: number; readonly high: number } | null;
  readonly wanted: readonly WantedFigure[];
  readonly protected: readonly { readonly low: number; readonly high: number }[];
  readonly limits: readonly LimitFigure[];
  readonly droop: number | null;
  readonly delay: number | null;
  readonly delaySpread: number | null;
  readonly aliases: readonly AliasFigure[];
  readonly alias: AliasFigure | null;
  readonly aliasSum: number | null;
  readonly images: readonly ImageFigure[];
  readonly image: ImageFigure | null;
  readonly noise: NoiseFigures;
  readonly testTone: { readonly frequency: number; readonly level: number; readonly atSampler: number };
  readonly snr: number | null;
  readonly sinad: number | null;
  readonly enob: number | null;
  readonly enobFullScale: number | null;
  readonly headroom: number | null;
  /** One for each segment of each mask, in the channel's order. */
  readonly masks: readonly MaskFigure[];
  /** dB from one time slot into the next at the worst instant; null without slots. */
  readonly crosstalk: number | null;
  /** |c_k|/c_0 for k = 0 … 8; null without a gate. */
  readonly copyWeights: readonly number[] | null;
  readonly beyondData: readonly BeyondData[];
  readonly faults: readonly SamplingFault[];
  readonly overlaps: readonly Overlap[];
  /** Points and bounds evaluated by the searches, for tests. */
  readonly evaluations: number;
}
