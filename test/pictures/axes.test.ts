/** Tests of the choice of axes. */
import assert from 'node:assert/strict';
import { frequencyAxis, levelAxis } from '../../src/pictures/axes';

describe('axes', () => {
  it('are logarithmic where the ends lie far apart, linear where they do not', () => {
    assert.equal(frequencyAxis('Hz', 5, 3e6).scale, 'log');
    assert.equal(frequencyAxis('Hz', 65e6, 75e6).scale, 'linear');
  });

  it('begin at a band that lies high, and at 0 Hz under one that does not', () => {
    assert.equal(frequencyAxis('Hz', 65e6, 75e6).lowHz, 65e6);
    assert.equal(frequencyAxis('Hz', 5, 3e6).lowHz, 0);
  });

  it('can be drawn whatever they are given', () => {
    for (const [low, high] of [
      [0, 0],
      [0, Infinity],
      [5, 5],
      [NaN, 1e3],
    ] as const) {
      const axis = frequencyAxis('Hz', low, high);
      assert.ok(axis.logLowHz > 0 && axis.logLowHz < axis.highHz && axis.lowHz < axis.highHz, `${low} ${high}`);
    }
  });

  it('reach well below what matters and leave room above full scale', () => {
    assert.deepEqual([levelAxis(-3, 1.5, [-96, null, -102]).low, levelAxis(-3, 1.5, [-96]).high], [-140, 0]);
    assert.deepEqual([levelAxis(0, 1.5, [-96]).high, levelAxis(-2, 8, [-96]).high], [10, 10]);
    assert.deepEqual([levelAxis(0, 1, [-Infinity, null]).low, levelAxis(-90, 1, []).high], [-60, -20]);
  });
});
