/** Proved maxima of filters with zeros on the axis, up to infinity, by their sections alone and by their turning points. */
import assert from 'node:assert/strict';
import { elliptic } from '../../../src/signal/families/elliptic';
import { inverseChebyshev } from '../../../src/signal/families/inverse-chebyshev';
import { realPole } from '../../../src/signal/families/real-pole';
import { secondOrder } from '../../../src/signal/families/second-order';
import { filterResponse, type Filter } from '../../../src/signal/filter';
import { rectangleResponse } from '../../../src/signal/pulses/rectangle';
import { inverse, product } from '../../../src/signal/response-algebra';
import type { Response } from '../../../src/signal/response';
import { stretched } from '../../../src/signal/stretched';
import { largestOverBands, largestOverFolds, type FoldQuestion } from '../../../src/signal/search';
import { assertWithin, provedGapDb, roundingDb } from '../../support/tolerance';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;

/** The gap that the search over factors leaves. */
const factorGapDb = 1e-5;

/** What an alias search may cost. */
const evaluationLimit = 500;

const filters: readonly (readonly [string, Filter])[] = [
  ['an elliptic filter of order 4', elliptic(4, 1000, 0.5, 60, 'ripple')],
  ['an elliptic filter of order 5', elliptic(5, 1000, 0.1, 40, 'ripple')],
  ['an elliptic filter of order 12', elliptic(12, 1000, 1, 80, 'ripple')],
  ['an elliptic filter of order 20', elliptic(20, 1000, 0.1, 90, 'ripple')],
  ['an inverse Chebyshev filter of order 6', inverseChebyshev(6, 1000, 70, 'stopband')],
  ['an inverse Chebyshev filter of order 19', inverseChebyshev(19, 1000, 70, 'stopband')],
];

function responsesOf(filter: Filter): readonly Response[] {
  return [filterResponse(filter), filterResponse({ ...filter, turnsHz: null })];
}

function sampled(response: Response, from: number, to: number): number {
  let best = -Infinity;
  for (let i = 0; i <= 20_000; i += 1) best = Math.max(best, response.logGain(from * (to / from) ** (i / 20_000)));
  return best;
}

function foldsOf(outer: Response, rate: number, band: { low: number; high: number }): FoldQuestion {
  return {
    rateHz: { low: rate, high: rate },
    outer,
    inner: null,
    bands: [band],
    within: null,
    firstFold: 1,
    lastFold: Infinity,
    sides: 'both',
  };
}

