/** The proved maximum over bands: against plain samples, at ends, in endless bands, and how little work plain cases take. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { butterworth } from '../../../src/signal/families/butterworth';
import { chebyshev } from '../../../src/signal/families/chebyshev';
import { filterResponse } from '../../../src/signal/filter';
import { rectangleResponse } from '../../../src/signal/pulses/rectangle';
import { constantResponse, inverse, product } from '../../../src/signal/response-algebra';
import type { Response } from '../../../src/signal/response';
import { largestOverBands } from '../../../src/signal/search';
import { assertWithin, provedGapDb, roundingDb } from '../../support/tolerance';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;
const hold = rectangleResponse(1 / 48e3);
const low = filterResponse(butterworth(5, 15e3));

const responses: readonly Response[] = [
  product([low, hold]),
  product([filterResponse({ ...chebyshev(6, 12e3, 2, 'ripple'), turnsHz: null }), hold]),
  product([filterResponse(chebyshev(9, 12e3, 0.5, 'ripple')), filterResponse(chebyshev(4, 13e3, 1, 'half-power'))]),
  inverse(product([filterResponse(chebyshev(9, 12e3, 0.5, 'ripple')), rectangleResponse(1 / 200e3)])),
];

function sampled(response: Response, from: number, to: number): number {
  let best = -Infinity;
  for (let i = 0; i <= 3000; i += 1) best = Math.max(best, response.logGain(from + ((to - from) * i) / 3000));
  return best;
}

describe('largestOverBands', () => {
  it('is never below a sample, and reached where it says to within the gap', () => {
    const span = fc.double({ min: 0, max: 40e3, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...responses), span, span, (response, one, other) => {
        const [from, to] = [Math.min(one, other), Math.max(one, other)];
        const extreme = largestOverBands(response, [{ low: from, high: to }])!;
        assert.ok(toDb(sampled(response, from, to)) <= toDb(extreme.logGain) + roundingDb);
        assert.ok(extreme.frequencyHz >= from && extreme.frequencyHz <= to);
        assertWithin(toDb(response.logGain(extreme.frequencyHz)), toDb(extreme.logGain), provedGapDb + roundingDb);
        assert.ok(extreme.gapDb <= provedGapDb);
      }),
      { seed: 61, numRuns: 60 },
    );
  });

  it('takes the best of several bands', () => {
    const extreme = largestOverBands(low, [
      { low: 20e3, high: 30e3 },
      { low: 17e3, high: 18e3 },
      { low: 40e3, high: Infinity },
    ])!;
    assert.equal(extreme.frequencyHz, 17e3);
    assert.equal(extreme.logGain, low.logGain(17e3));
  });

  it('needs three evaluations where the slope has one sign', () => {
    const extreme = largestOverBands(product([low, hold]), [{ low: 1e3, high: 20e3 }])!;
    assert.equal(extreme.evaluations, 3);
    assert.equal(extreme.frequencyHz, 1e3);
    assert.equal(extreme.gapDb, 0);
  });

  it('runs to infinity', () => {
    const extreme = largestOverBands(product([low, hold]), [{ low: 48.5e3, high: Infinity }])!;
    // Behind the null at 48 kHz the side lobe rises against the falling filter; plain samples find the peak of both.
    assertWithin(toDb(extreme.logGain), toDb(sampled(product([low, hold]), 48.5e3, 96e3)), provedGapDb);
    assert.equal(largestOverBands(constantResponse(-1), [{ low: 0, high: Infinity }])!.logGain, -1);
  });

  it('runs from 0 Hz to infinity over any scale of filters', () => {
    for (const corner of [1e-6, 1, 1e12]) {
      const sharp = filterResponse({ ...chebyshev(8, corner, 1, 'ripple'), turnsHz: null });
      const extreme = largestOverBands(sharp, [{ low: 0, high: Infinity }])!;
      assertWithin(toDb(extreme.logGain), 0, provedGapDb);
      assert.ok(extreme.gapDb <= provedGapDb);
    }
  });

  it('scales: at c times every frequency the same gain at c times the frequency', () => {
    for (const c of [1e-3, 7, 1e6]) {
      const one = product([filterResponse(chebyshev(5, 1000, 1, 'ripple')), rectangleResponse(1e-4)]);
      const other = product([filterResponse(chebyshev(5, 1000 * c, 1, 'ripple')), rectangleResponse(1e-4 / c)]);
      const here = largestOverBands(one, [{ low: 100, high: 980 }])!;
      const there = largestOverBands(other, [{ low: 100 * c, high: 980 * c }])!;
      assertWithin(toDb(there.logGain), toDb(here.logGain), provedGapDb);
    }
  });

  it('gives an infinite inverse where a null lies in the band, and says so in few steps', () => {
    const extreme = largestOverBands(inverse(hold), [{ low: 40e3, high: 50e3 }])!;
    assert.equal(extreme.logGain, Infinity);
    assertWithin(extreme.frequencyHz, 48e3, 1);
    assert.ok(extreme.evaluations < 500);
  });

  it('gives −Infinity where there are only nulls, and null where there is no band', () => {
    assert.equal(largestOverBands(hold, [{ low: 48e3, high: 48e3 }])!.logGain, -Infinity);
    assert.equal(largestOverBands(hold, []), null);
  });

  it('takes another gap where one is asked for', () => {
    const rippling = product([filterResponse({ ...chebyshev(9, 12e3, 1, 'ripple'), turnsHz: null }), hold]);
    const coarse = largestOverBands(rippling, [{ low: 5e3, high: 12e3 }], { gapDb: 0.5 })!;
    const fine = largestOverBands(rippling, [{ low: 5e3, high: 12e3 }], { gapDb: 1e-7 })!;
    assert.ok(fine.gapDb <= 1e-7 && coarse.gapDb <= 0.5);
    assert.ok(coarse.evaluations < fine.evaluations);
  });

  it('refuses a band that runs downwards or starts below 0 Hz', () => {
    for (const band of [
      { low: 2, high: 1 },
      { low: -1, high: 1 },
      { low: NaN, high: 1 },
    ]) {
      assert.throws(() => largestOverBands(hold, [band]), RangeError);
    }
  });
});
