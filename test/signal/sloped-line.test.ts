/** A mask's slope as a response. */
import assert from 'node:assert/strict';
import { slopedLine } from '../../src/signal/sloped-line';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertWithin } from '../support/tolerance';

describe('a sloped line', () => {
  const linear = slopedLine({ lowHz: 0, highHz: 400, fromLog: -1, toLog: -3, along: 'linear' });
  const log = slopedLine({ lowHz: 100, highHz: 10_000, fromLog: 0.5, toLog: -3.5, along: 'log' });

  it('is straight over frequency or over its logarithm, and stays at its ends', () => {
    assert.deepEqual(
      [0, 100, 200, 400, 900].map((f) => linear.logGain(f)),
      [-1, -1.5, -2, -3, -3],
    );
    for (const [f, expected] of [
      [10, 0.5],
      [100, 0.5],
      [1000, -1.5],
      [10_000, -3.5],
      [Infinity, -3.5],
    ] as const) {
      assertWithin(log.logGain(f), expected, 1e-12);
    }
  });

  it('has bounds and slopes that enclose it, rising or falling', () => {
    const rising = slopedLine({ lowHz: 50, highHz: 5000, fromLog: -4, toLog: 0, along: 'log' });
    [linear, log, rising].forEach((line, index) => {
      assertBoundsEnclose(line, 100, 20 + index);
      assertSlopeEncloses(line, 100, 30 + index);
    });
  });

  it('needs room to slope in, and along the logarithm a start above 0 Hz', () => {
    const line = { fromLog: 0, toLog: 1 };
    assert.throws(() => slopedLine({ ...line, lowHz: 0, highHz: 10, along: 'log' }), RangeError);
    assert.throws(() => slopedLine({ ...line, lowHz: 10, highHz: 10, along: 'linear' }), RangeError);
    assert.throws(() => slopedLine({ ...line, lowHz: 10, highHz: Infinity, along: 'linear' }), RangeError);
  });
});
