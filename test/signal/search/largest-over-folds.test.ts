/** The proved maximum over folds: against plain samples of every fold, with rates that vary, parts seen twice, and edges that touch. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { butterworth } from '../../../src/signal/families/butterworth';
import { chebyshev } from '../../../src/signal/families/chebyshev';
import { realPole } from '../../../src/signal/families/real-pole';
import { filterResponse } from '../../../src/signal/filter';
import { foldFrequency } from '../../../src/signal/folding';
import { rectangleResponse } from '../../../src/signal/pulses/rectangle';
import type { Enclosure, Response } from '../../../src/signal/response';
import { constantResponse, inverse, product } from '../../../src/signal/response-algebra';
import { largestOverFolds, type FoldQuestion } from '../../../src/signal/search';
import { assertClose, assertWithin, provedGapDb, roundingDb } from '../../support/tolerance';
import { saturating } from './twelve-cases';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;
const exactly = (value: number): Enclosure => ({ low: value, high: value });

const guard = filterResponse(butterworth(4, 14e3));
const question: FoldQuestion = {
  rateHz: exactly(51.2e3),
  outer: guard,
  inner: null,
  bands: [{ low: 5, high: 10e3 }],
  within: [{ low: 40e3, high: 3e6 }],
  firstFold: 0,
  lastFold: Infinity,
  sides: 'both',
};

/** The largest over an even grid of every rung up to a fold, with the rules of the question written out plainly. */
function sampled(asked: FoldQuestion, lastFold: number, points: number, rates: readonly number[]): number {
  let best = -Infinity;
  for (const band of asked.bands) {
    for (let fold = asked.firstFold; fold <= Math.min(lastFold, asked.lastFold); fold += 1) {
      for (let i = 0; i <= points; i += 1) {
        const x = band.low + ((band.high - band.low) * i) / points;
        for (const rate of rates) {
          const candidates = fold === 0 ? [x] : [fold * rate - x, fold * rate + x];
          candidates.forEach((f, side) => {
            if (fold === 0 ? asked.sides === 'lower' : asked.sides === (side === 0 ? 'upper' : 'lower')) return;
            if (asked.within !== null && !asked.within.some((range) => range.low <= f && f <= range.high)) return;
            best = Math.max(best, asked.outer.logGain(f) + (asked.inner?.logGain(x) ?? 0));
          });
        }
      }
    }
  }
  return best;
}

const outers: readonly Response[] = [
  guard,
  product([rectangleResponse(1 / 51.2e3), filterResponse(realPole(60e3))]),
  product([rectangleResponse(1 / 200e3), filterResponse(chebyshev(5, 100e3, 1, 'ripple'))]),
  filterResponse({
    poles: [
      { re: -400, im: 333e3 },
      { re: -400, im: -333e3 },
      { re: -2e3, im: 0 },
    ],
    zeros: [],
    gainAt: { frequencyHz: 0, gain: 1 },
    turnsHz: null,
  }),
];

