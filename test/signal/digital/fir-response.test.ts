/** Gains of given taps against their definition, and the bounds that the search leans on. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { firDelaySamples } from '../../../src/signal/digital/fir-delay';
import { firResponse } from '../../../src/signal/digital/fir-response';
import type { Response } from '../../../src/signal/response';
import { largestOverBands } from '../../../src/signal/search';
import { readDigitalFilters } from '../../reference/digital-filters';
import { assertBoundsEnclose, assertSlopeEncloses } from '../../support/enclosing';
import { assertClose, assertWithin, provedGapDb } from '../../support/tolerance';

const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;
const lowPasses = readDigitalFilters().equiripple.map(({ count, taps, ...rest }) => {
  const all = Array.from({ length: count }, (_, k) => taps[Math.min(k, count - 1 - k)]!);
  return { ...rest, count, taps: all };
});

/** |Σ h_k e^{−j2πkx}| and its phase, straight from the definition. */
function transform(taps: readonly number[], share: number): { readonly size: number; readonly phase: number } {
  let [re, im] = [0, 0];
  taps.forEach((tap, k) => {
    re += tap * Math.cos(2 * Math.PI * k * share);
    im -= tap * Math.sin(2 * Math.PI * k * share);
  });
  return { size: Math.hypot(re, im), phase: Math.atan2(im, re) };
}

const kinds: readonly (readonly [string, readonly number[]])[] = [
  ['symmetric taps, odd in number', [0.1, -0.2, 0.7, -0.2, 0.1]],
  ['symmetric taps, even in number', [-0.1, 0.3, 0.55, 0.55, 0.3, -0.1]],
  ['taps of opposite sign, odd in number', [0.3, 0.8, 0, -0.8, -0.3]],
  ['taps of opposite sign, even in number', [0.2, -0.7, 0.7, -0.2]],
  ['taps without symmetry', [1, -0.5, 0.3, 0.2]],
  ['one tap', [-0.4]],
];

describe('firResponse', () => {
  for (const [name, taps] of kinds) {
    it(`is the size of the transform of ${name}, at every repetition`, () => {
      const response = firResponse(taps, 100);
      for (const share of [0, 0.03, 0.2, 0.371, 0.5]) {
        for (const f of [100 * share, 100 * (1 - share), 100 * (5 + share), 100 * (6 - share)]) {
          assertWithin(Math.exp(response.logGain(f)), transform(taps, share).size, 1e-13, `at ${f}`);
        }
      }
    });

    it(`encloses the gain and the slope of ${name}`, () => {
      assertBoundsEnclose(firResponse(taps, 10), 1, 61);
      assertSlopeEncloses(firResponse(taps, 10), 1, 62);
    });
  }

  it('has the sum of the taps as its gain at 0 Hz', () => {
    const taps = fc.array(fc.double({ min: -1, max: 1, noNaN: true }), { minLength: 1, maxLength: 40 });
    const property = fc.property(taps, (some) => {
      const sum = some.reduce((total, tap) => total + tap, 0);
      assertWithin(Math.exp(firResponse(some, 1).logGain(0)), Math.abs(sum), 1e-13);
    });
    fc.assert(property, { seed: 63, numRuns: 60 });
  });

  it('encloses the gain of random taps, symmetric and not, over random intervals', () => {
    const lists = fc.array(fc.integer({ min: -100, max: 100 }), { minLength: 2, maxLength: 12 });
    const property = fc.property(lists, fc.boolean(), (some, mirrored) => {
      const taps = some.map((tap) => tap / 100);
      const response = firResponse(mirrored ? [...taps, ...[...taps].reverse()] : taps, 1);
      assertTight(response);
    });
    fc.assert(property, { seed: 64, numRuns: 60 });
  });

  /** On each of 16 intervals: no scanned value outside the bounds, and the upper bound no higher than the scan can explain. */
  function assertTight(response: Response): void {
    for (let part = 0; part < 16; part += 1) {
      const [low, high] = [part / 32, (part + 1) / 32];
      const { low: least, high: most } = response.bounds(low, high);
      const values = Array.from({ length: 401 }, (_, i) => Math.exp(response.logGain(low + ((high - low) * i) / 400)));
      assert.ok(Math.exp(least) <= Math.min(...values) && Math.max(...values) <= Math.exp(most) * (1 + 1e-12));
      assertWithin(Math.exp(most), Math.max(...values), 1e-3);
    }
  }

  for (const { count, taps, edges, deviation, weights, desired } of lowPasses) {
    it(`proves the ripples of the outside design with ${count} taps to be its deviation`, () => {
      const response = firResponse(taps, 1);
      desired.forEach((value, index) => {
        const band = { low: edges[2 * index]!, high: edges[2 * index + 1]! };
        const expected = value + deviation / weights[index]!;
        assertClose(Math.exp(response.bounds(band.low, band.high).high), expected, 1e-7);
        const proved = largestOverBands(response, [band])!;
        assertWithin(toDb(proved.logGain), 20 * Math.log10(expected), provedGapDb);
        assert.ok(proved.gapDb <= provedGapDb && proved.evaluations < 1000, `${proved.evaluations} evaluations`);
      });
    });
  }

  it('refuses no taps, taps that are not finite, and a rate of 0 Hz', () => {
    assert.throws(() => firResponse([], 1), RangeError);
    assert.throws(() => firResponse([1, NaN], 1), RangeError);
    assert.throws(() => firResponse([1], 0), RangeError);
  });
});

describe('firDelaySamples', () => {
  for (const [name, taps] of kinds) {
    it(`is the falling slope of the phase for ${name}`, () => {
      const step = 1e-5;
      for (const share of [0.01, 0.07, 0.21]) {
        let turn = transform(taps, share - step).phase - transform(taps, share + step).phase;
        turn -= 2 * Math.PI * Math.round(turn / (2 * Math.PI));
        assertWithin(firDelaySamples(taps, share), turn / (4 * Math.PI * step), 1e-6, `at ${share}`);
      }
    });
  }
});
