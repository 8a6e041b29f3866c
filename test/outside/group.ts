/** A group of values from outside the project: what they are, where they come from, and how far ours are from them. */
import assert from 'node:assert/strict';

/** In what a deviation is counted. */
export type Measure = 'relative' | 'dB' | 'absolute' | 'exact';

/** One group: `define` declares its tests, which hand every value to the tally. */
export interface OutsideGroup {
  readonly title: string;
  readonly source: string;
  readonly define: (tally: Tally) => void;
}

/** The values of one group in one measure. */
export interface TallyLine {
  readonly measure: Measure;
  readonly values: number;
  /** Of the value that comes nearest to what is allowed, or exceeds it. */
  readonly deviation: number;
  readonly allowed: number;
}

/** Holds values to expected ones and remembers how many there were and how far the worst was off. */
export class Tally {
  private readonly kept = new Map<Measure, TallyLine>();

  /** Fails unless within a share of the expected value; 0 and infinities must be met exactly. */
  relative(actual: number, expected: number, allowed: number, what: string): void {
    const off = actual === expected ? 0 : Math.abs(actual - expected) / Math.abs(expected);
    this.judge('relative', [actual, expected, off, allowed], what);
  }

  /** Fails unless within so many dB. */
  decibels(actual: number, expected: number, allowed: number, what: string): void {
    this.judge('dB', [actual, expected, actual === expected ? 0 : Math.abs(actual - expected), allowed], what);
  }

  /** Fails unless within a difference in the values' own unit. */
  absolute(actual: number, expected: number, allowed: number, what: string): void {
    this.judge('absolute', [actual, expected, actual === expected ? 0 : Math.abs(actual - expected), allowed], what);
  }

  /** Fails unless equal. */
  exact(actual: unknown, expected: unknown, what: string): void {
    this.keep('exact', 0, 0);
    assert.deepEqual(actual, expected, what);
  }

  /** One line for each measure that was used. */
  lines(): readonly TallyLine[] {
    return [...this.kept.values()];
  }

  private judge(
    measure: Measure,
    [actual, expected, off, allowed]: readonly [number, number, number, number],
    what: string,
  ): void {
    this.keep(measure, off, allowed);
    assert.ok(off <= allowed, `${what}: ${actual} is ${off} from ${expected}, more than ${allowed} (${measure})`);
  }

  private keep(measure: Measure, deviation: number, allowed: number): void {
    const before = this.kept.get(measure);
    const worse = before === undefined || !(deviation / allowed <= before.deviation / before.allowed);
    const worst = worse ? { deviation, allowed } : { deviation: before.deviation, allowed: before.allowed };
    this.kept.set(measure, { measure, values: (before?.values ?? 0) + 1, ...worst });
  }
}
