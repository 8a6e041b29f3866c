/** Tests of reading a curve between its points. */
import assert from 'node:assert/strict';
import { firstNotBelow, levelAt } from '../../src/drawing/level-at';

const points = { x: [10, 20, 40], y: [0, -10, -50] };

describe('level at a frequency', () => {
  it('gives the points themselves and straight lines between them', () => {
    assert.deepEqual(
      [10, 15, 20, 30, 40].map((f) => levelAt(points, f)),
      [0, -5, -10, -30, -50],
    );
  });

  it('stays level beyond the ends', () => {
    assert.deepEqual([levelAt(points, 1), levelAt(points, 100)], [0, -50]);
  });

  it('takes the upper side of a step', () => {
    assert.equal(levelAt({ x: [0, 1, 1, 2], y: [0, 0, 5, 5] }, 1.5), 5);
  });

  it('finds the first value that is not below, or the length', () => {
    assert.deepEqual(
      [5, 10, 11, 41].map((f) => firstNotBelow(points.x, f)),
      [0, 0, 1, 3],
    );
  });
});