describe('largestOverFolds', () => {
  it('settles a low-pass in front of a band in two evaluations: the lowest frequency that lands', () => {
    const extreme = largestOverFolds(question)!;
    assert.equal(extreme.frequencyHz, 41.2e3);
    assert.equal(extreme.landsHz, 10e3);
    assert.equal(extreme.fold, 1);
    assert.equal(extreme.side, 'lower');
    assert.ok(extreme.evaluations <= 2);
    // |H|² of a Butterworth filter in closed form.
    assertWithin(toDb(extreme.logGain), -10 * Math.log10(1 + (41.2 / 14) ** 8), 1e-7);
  });

  it('is never below a sample of any fold, and reached where it says', () => {
    const arbitrary = fc.record({
      outer: fc.constantFrom(...outers),
      rate: fc.double({ min: 20e3, max: 400e3, noNaN: true }),
      edges: fc.tuple(fc.double({ min: 0, max: 0.5, noNaN: true }), fc.double({ min: 0, max: 0.5, noNaN: true })),
      inner: fc.boolean(),
      from: fc.double({ min: 0, max: 600e3, noNaN: true }),
      width: fc.oneof(fc.constant(Infinity), fc.double({ min: 1e3, max: 600e3, noNaN: true })),
      firstFold: fc.integer({ min: 0, max: 3 }),
      lastFold: fc.oneof(fc.constant(Infinity), fc.integer({ min: 3, max: 9 })),
      sides: fc.constantFrom('both', 'upper', 'lower'),
    });
    fc.assert(
      fc.property(arbitrary, ({ outer, rate, edges, inner, from, width, firstFold, lastFold, sides }) => {
        const asked: FoldQuestion = {
          rateHz: exactly(rate),
          outer,
          inner: inner ? inverse(filterResponse(butterworth(2, 90e3))) : null,
          bands: [{ low: Math.min(...edges) * rate, high: Math.max(...edges) * rate }],
          within: [{ low: from, high: from + width }],
          firstFold,
          lastFold,
          sides,
        };
        const extreme = largestOverFolds(asked);
        const best = sampled(asked, 30, 60, [rate]);
        if (extreme === null) {
          assert.equal(best, -Infinity);
          return;
        }
        assert.ok(toDb(best) <= toDb(extreme.logGain) + roundingDb, `${toDb(best)} above ${toDb(extreme.logGain)}`);
        assert.ok(extreme.gapDb <= provedGapDb);
        assert.ok(extreme.frequencyHz >= from * (1 - 1e-12) && extreme.frequencyHz <= (from + width) * (1 + 1e-12));
        assertWithin(foldFrequency(extreme.frequencyHz, rate).landsHz, extreme.landsHz, 1e-9 * (extreme.frequencyHz + rate));
        const there = outer.logGain(extreme.frequencyHz) + (asked.inner?.logGain(extreme.landsHz) ?? 0);
        assertWithin(toDb(there), toDb(extreme.logGain), provedGapDb + 1e-6);
      }),
      { seed: 71, numRuns: 150 },
    );
  });

  it('lets every rate of an interval fold', () => {
    const asked = { ...question, rateHz: { low: 50e3, high: 52e3 } };
    const extreme = largestOverFolds(asked)!;
    assert.equal(extreme.frequencyHz, 40e3);
    assert.equal(extreme.landsHz, 10e3);
    const rates = Array.from({ length: 21 }, (_, index) => 50e3 + 100 * index);
    for (const outer of outers) {
      const proved = largestOverFolds({ ...asked, outer })!;
      assert.ok(toDb(sampled({ ...asked, outer }, 60, 40, rates)) <= toDb(proved.logGain) + roundingDb);
      assert.ok(proved.gapDb <= provedGapDb);
    }
  });

  it('finds a tone only where it lands in the band', () => {
    const tone = (f: number): FoldQuestion => ({ ...question, within: [exactly(f)] });
    // 310 = 6·51.2 + 2.8 lands; 330 = 6·51.2 + 22.8 does not.
    const landing = largestOverFolds(tone(310e3))!;
    assert.deepEqual([landing.frequencyHz, landing.fold, landing.side], [310e3, 6, 'upper']);
    assertWithin(landing.landsHz, 2.8e3, 1e-9);
    assert.equal(landing.logGain, guard.logGain(310e3));
    assert.equal(largestOverFolds(tone(330e3)), null);
  });

  it('finds a tone that lands exactly on an edge, though decimals do not divide', () => {
    // 3·61.44 − 14.32 = 170, all MHz; in double precision neither is exact.
    const edge = { ...question, rateHz: exactly(61.44e6), bands: [{ low: 14.32e6, high: 15e6 }], within: [exactly(170e6)] };
    assert.equal(largestOverFolds(edge)!.fold, 3);
    const tenths = { ...question, rateHz: exactly(0.1), bands: [{ low: 0.02, high: 0.03 }], within: [exactly(0.73)] };
    assertWithin(largestOverFolds(tenths)!.landsHz, 0.03, 1e-12);
  });

  it('does not count neighbours at fold 0 that only touch, but does count what reaches in', () => {
    const outside = { ...question, within: [{ low: 10e3, high: 30e3 }], lastFold: 0 };
    assert.equal(largestOverFolds(outside), null);
    const reaching = largestOverFolds({ ...outside, within: [{ low: 9e3, high: 30e3 }] })!;
    assert.deepEqual([reaching.frequencyHz, reaching.fold, reaching.landsHz], [9e3, 0, 9e3]);
  });

  it('counts a source that touches a landing range of a higher fold', () => {
    const touching = largestOverFolds({ ...question, within: [{ low: 30e3, high: 41.2e3 }] })!;
    assert.equal(touching.frequencyHz, 41.2e3);
  });

  it('proves the images of a hold against the wanted tone itself', () => {
    // Closed form: sinc((fs − x)/fs)/sinc(x/fs) = x/(fs − x), largest at the top of the band: 20/28.
    const hold = rectangleResponse(1 / 48e3);
    const images = largestOverFolds({
      ...question,
      rateHz: exactly(48e3),
      outer: hold,
      inner: inverse(hold),
      bands: [{ low: 0, high: 20e3 }],
      within: null,
      firstFold: 1,
    })!;
    assertClose(Math.exp(images.logGain), 20 / 28, 1e-7);
    assert.deepEqual([images.frequencyHz, images.landsHz, images.fold, images.side], [28e3, 20e3, 1, 'lower']);
  });

  it('says where a supremum is only approached at infinity, and where a flat path reaches it at once', () => {
    const flat = largestOverFolds({ ...question, outer: constantResponse(-2), within: null, firstFold: 1 })!;
    assert.equal(flat.logGain, -2);
    assert.equal(flat.frequencyHz, 41.2e3);
    const rising = largestOverFolds({
      ...question,
      outer: saturating(filterResponse(realPole(14e3))),
      within: null,
      firstFold: 1,
    })!;
    assertWithin(rising.logGain, 0, 1e-12);
    assert.deepEqual([rising.frequencyHz, rising.fold, rising.gapDb], [Infinity, Infinity, 0]);
  });

  it('scales: at c times every frequency the same answer at c times the frequency', () => {
    const at = (c: number): FoldQuestion => ({
      ...question,
      rateHz: exactly(51.2e3 * c),
      outer: product([filterResponse(chebyshev(3, 30e3 * c, 1, 'ripple')), rectangleResponse(1e-5 / c)]),
      bands: [{ low: 5e3 * c, high: 20e3 * c }],
      within: [{ low: 33e3 * c, high: Infinity }],
    });
    const here = largestOverFolds(at(1))!;
    for (const c of [1e-6, 3, 1e6]) {
      const there = largestOverFolds(at(c))!;
      assertWithin(toDb(there.logGain), toDb(here.logGain), provedGapDb);
      assertClose(there.frequencyHz, here.frequencyHz * c, 1e-3);
      assert.equal(there.fold, here.fold);
    }
  });

  it('has no answer without bands, and refuses a rate of 0 and an inner gain at an inexact rate', () => {
    assert.equal(largestOverFolds({ ...question, bands: [] }), null);
    assert.throws(() => largestOverFolds({ ...question, rateHz: exactly(0) }), RangeError);
    assert.throws(() => largestOverFolds({ ...question, rateHz: { low: 1, high: 2 }, inner: guard }), RangeError);
  });
});
