/** Track and hold against the Fourier coefficients of its output at 60 digits, the stated formula, and its own bounds. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import {
  trackAndHoldDelay,
  trackAndHoldDelayRange,
  trackAndHoldWeight,
  type TrackAndHold,
} from '../../../src/signal/pulses/track-and-hold';
import { trackAndHoldCopy, trackAndHoldRemainder } from '../../../src/signal/pulses/track-and-hold-copy';
import { largestOverBands } from '../../../src/signal/search';
import { readPulseVectors } from '../../reference/pulse-vectors';
import { assertBoundsEnclose, assertSlopeEncloses } from '../../support/enclosing';
import { assertClose, assertWithin, roundingRelative } from '../../support/tolerance';

const gates = fc.record({
  trackShare: fc.double({ min: 0, max: 1, noNaN: true }),
  periodSeconds: fc.double({ min: -6, max: 2, noNaN: true }).map((x) => 10 ** x),
});
const copies = fc.integer({ min: -40, max: 40 });
const at = (trackShare: number): TrackAndHold => ({ trackShare, periodSeconds: 1 });
const sizeOf = ({ re, im }: { readonly re: number; readonly im: number }): number => Math.hypot(re, im);

describe('track and hold', () => {
  for (const { trackShare, rows, delays } of readPulseVectors().trackAndHold) {
    it(`weighs copies as the output of a tone does, tracking ${trackShare} of the period`, () => {
      assert.equal(rows.length, 90);
      for (const [copy, input, re, im] of rows) {
        const weight = trackAndHoldWeight(at(trackShare), copy, input + copy);
        const size = Math.hypot(re, im);
        assertWithin(weight.re, re, 1e-12 * size + 1e-17, `copy ${copy}, input ${input}`);
        assertWithin(weight.im, im, 1e-12 * size + 1e-17, `copy ${copy}, input ${input}`);
        if (input + copy >= 0 && size > 0) {
          const response = Math.exp(trackAndHoldCopy(at(trackShare), copy).logGain(input + copy));
          assertClose(response, size, roundingRelative, `copy ${copy}, input ${input}`);
        }
      }
    });

    it(`delays the wanted path as the slope of its phase says, tracking ${trackShare} of the period`, () => {
      for (const [f, seconds] of delays) {
        assertWithin(trackAndHoldDelay({ trackShare, periodSeconds: 2e-5 }, f / 2e-5), 2e-5 * seconds, 1e-12 * 2e-5, `at ${f}`);
      }
    });
  }

  // Closed form at 0 Hz: e²·T/2.
  it('delays the wanted path by 0.405, 0.245, 0.125 and 0.005 of the period at 0 Hz', () => {
    for (const [d, delay] of [
      [0.1, 0.405],
      [0.3, 0.245],
      [0.5, 0.125],
      [0.9, 0.005],
    ] as const)
      assertWithin(trackAndHoldDelay(at(d), 0), delay, 1e-12);
  });

  it('is the stated sum of a natural part and a held part, wherever that does not cancel', () => {
    fc.assert(
      fc.property(gates, copies, fc.double({ min: -20, max: 20, noNaN: true }), (gate, k, output) => {
        const { trackShare: d, periodSeconds } = gate;
        const e = 1 - d;
        const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
        const turned = (size: number, turns: number): readonly [number, number] => [
          size * Math.cos(Math.PI * turns),
          -size * Math.sin(Math.PI * turns),
        ];
        const natural = turned(d * sinc(k * d), k * d);
        const held = turned(e * sinc(e * output), e * output + 2 * k * d);
        const weight = trackAndHoldWeight(gate, k, output / periodSeconds);
        assertWithin(weight.re, natural[0] + held[0], 1e-12);
        assertWithin(weight.im, natural[1] + held[1], 1e-12);
        assertWithin(sizeOf(trackAndHoldWeight(gate, -k, -output / periodSeconds)), sizeOf(weight), 1e-12);
      }),
      { seed: 56, numRuns: 400 },
    );
  });

  it('is a natural gate when all of the period is tracked, and a zero-order hold when none is', () => {
    assert.equal(trackAndHoldCopy(at(1), 0).logGain(3.3), 0);
    assert.equal(trackAndHoldCopy(at(1), 2).logGain(3.3), -Infinity);
    for (const f of [0.2, 1.4, 3.3])
      assertClose(Math.exp(trackAndHoldCopy(at(0), 1).logGain(f)), Math.abs(Math.sin(Math.PI * f)) / (Math.PI * f), 1e-14);
  });

  it('lets nothing of a constant input into any copy, though neither rate nor share may be a binary fraction', () => {
    for (const rate of [44.1e3, 61.44e6, 0.1]) {
      for (const k of [1, 2, 3, 10]) {
        for (const d of [0.1, 0.12, 0.5]) {
          const size = sizeOf(trackAndHoldWeight({ trackShare: d, periodSeconds: 1 / rate }, k, k * rate));
          assert.ok(size < 1e-15, `copy ${k}, ${d}: ${size}`);
        }
      }
    }
  });

  it('weighs a copy by f/f_o close to its null, to rounding of the input frequency', () => {
    for (const f of [2 ** -20, 2 ** -33, -(2 ** -33)]) {
      const slope = sizeOf(trackAndHoldWeight(at(0.25), 3, 3 + f)) / Math.abs(f);
      // d·sinc(kd) + e·e^(jπkd) over k, with k·d = 3/4: |1/(3π√2) + 0.75·(−1 + j)/√2|/3.
      const expected = Math.hypot(1 / (3 * Math.PI * Math.SQRT2) - 0.75 / Math.SQRT2, 0.75 / Math.SQRT2) / 3;
      assertClose(slope, expected, 1e-5);
    }
  });

  const responses: readonly (readonly [number, number])[] = [
    [0.1, 0],
    [0.5, 0],
    [0.9, 0],
    [0.1, 1],
    [0.12, 2],
    [0.25, 3],
    [0.5, 1],
    [0.5, 2],
    [0.7, -1],
    [0.3, -3],
    [0.9, 30],
    [1, 0],
    [1, 1],
    [0, 1],
  ];
  responses.forEach(([d, copy], index) => {
    it(`encloses gain and slope over any interval: copy ${copy} with ${d} tracked`, () => {
      assertBoundsEnclose(trackAndHoldCopy(at(d), copy), 1, 200 + index);
      assertSlopeEncloses(trackAndHoldCopy(at(d), copy), 1, 300 + index);
      assertBoundsEnclose(trackAndHoldCopy({ trackShare: d, periodSeconds: 1e-6 }, copy), 1e6, 400 + index);
    });
  });

  it('lets a search prove the largest weight of any copy over a band in few steps', () => {
    for (const [d, copy] of responses) {
      for (const band of [
        { low: 0, high: 0.5 },
        { low: Math.max(0, copy - 0.5), high: Math.max(1, copy + 0.5) },
        { low: 0.3, high: 50 },
      ]) {
        const response = trackAndHoldCopy(at(d), copy);
        const found = largestOverBands(response, [band]);
        assert.ok(found !== null && found.gapDb <= 0.001 && found.evaluations < 200, JSON.stringify([d, copy, band, found]));
        for (let i = 0; i <= 1000; i += 1)
          assert.ok(response.logGain(band.low + ((band.high - band.low) * i) / 1000) <= found.logGain + 1e-12);
      }
    }
  });

  it('has a remainder above every copy from the first on, with bounds and slopes that enclose it', () => {
    fc.assert(
      fc.property(gates, copies, fc.double({ min: -3, max: 3, noNaN: true }), (gate, copy, decade) => {
        if (copy === 0) return;
        const f = 10 ** decade / gate.periodSeconds;
        const bound = trackAndHoldRemainder(gate, Math.max(1, Math.abs(copy) - 2)).logGain(f);
        assert.ok(trackAndHoldCopy(gate, copy).logGain(f) <= bound + 1e-12);
      }),
      { seed: 57, numRuns: 500 },
    );
    assertBoundsEnclose(trackAndHoldRemainder(at(0.3), 4), 1, 58);
    assertSlopeEncloses(trackAndHoldRemainder(at(0.3), 4), 1, 59);
    assert.equal(largestOverBands(trackAndHoldRemainder(at(0.5), 2), [{ low: 0, high: 0.4 }])?.evaluations, 2);
  });

  it('has a delay that lies in its range over any interval', () => {
    fc.assert(
      fc.property(
        gates,
        fc.double({ min: 0, max: 3, noNaN: true }),
        fc.double({ min: 0, max: 1, noNaN: true }),
        (gate, start, share) => {
          // With less than a millionth tracked it is a hold whose delay leaps at its nulls.
          fc.pre(gate.trackShare > 1e-6);
          const low = start / gate.periodSeconds;
          const high = low + 0.05 / gate.periodSeconds;
          const range = trackAndHoldDelayRange(gate, low, high);
          const delay = trackAndHoldDelay(gate, low + share * (high - low));
          assert.ok(range.low <= delay && delay <= range.high);
        },
      ),
      { seed: 60, numRuns: 400 },
    );
  });

  it('refuses a share outside 0 to 1 and a period of nothing', () => {
    assert.throws(() => trackAndHoldCopy(at(1.1), 0), RangeError);
    assert.throws(() => trackAndHoldWeight({ trackShare: 0.5, periodSeconds: 0 }, 0, 0), RangeError);
  });
});
