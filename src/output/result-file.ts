/** The types of the machine-readable result, version 1: SI units, dB for levels, null for what does not apply, infinities as words. */
import type { Range } from '../protocol/position';

/** A number, an infinity as a word, or null where it does not apply. */
export type ResultNumber = number | 'inf' | '-inf' | null;

/** The whole result. */
export interface ResultFile {
  readonly bandkeep: 1;
  readonly tool: string;
  readonly inputs: readonly { readonly path: string; readonly sha256: string }[];
  readonly files: readonly FileResult[];
}

/** One spec. */
export interface FileResult {
  readonly path: string;
  readonly findings: readonly FindingResult[];
  readonly channels: readonly ChannelResult[];
}

/** One finding. */
export interface FindingResult {
  readonly code: string;
  readonly severity: 'error' | 'warning' | 'hint';
  readonly channel: string | null;
  readonly ref: string | null;
  readonly message: string;
  readonly accepted: { readonly reason: string; readonly downTo: number | null; readonly range: Range } | null;
  readonly range: Range;
  readonly related: readonly { readonly path: string; readonly message: string; readonly range: Range }[];
  readonly figures: Readonly<
    Record<'value' | 'nominal' | 'limit' | 'margin' | 'frequency' | 'lands', ResultNumber> & { source: string | null }
  > | null;
  readonly fixes: readonly FixResult[];
  readonly blockedBy: { readonly limit: string; readonly misses: ResultNumber; readonly candidate: string } | null;
}

/** One proved fix. */
export interface FixResult {
  readonly title: string;
  readonly kind: string;
  readonly margin: ResultNumber;
  readonly edits: readonly { readonly path: string; readonly range: Range; readonly newText: string }[];
}

/** One limit of a channel. */
export interface LimitResult {
  readonly limit: string;
  readonly ref: string | null;
  readonly unit: string;
  readonly sense: 'at-most' | 'at-least' | 'inside';
  readonly at: ResultNumber;
  readonly value: ResultNumber;
  readonly nominal: ResultNumber;
  readonly margin: ResultNumber;
  readonly gap: ResultNumber;
  readonly judged: boolean;
  readonly passes: boolean;
  readonly where: { readonly frequency: ResultNumber; readonly lands: ResultNumber; readonly source: string | null } | null;
  readonly worstAt: Readonly<Record<string, ResultNumber>> | null;
  readonly range: Range;
}

/** One source's strongest landing. */
export interface AliasResult {
  readonly source: string;
  /** 1 for the source itself. */
  readonly harmonic: number;
  readonly frequency: ResultNumber;
  readonly lands: ResultNumber;
  readonly fold: ResultNumber;
  readonly inverted: boolean | null;
  readonly level: ResultNumber;
  readonly nominal: ResultNumber;
  /** All its harmonics and lines that land, as powers; `level` where only one does. */
  readonly sum: ResultNumber;
  readonly relative: ResultNumber;
  readonly limit: ResultNumber;
  readonly margin: ResultNumber;
}

/** One copy's strongest point. */
export interface ImageResult {
  readonly copy: number;
  readonly side: string;
  readonly from: ResultNumber;
  readonly frequency: ResultNumber;
  readonly level: ResultNumber;
  readonly relative: ResultNumber;
  readonly limit: ResultNumber;
  readonly margin: ResultNumber;
}

/** The worst point of one segment of a mask, in dB against `reference`, or in dBFS for `output`. */
export interface MaskResult {
  readonly limit: string;
  /** Its place among the mask's segments, from 0. */
  readonly segment: number;
  readonly frequency: ResultNumber;
  readonly value: ResultNumber;
  readonly bound: ResultNumber;
  readonly margin: ResultNumber;
}

/** One channel; everything below `passes` is null where the channel is not whole. */
export interface ChannelResult {
  readonly name: string;
  readonly direction: string | null;
  readonly ref: string | null;
  readonly passes: boolean | null;
  readonly rate: ResultNumber;
  readonly outputRate: ResultNumber;
  readonly halfRate: ResultNumber;
  readonly zone: number | null;
  readonly inverted: boolean | null;
  readonly reference: ResultNumber;
  readonly rateWindow: { readonly low: ResultNumber; readonly high: ResultNumber } | null;
  readonly wanted:
    | readonly (Readonly<Record<'low' | 'high' | 'level' | 'appearsLow' | 'appearsHigh', ResultNumber>> & {
        readonly name: string | null;
      })[]
    | null;
  readonly protected: readonly { readonly low: ResultNumber; readonly high: ResultNumber }[] | null;
  readonly limits: readonly LimitResult[] | null;
  readonly droop: ResultNumber;
  readonly delay: ResultNumber;
  readonly delaySpread: ResultNumber;
  readonly aliases: readonly AliasResult[] | null;
  readonly alias: AliasResult | null;
  readonly aliasSum: ResultNumber;
  readonly images: readonly ImageResult[] | null;
  readonly image: ImageResult | null;
  readonly masks: readonly MaskResult[] | null;
  /** Not computed yet. */
  readonly spurs: null;
  readonly noise: Readonly<
    Record<
      'quantisation' | 'jitter' | 'jitterUnwanted' | 'sources' | 'stages' | 'thermal' | 'converter' | 'total' | 'volts',
      ResultNumber
    >
  > | null;
  readonly testTone: { readonly frequency: ResultNumber; readonly level: ResultNumber; readonly atSampler: ResultNumber } | null;
  readonly snr: ResultNumber;
  readonly sinad: ResultNumber;
  readonly enob: ResultNumber;
  readonly enobFullScale: ResultNumber;
  readonly headroom: ResultNumber;
  /** Not computed yet. */
  readonly settling: null;
  /** In dB; null without time slots. */
  readonly crosstalk: ResultNumber;
  /** |c_k|/c_0 for k = 0 … 8; null without a gate. */
  readonly copyWeights: readonly ResultNumber[] | null;
  /** Not computed yet. */
  readonly parts: null;
}
