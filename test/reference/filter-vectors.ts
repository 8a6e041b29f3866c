/** The stored expected values of every filter family and kind, typed. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** A root of the upper half plane or the real axis. */
export type StoredRoot = readonly [re: number, im: number];

/** One filter and what it does on a grid; frequencies relative to its own edge, delay in seconds for edges in rad/s. */
export interface StoredFilter {
  readonly order: number;
  readonly poles: readonly StoredRoot[];
  readonly zeros: readonly StoredRoot[];
  readonly gain: readonly number[];
  readonly delay: readonly number[];
  readonly ripple?: number;
  readonly attenuation?: number;
  readonly halfPower?: number;
  readonly unitDelayHalfPower?: number;
  readonly stopEdge?: number;
  readonly stopEdgeLessOne?: number;
}

/** One filter of another kind, in Hz and seconds, on a grid of its own. */
export interface StoredKind extends StoredFilter {
  readonly kind: 'highpass' | 'bandpass' | 'bandstop';
  readonly family: 'butterworth' | 'chebyshev' | 'inverse-chebyshev' | 'elliptic' | 'bessel' | 'legendre' | 'gaussian';
  readonly low: number;
  readonly high: number;
  readonly grid: readonly number[];
}

/** ∫ |H|² dw of one filter. */
export interface StoredBandwidth {
  readonly family: StoredKind['family'];
  readonly order: number;
  readonly ripple?: number;
  readonly attenuation?: number;
  readonly bandwidth: number;
}

/** What make-filter-vectors.py writes. */
export interface FilterVectors {
  readonly versions: Readonly<Record<'python' | 'mpmath' | 'numpy' | 'scipy', string>>;
  readonly scipy_difference: Readonly<
    Record<'inverseChebyshev' | 'elliptic' | 'bessel', { readonly roots: number; readonly gain: number }>
  >;
  readonly grid: readonly number[];
  readonly tightGrid: readonly number[];
  readonly inverseChebyshev: readonly StoredFilter[];
  readonly elliptic: readonly StoredFilter[];
  readonly tight: readonly StoredFilter[];
  readonly bessel: readonly StoredFilter[];
  readonly legendre: readonly StoredFilter[];
  readonly gaussian: readonly StoredFilter[];
  readonly transforms: readonly StoredKind[];
  readonly noiseBandwidths: readonly StoredBandwidth[];
}

/** The script that makes them. */
export const filterVectorScript = join(import.meta.dirname, 'make-filter-vectors.py');

/** Reads a file of vectors; the stored one unless another is named. */
export function readFilterVectors(path = join(import.meta.dirname, 'filter-vectors.json')): FilterVectors {
  return JSON.parse(readFileSync(path, 'utf8')) as FilterVectors;
}
