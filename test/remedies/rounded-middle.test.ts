import assert from 'node:assert/strict';
import fc from 'fast-check';
import { roundedMiddle } from '../../src/remedies/rounded-middle';

describe('the rounded middle of a window', () => {
  it('has three figures where that stays well inside, else as many as it takes', () => {
    assert.equal(roundedMiddle({ low: 1e6, high: 1.05e6 }), 1.03e6);
    // 4.12245 .. 4.125: 4.12 lies outside.
    assert.equal(roundedMiddle({ low: 4.12245e6, high: 4.125e6 }), 4.124e6);
  });

  it('is none without two ends', () => {
    assert.equal(roundedMiddle({ low: 20e3, high: Infinity }), null);
    assert.equal(roundedMiddle({ low: 10e6, high: 10e6 }), null);
  });

  it('always lies in its window', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 1e9, noNaN: true }), fc.double({ min: 1e-5, max: 3, noNaN: true }), (low, width) => {
        const high = low * (1 + width);
        const middle = roundedMiddle({ low, high });
        assert.ok(middle !== null && low < middle && middle < high, `${low} .. ${high}: ${String(middle)}`);
      }),
      { seed: 42, numRuns: 300 },
    );
  });
});
