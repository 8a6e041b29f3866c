/** A measured response as a table: straight in dB and in phase over frequency between its points. */

/** The table; outside it the first gain holds below, the last one goes on by a slope beyond, and the phase goes straight on at both ends. */
export interface GainTable {
  /** In Hz, ≥ 0, rising, at least two. */
  readonly frequenciesHz: readonly number[];
  /** Of the same length, finite. */
  readonly gainsDb: readonly number[];
  /** Unwrapped, of the same length; null where no phase is known. */
  readonly phasesRad: readonly number[] | null;
  /** 0 where the last gain holds. */
  readonly beyondDbPerDecade: number;
}

/**
 * The table of the same thing with its frequency axis stretched: H(f/factor).
 *
 * @param factor > 0.
 * Source: substitution.
 * @example stretchedTable({ frequenciesHz: [0, 10], gainsDb: [0, -3], phasesRad: null, beyondDbPerDecade: 0 }, 2).frequenciesHz[1] // 20
 */
export function stretchedTable(table: GainTable, factor: number): GainTable {
  return { ...table, frequenciesHz: table.frequenciesHz.map((hz) => hz * factor) };
}

/**
 * How many of some rising numbers lie below a bound, or at it too.
 *
 * Source: bisection.
 * @example countUpTo([1, 2, 3], 2, 'at most') // 2
 */
export function countUpTo(rising: readonly number[], bound: number, which: 'below' | 'at most'): number {
  let low = 0;
  let high = rising.length;
  while (low < high) {
    const middle = (low + high) >> 1;
    const value = rising[middle] ?? Infinity;
    if (value < bound || (which === 'at most' && value === bound)) low = middle + 1;
    else high = middle;
  }
  return low;
}
