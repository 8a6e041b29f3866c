/** The stored expected values of filters and holds, typed. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';

/** Upper half plane and real poles of one filter, corner 1, and what it does on the grid. */
interface FilterVector {
  readonly order: number;
  readonly poles: readonly (readonly [number, number])[];
  readonly gain: readonly number[];
  readonly delay: readonly number[];
  readonly phase: readonly number[];
}

/** A Chebyshev filter with its ripple ending at 1. */
interface ChebyshevVector extends FilterVector {
  readonly ripple: number;
  readonly halfPower: number;
}

/** What make-vectors.py writes. */
export interface SignalVectors {
  readonly how: string;
  readonly versions: Readonly<Record<'python' | 'mpmath' | 'numpy' | 'scipy', string>>;
  readonly scipy_difference: Readonly<Record<'butterworth' | 'chebyshev', { readonly poles: number; readonly gain: number }>>;
  readonly grid: readonly number[];
  readonly butterworth: readonly FilterVector[];
  readonly chebyshev: readonly ChebyshevVector[];
  readonly sinc: readonly (readonly [number, number])[];
  readonly sideLobes: readonly (readonly [number, number, number])[];
}

/** The script that makes them. */
export const vectorScript = join(import.meta.dirname, 'make-vectors.py');

/** Reads a file of vectors; the stored one unless another is named. */
export function readVectors(path = join(import.meta.dirname, 'signal-vectors.json')): SignalVectors {
  return JSON.parse(readFileSync(path, 'utf8')) as SignalVectors;
}