describe('proved maxima over zeros on the axis', () => {
  for (const [name, filter] of filters) {
    it(`are the attenuation from behind the first zero to infinity, within 500 evaluations: ${name}`, () => {
      const [firstZero] = filter.zeros
        .map(({ im }) => im)
        .filter((im) => im > 0)
        .sort((one, other) => one - other);
      const lobes = filter.poles.length > 3;
      assert.ok(firstZero !== undefined && lobes);
      for (const response of responsesOf(filter)) {
        const extreme = largestOverBands(response, [{ low: firstZero, high: Infinity }])!;
        assert.ok(extreme.evaluations <= evaluationLimit, `${extreme.evaluations} evaluations`);
        assert.ok(extreme.gapDb <= provedGapDb);
        assert.ok(toDb(sampled(response, firstZero, 1e6)) <= toDb(extreme.logGain) + roundingDb);
        assertWithin(toDb(response.logGain(extreme.frequencyHz)), toDb(extreme.logGain), provedGapDb);
      }
    });

    it(`hold in every fold to infinity, within 500 evaluations: ${name}`, () => {
      for (const response of responsesOf(filter)) {
        for (const outer of [
          response,
          product([response, rectangleResponse(1 / 40e3)]),
          product([response, filterResponse(realPole(3000))]),
        ]) {
          const extreme = largestOverFolds(foldsOf(outer, 3200, { low: 0, high: 900 }))!;
          assert.ok(extreme.evaluations <= evaluationLimit, `${extreme.evaluations} evaluations`);
          assert.ok(extreme.gapDb <= provedGapDb);
          for (let fold = 1; fold <= 40; fold += 1) {
            for (let i = 0; i <= 50; i += 1) {
              for (const side of [1, -1]) {
                const gain = outer.logGain(fold * 3200 + side * i * 18);
                assert.ok(toDb(gain) <= toDb(extreme.logGain) + roundingDb);
              }
            }
          }
        }
      }
    });

    it(`find the smallest gain of the passband as the largest of the inverse: ${name}`, () => {
      for (const response of responsesOf(filter)) {
        const extreme = largestOverBands(inverse(response), [{ low: 0, high: 600 }])!;
        assert.ok(extreme.evaluations <= evaluationLimit, `${extreme.evaluations} evaluations`);
        assertWithin(toDb(response.logGain(extreme.frequencyHz)), -toDb(extreme.logGain), provedGapDb);
      }
    });
  }

  it('are reached at infinity where an even order rises to its attenuation there', () => {
    // Behind the last zero of an even order the gain rises to the attenuation and stays there.
    const filter = elliptic(4, 1000, 0.5, 60, 'ripple');
    for (const response of responsesOf(filter)) {
      const lastZero = Math.max(...filter.zeros.map(({ im }) => im));
      const extreme = largestOverBands(response, [{ low: lastZero, high: Infinity }])!;
      assert.equal(extreme.frequencyHz, Infinity);
      assertWithin(toDb(extreme.logGain), -60, provedGapDb);
      const folds = largestOverFolds(foldsOf(response, 4 * lastZero, { low: 0, high: 100 }))!;
      assert.equal(folds.frequencyHz, Infinity);
      assertWithin(toDb(folds.logGain), -60, provedGapDb);
    }
  });

  it('find a far lobe that beats the first fold', () => {
    // The first fold falls beside a zero; the next lobes reach the attenuation.
    const filter = elliptic(6, 1000, 0.1, 60, 'ripple');
    const [zero] = filter.zeros
      .map(({ im }) => im)
      .filter((im) => im > 0)
      .sort((one, other) => one - other);
    assert.ok(zero !== undefined);
    for (const response of responsesOf(filter)) {
      const rate = zero + 2;
      const extreme = largestOverFolds(foldsOf(response, rate, { low: 0, high: 4 }))!;
      assert.ok(extreme.fold > 1);
      assert.ok(toDb(extreme.logGain) > toDb(response.logGain(rate)) + 10);
      assert.ok(extreme.evaluations <= evaluationLimit);
    }
  });

  it('stand beside the notch of a section, not in it', () => {
    for (const response of responsesOf(secondOrder('notch', 1000, 10))) {
      const extreme = largestOverBands(response, [{ low: 990, high: 1020 }])!;
      assert.equal(extreme.frequencyHz, 1020);
      assert.ok(extreme.evaluations <= evaluationLimit);
    }
  });

  it('find the corner of a tolerance at which a lobe is worst, between its ends', () => {
    // The peak of the last lobe stands between the frequencies that both ends of ± 5 % make of it.
    const filter = elliptic(8, 1000, 0.1, 70, 'ripple');
    const peak = (filter.turnsHz ?? []).findLast((_, index, turns) => (turns.length - index) % 2 === 0) ?? NaN;
    for (const response of responsesOf(filter)) {
      const worst = stretched(response, { low: 0.95, high: 1.05 }, 'largest');
      for (const frequency of [peak, peak * 0.98, peak * 1.03, 1020, 1300]) {
        let most = -Infinity;
        for (let i = 0; i <= 2000; i += 1) most = Math.max(most, response.logGain(frequency / (0.95 + (0.1 * i) / 2000)));
        const found = worst.logGain(frequency);
        assert.ok(toDb(found) >= toDb(most) - factorGapDb);
        assertWithin(toDb(found), toDb(most), provedGapDb);
        assertWithin(response.logGain(frequency / worst.factorAt(frequency)), found, 1e-9);
      }
      assert.ok(toDb(worst.logGain(peak)) > toDb(Math.max(response.logGain(peak / 0.95), response.logGain(peak / 1.05))));
    }
  });
});
