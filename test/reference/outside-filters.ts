/** The folded outside tables of filters, typed. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import type { FilterFamily } from '../../src/signal/families/design-filter';
import type { StoredRoot } from './filter-vectors';

/** A filter as the tables name it. */
export interface OutsideDesign {
  readonly family: FilterFamily;
  readonly order: number;
  readonly ripple?: number;
  readonly attenuation?: number;
  /** Of bessel and gaussian: what is 1 rad/s, or what else is fixed. */
  readonly norm?: 'mag' | 'delay' | 'phase' | 'raw';
}

/** A low-pass in rad/s with its unit frequency at 1; H = constant·Π(s − z)/Π(s − p). */
export interface OutsidePrototype extends OutsideDesign {
  readonly poles: readonly StoredRoot[];
  readonly zeros: readonly StoredRoot[];
  readonly constant: number;
  readonly halfPower?: number;
  readonly stopEdge?: number;
  readonly stopEdgeLessOne?: number;
  readonly delayAtZero?: number;
}

/** dB (null at a null) and delay in s over a grid. */
interface OnGrid {
  readonly db: readonly (number | null)[];
  readonly delay: readonly number[];
}

/** Another kind, roots in rad/s, edges and grid in Hz. */
export interface OutsideKind extends OutsideDesign, OnGrid {
  readonly kind: 'highpass' | 'bandpass' | 'bandstop';
  readonly edges: readonly number[];
  readonly poles: readonly StoredRoot[];
  readonly zeros: readonly StoredRoot[];
  readonly grid: readonly number[];
}

/** Noise bandwidth over the unit frequency, against the peak and against 0 Hz, null where it is endless; half power; delay at 0 Hz. */
export interface OutsideBandwidth extends OutsideDesign {
  readonly overPeak: number | null;
  readonly overZeroHz: number | null;
  readonly overHalfPower: number | null;
  readonly halfPower: number;
  readonly delayAtZero: number;
}

/** What make-outside-tables.py writes. */
export interface OutsideFilters {
  readonly responseStep: number;
  readonly prototypes: readonly OutsidePrototype[];
  readonly responses: readonly (OutsideDesign & OnGrid)[];
  readonly kinds: readonly OutsideKind[];
  readonly bandwidths: readonly OutsideBandwidth[];
  readonly cascades: readonly { readonly count: number; readonly halfPower: number; readonly bandwidth: number }[];
  readonly ladders: readonly { readonly poles: readonly number[]; readonly halfPower: number; readonly delayAtZero: number }[];
  readonly sections: readonly (OutsideDesign & { readonly sections: readonly (readonly [w0: number, q: number | null])[] })[];
}

/** The stored file. */
export function readOutsideFilters(): OutsideFilters {
  return JSON.parse(readFileSync(join(import.meta.dirname, 'outside-filters.json'), 'utf8')) as OutsideFilters;
}
