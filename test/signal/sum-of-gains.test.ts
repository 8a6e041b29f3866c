/** Gains that are added, and the largest of several. */
import assert from 'node:assert/strict';
import { rectangleResponse } from '../../src/signal/pulses/rectangle';
import { constantResponse, largestOf } from '../../src/signal/response-algebra';
import { slopedLine } from '../../src/signal/sloped-line';
import { fromRange, sumOfGains } from '../../src/signal/sum-of-gains';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertWithin } from '../support/tolerance';

const falling = slopedLine({ lowHz: 10, highHz: 1e5, fromLog: 1, toLog: -5, along: 'log' });
const rising = slopedLine({ lowHz: 0, highHz: 5e4, fromLog: -3, toLog: 2, along: 'linear' });
const lobes = rectangleResponse(1e-3);

describe('a sum of gains', () => {
  it('adds them, not their logarithms', () => {
    const sum = sumOfGains([constantResponse(0), constantResponse(Math.log(2)), constantResponse(-Infinity)]);
    assertWithin(sum.logGain(7), Math.log(3), 1e-15);
    assert.equal(sumOfGains([constantResponse(-Infinity), constantResponse(-Infinity)]).logGain(7), -Infinity);
    assert.equal(sumOfGains([falling]), falling);
  });

  it('has bounds and slopes that enclose it', () => {
    const sum = sumOfGains([falling, rising, lobes]);
    assertBoundsEnclose(sum, 1000, 41);
    assertSlopeEncloses(sumOfGains([falling, rising]), 1000, 42);
    assertSlopeEncloses(sum, 1000, 43);
  });

  it('has no slope where a part has none', () => {
    const bare = fromRange(
      (f) => 1 + f,
      (low, high) => ({ low: 1 + low, high: 1 + high }),
    );
    assert.equal(sumOfGains([falling, bare]).slope(10, 20), null);
    assertWithin(bare.logGain(1), Math.LN2, 1e-15);
    assert.deepEqual(bare.bounds(0, 0), { low: 0, high: 0 });
  });

  it('of what is not above nothing is nothing', () => {
    const below = fromRange(
      () => -1,
      () => ({ low: -2, high: -1 }),
    );
    assert.equal(below.logGain(5), -Infinity);
    assert.deepEqual(below.bounds(1, 2), { low: -Infinity, high: -Infinity });
  });
});

describe('the largest of several gains', () => {
  const largest = largestOf([falling, rising, lobes]);

  it('is the largest at each frequency', () => {
    for (const f of [0, 100, 1e4, 4e4]) {
      assert.equal(largest.logGain(f), Math.max(falling.logGain(f), rising.logGain(f), lobes.logGain(f)));
    }
  });

  it('has bounds and slopes that enclose it', () => {
    assertBoundsEnclose(largest, 1000, 44);
    assertSlopeEncloses(largest, 1000, 45);
    assert.equal(largestOf([falling, lobes]).slope(500, 1500), null);
  });
});
