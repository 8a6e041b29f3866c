/** The envelope as a response: straight over log frequency, with bounds and slopes that hold everywhere. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { envelopeResponse } from '../../src/signal/envelope';
import { RangeExtremes } from '../../src/signal/range-extremes';
import { largestOverBands } from '../../src/signal/search';

const tables = fc.array(
  fc.record({ step: fc.double({ min: 1.0001, max: 20, noNaN: true }), gain: fc.double({ min: -20, max: 20, noNaN: true }) }),
  {
    minLength: 1,
    maxLength: 12,
  },
);

function tableOf(steps: readonly { readonly step: number; readonly gain: number }[]) {
  let hz = 10;
  const frequenciesHz = steps.map(({ step }) => (hz *= step));
  return { frequenciesHz, gains: steps.map(({ gain }) => gain) };
}

describe('an envelope', () => {
  const envelope = envelopeResponse([100, 1000, 10_000], [0, -2, 1]);

  it('is straight over the logarithm of frequency, and stays at its ends', () => {
    assert.equal(envelope.logGain(1000), -2);
    assert.ok(Math.abs(envelope.logGain(100 * Math.sqrt(10)) + 1) < 1e-12);
    assert.deepEqual(
      [0, 50, 100, 20_000, Infinity].map((hz) => envelope.logGain(hz)),
      [0, 0, 0, 1, 1],
    );
  });

  it('turns where its lines turn between falling and rising', () => {
    assert.deepEqual(envelope.turnsHz, [1000]);
    assert.deepEqual(envelopeResponse([1, 2, 3, 4, 5], [0, 1, 1, 2, 1]).turnsHz, [4]);
    assert.deepEqual(envelopeResponse([1, 2, 3, 4], [0, 1, 1, 0]).turnsHz, [3]);
  });

  it('has bounds and slopes that hold at every frequency of an interval', () => {
    const cases = fc.tuple(tables, fc.double({ min: 1, max: 1e6, noNaN: true }), fc.double({ min: 1, max: 100, noNaN: true }));
    fc.assert(
      fc.property(cases, ([steps, low, ratio]) => {
        const { frequenciesHz, gains } = tableOf(steps);
        const response = envelopeResponse(frequenciesHz, gains);
        const high = low * ratio;
        const bounds = response.bounds(low, high);
        const slope = response.slope(low, high);
        assert.ok(slope);
        const points = Array.from({ length: 41 }, (_, index) => low * ratio ** (index / 40));
        for (const [index, hz] of points.entries()) {
          const value = response.logGain(hz);
          assert.ok(bounds.low - 1e-9 <= value && value <= bounds.high + 1e-9);
          const next = points[index + 1];
          if (next === undefined || next <= hz) continue;
          const rise = response.logGain(next) - value;
          assert.ok(rise >= slope.low * (next - hz) - 1e-9 && rise <= slope.high * (next - hz) + 1e-9);
        }
      }),
      { seed: 5, numRuns: 300 },
    );
  });

  it('has its largest value at a point of it, which a search finds', () => {
    fc.assert(
      fc.property(tables, (steps) => {
        const { frequenciesHz, gains } = tableOf(steps);
        const found = largestOverBands(envelopeResponse(frequenciesHz, gains), [{ low: 1, high: 1e20 }]);
        assert.equal(found?.logGain, Math.max(...gains));
      }),
      { seed: 6, numRuns: 100 },
    );
  });

  it('refuses frequencies that do not rise, and lists that do not match', () => {
    assert.throws(() => envelopeResponse([2, 1], [0, 0]), RangeError);
    assert.throws(() => envelopeResponse([0, 1], [0, 0]), RangeError);
    assert.throws(() => envelopeResponse([1], []), RangeError);
    assert.throws(() => envelopeResponse([], []), RangeError);
  });
});

describe('the extremes of a run', () => {
  it('are those of looking at each', () => {
    const lists = fc.tuple(fc.array(fc.integer({ min: -50, max: 50 }), { maxLength: 40 }), fc.nat(45), fc.nat(45));
    fc.assert(
      fc.property(lists, ([values, first, end]) => {
        const run = values.slice(first, Math.max(first, end));
        assert.deepEqual(new RangeExtremes(values).between(first, end), { low: Math.min(...run), high: Math.max(...run) });
      }),
      { seed: 8, numRuns: 500 },
    );
  });
});
