/** Properties that every response must have: bounds enclose its values, the slope encloses its differences. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { Response } from '../../src/signal/response';

/** An interval in terms of a scale: where it starts (log-distributed, 0 now and then) and how wide it is. */
const intervals = fc.record({
  start: fc.oneof(
    { weight: 1, arbitrary: fc.constant(0) },
    { weight: 9, arbitrary: fc.double({ min: -4, max: 3, noNaN: true }).map((x) => 10 ** x) },
  ),
  width: fc.double({ min: -7, max: 2, noNaN: true }).map((x) => 10 ** x),
  shares: fc.array(fc.double({ min: 0, max: 1, noNaN: true }), { minLength: 8, maxLength: 8 }),
});

/** Checks that `bounds` encloses ln|H| at random points of random intervals, endless ones included. */
export function assertBoundsEnclose(response: Response, scaleHz: number, seed: number): void {
  const property = fc.property(intervals, ({ start, width, shares }) => {
    const low = start * scaleHz;
    const high = low + width * scaleHz;
    const bounds = response.bounds(low, high);
    const endless = response.bounds(low, Infinity);
    for (const share of shares) {
      const f = Math.min(low + share * (high - low), high);
      const value = response.logGain(f);
      assert.ok(bounds.low <= value && value <= bounds.high, `ln|H(${f})| = ${value} outside ${bounds.low} .. ${bounds.high}`);
      assert.ok(endless.low <= value && value <= endless.high, `ln|H(${f})| = ${value} outside the endless bounds from ${low}`);
    }
  });
  fc.assert(property, { seed, numRuns: 400 });
}

/** Checks that `slope` encloses the difference quotient between random points of random intervals. */
export function assertSlopeEncloses(response: Response, scaleHz: number, seed: number): void {
  const property = fc.property(intervals, ({ start, width, shares }) => {
    const low = start * scaleHz;
    const high = low + width * scaleHz;
    const slope = response.slope(low, high);
    if (slope === null) return;
    const points = shares.map((share) => Math.min(low + share * (high - low), high)).sort((a, b) => a - b);
    points.slice(1).forEach((f, index) => {
      const before = points[index]!;
      const step = f - before;
      const rise = response.logGain(f) - response.logGain(before);
      if (step === 0 || !Number.isFinite(rise)) return;
      // Rounding of two logarithms, a few units in the last place of the largest sum in them.
      const rounding = 1e-12 + 1e-12 * Math.abs(rise);
      assert.ok(
        rise >= slope.low * step - rounding && rise <= slope.high * step + rounding,
        `from ${before} to ${f}: ${rise} against ${slope.low} .. ${slope.high}`,
      );
    });
  });
  fc.assert(property, { seed, numRuns: 400 });
}
