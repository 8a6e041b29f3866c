/** Ratios of sections: their ranges enclose and are reached, their slopes and bends enclose, whatever zero stands over whatever pole. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import {
  hasNull,
  ratioAt,
  ratioBends,
  ratioRange,
  ratioSlopeAt,
  ratioSlopes,
  sectionRatio,
} from '../../src/signal/section-ratio';
import { doubleSection, pairSection, singleSection, type Section } from '../../src/signal/sections';
import { assertClose } from '../support/tolerance';

const size = fc.double({ min: -2, max: 2, noNaN: true }).map((x) => 10 ** x);
const flat = fc.double({ min: -4, max: 1, noNaN: true }).map((x) => 10 ** x);
const polePair = fc.record({ im: size, damping: flat }).map(({ im, damping }): Section => pairSection({ re: -im * damping, im }));
const zeroPair = fc.oneof(
  polePair,
  size.map((im): Section => pairSection({ re: 0, im })),
);
const single = size.map((re): Section => singleSection(re));
const double = fc.tuple(size, size).map(([one, other]): Section => doubleSection(one, other));
const origin = fc.constant<Section>(singleSection(0));

const ratios = fc
  .oneof(
    fc.tuple(fc.constant(null), fc.oneof(polePair, single)),
    fc.tuple(zeroPair, fc.oneof(polePair, double)),
    fc.tuple(fc.oneof(single, origin), fc.oneof(polePair, single)),
    fc.tuple(fc.oneof(double, fc.constant<Section>(doubleSection(0, 0))), polePair),
  )
  .map(([zero, pole]) => sectionRatio(zero, pole));
const intervals = fc.record({ low: fc.oneof(fc.constant(0), size), width: fc.oneof(size, fc.constant(Infinity)) });

/** Points of an interval, its ends among them, crowded at the low one. */
function pointsOf(low: number, high: number): readonly number[] {
  const to = high === Infinity ? 1e6 * (low + 1) : high;
  return Array.from({ length: 301 }, (_, index) => Math.min(low + (to - low) * (index / 300) ** 4, high));
}

describe('ratioRange', () => {
  it('encloses every value, to infinity too, and is reached', () => {
    fc.assert(
      fc.property(ratios, intervals, (ratio, { low, width }) => {
        const range = ratioRange(ratio, low, low + width);
        const values = [...pointsOf(low, low + width), low + width].map((f) => ratioAt(ratio, f));
        const slack = 1e-9 * Math.abs(range.high);
        for (const value of values)
          assert.ok(range.low - slack <= value && value <= range.high + slack, `${value} in ${JSON.stringify(range)}`);
        const spread = Math.max(...values) - Math.min(...values);
        assert.ok(range.high - range.low >= spread - slack);
      }),
      { seed: 81, numRuns: 1500 },
    );
  });

  it('is no wider than the values of a fine scan of a plain case', () => {
    const ratio = sectionRatio(pairSection({ re: 0, im: 3 }), pairSection({ re: -0.2, im: 1 }));
    const values = Array.from({ length: 200_001 }, (_, index) => ratioAt(ratio, 0.5 + index * 1e-5));
    const range = ratioRange(ratio, 0.5, 2.5);
    assertClose(range.high, extremeOf(values, Math.max), 1e-6);
    assertClose(range.low, extremeOf(values, Math.min), 1e-6);
  });
});

/** One extreme of more values than an argument list holds. */
function extremeOf(values: readonly number[], extreme: (one: number, other: number) => number): number {
  return values.reduce((one, other) => extreme(one, other));
}

describe('ratioSlopes and ratioBends', () => {
  it('enclose the slope at every point, and its own differences', () => {
    fc.assert(
      fc.property(ratios, intervals, (ratio, { low, width }) => {
        const high = low + Math.min(width, 100);
        if (hasNull(ratio, low, high)) return;
        const slopes = ratioSlopes(ratio, low, high);
        const bends = ratioBends(ratio, low * low, high * high);
        const us = pointsOf(low, high).map((f) => f * f);
        const slack = 1e-9 * (Math.abs(slopes.low) + Math.abs(slopes.high));
        us.forEach((u, index) => {
          const slope = ratioSlopeAt(ratio, u);
          assert.ok(slopes.low - slack <= slope && slope <= slopes.high + slack, `slope ${slope} in ${JSON.stringify(slopes)}`);
          const before = us[index - 1];
          if (before === undefined) return;
          const rise = slope - ratioSlopeAt(ratio, before);
          const rounding =
            1e-9 * (Math.abs(bends.low) + Math.abs(bends.high)) * (u - before) + 1e-12 * (Math.abs(slope) + slack * 1e9);
          assert.ok(rise >= bends.low * (u - before) - rounding && rise <= bends.high * (u - before) + rounding);
        });
      }),
      { seed: 82, numRuns: 1500 },
    );
  });
});

describe('ratioAt', () => {
  it('has its limit at infinity: nothing, or the norm where the degrees are equal', () => {
    assert.equal(ratioAt(sectionRatio(null, singleSection(2)), Infinity), 0);
    assert.equal(ratioAt(sectionRatio(singleSection(0), pairSection({ re: -1, im: 1 })), Infinity), 0);
    assert.equal(ratioAt(sectionRatio(singleSection(1), singleSection(3)), Infinity), 9);
    const pair = sectionRatio(pairSection({ re: 0, im: 4 }), pairSection({ re: -1, im: 1 }));
    assertClose(ratioAt(pair, 1e200), ratioAt(pair, Infinity), 1e-15);
  });
});
