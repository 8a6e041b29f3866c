/** Integrators and combs against outside tables and a plain running mean. */
import assert from 'node:assert/strict';
import { cicDelaySamples, cicGrowthBits, cicResponse } from '../../../src/signal/digital/cic';
import { largestOverBands } from '../../../src/signal/search';
import { readDigitalFilters } from '../../reference/digital-filters';
import { assertBoundsEnclose, assertSlopeEncloses } from '../../support/enclosing';
import { assertWithin, provedGapDb } from '../../support/tolerance';

const vectors = readDigitalFilters();
const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;

/** |H| of N running means of K samples at a share of the rate, from the taps themselves. */
function runningMean(length: number, stages: number, share: number): number {
  let [re, im] = [0, 0];
  for (let k = 0; k < length; k += 1) {
    re += Math.cos(2 * Math.PI * k * share) / length;
    im += Math.sin(2 * Math.PI * k * share) / length;
  }
  return Math.hypot(re, im) ** stages;
}

describe('cicResponse', () => {
  for (const { by, delay, stages, rows } of vectors.cic) {
    it(`has the droop and the alias attenuation of the outside table for R = ${by}, M = ${delay}, N = ${stages}`, () => {
      const response = cicResponse({ stages, delay, by }, by);
      for (const [share, droopDb, aliasDb] of rows) {
        assertWithin(-toDb(response.logGain(share)), droopDb, 1e-9, `droop at ${share}`);
        assertWithin(-toDb(response.logGain(1 - share)), aliasDb, 1e-9, `alias at ${share}`);
      }
    });
  }

  it('comes to the tables for long filters, whose digits are those of Hogenauer (1981)', () => {
    const by = 2 ** 24;
    for (let stages = 1; stages <= 6; stages += 1) {
      for (const [share, ...droop] of vectors.longCicDroop) {
        assertWithin(-toDb(cicResponse({ stages, delay: 1, by }, by).logGain(share!)), droop[stages - 1]!, 1e-8);
      }
      for (const [delay, share, ...alias] of vectors.longCicAlias) {
        assertWithin(-toDb(cicResponse({ stages, delay: delay!, by }, by).logGain(1 - share!)), alias[stages - 1]!, 1e-6);
      }
    }
  });

  for (const length of [1, 2, 3, 8, 25]) {
    it(`is the running mean of ${length} samples, at every repetition`, () => {
      const response = cicResponse({ stages: 3, delay: 1, by: length }, 100);
      for (const share of [0, 0.011, 0.17, 0.3, 0.47, 0.5]) {
        for (const whole of [0, 1, 7]) {
          for (const f of [100 * (whole + share), 100 * (whole + 1 - share)]) {
            assertWithin(Math.exp(response.logGain(f)), runningMean(length, 3, share), 1e-13, `at ${f}`);
          }
        }
      }
    });
  }

  it('has exact nulls at the multiples of rate/(RM), and a gain of 1 at those of the rate', () => {
    for (const rate of [48e3, 61.44e6, 0.1]) {
      const response = cicResponse({ stages: 4, delay: 2, by: 12 }, rate);
      for (const k of [1, 2, 11, 12, 23, 25, 35, 240 * 7 + 5]) assert.equal(response.logGain((k * rate) / 24), -Infinity);
      for (const k of [0, 1, 3, 1000]) assertWithin(response.logGain(k * rate), 0, 1e-20);
    }
  });

  it('encloses its gain and its slope over any interval', () => {
    for (const [length, stages] of [
      [1, 2],
      [2, 1],
      [7, 3],
      [16, 2],
    ] as const) {
      const response = cicResponse({ stages, delay: 1, by: length }, 10);
      assertBoundsEnclose(response, 1, 71);
      assertSlopeEncloses(response, 1, 72);
    }
  });

  it('is proved over its side lobes: the highest is where a plain scan finds it', () => {
    const response = cicResponse({ stages: 3, delay: 1, by: 10 }, 10);
    const proved = largestOverBands(response, [{ low: 1, high: 9 }])!;
    let scanned = 0;
    for (let i = 0; i <= 20_000; i += 1) scanned = Math.max(scanned, runningMean(10, 3, 0.1 + (0.8 * i) / 20_000));
    assertWithin(toDb(proved.logGain), 20 * Math.log10(scanned), provedGapDb);
    assert.ok(proved.gapDb <= provedGapDb);
  });

  it('is bounded by 0 dB towards infinity, where it repeats for ever', () => {
    const response = cicResponse({ stages: 2, delay: 1, by: 4 }, 10);
    assertWithin(response.bounds(12, Infinity).high, 0, 1e-8);
    assert.equal(response.bounds(12, Infinity).low, -Infinity);
    assertWithin(response.logGain(Infinity), 0, 1e-8);
    assert.equal(response.slope(12, Infinity), null);
  });

  it('refuses stages, delays and ratios that are no whole numbers from 1, and a rate of 0 Hz', () => {
    for (const wrong of [0, -1, 1.5, NaN]) {
      assert.throws(() => cicResponse({ stages: wrong, delay: 1, by: 8 }, 1), RangeError);
      assert.throws(() => cicResponse({ stages: 1, delay: wrong, by: 8 }, 1), RangeError);
      assert.throws(() => cicResponse({ stages: 1, delay: 1, by: wrong }, 1), RangeError);
    }
    assert.throws(() => cicResponse({ stages: 1, delay: 1, by: 2e9 }, 1), RangeError);
    assert.throws(() => cicResponse({ stages: 1, delay: 1, by: 8 }, 0), RangeError);
  });
});

describe('cicGrowthBits', () => {
  for (const { by, delay, stages, growthBits } of vectors.cic) {
    it(`is ${growthBits} for R = ${by}, M = ${delay}, N = ${stages}`, () => {
      assert.equal(cicGrowthBits({ by, delay, stages }), growthBits);
    });
  }
});

describe('cicDelaySamples', () => {
  it('is half the length of its impulse response less one', () => {
    // N means of K samples in a row have N(K − 1) + 1 taps.
    assert.equal(cicDelaySamples({ stages: 3, delay: 2, by: 8 }), 22.5);
    assert.equal(cicDelaySamples({ stages: 5, delay: 1, by: 1 }), 0);
  });
});
