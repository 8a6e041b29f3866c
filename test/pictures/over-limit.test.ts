/** Tests of the parts of a curve above a limit. */
import assert from 'node:assert/strict';
import { overLimit } from '../../src/pictures/over-limit';

const points = { x: [0, 10, 20, 30, 40], y: [-110, -90, -90, -110, -90] };
const all = { low: 0, high: 40 };

describe('over the limit', () => {
  it('cuts each part where the straight pieces cross', () => {
    const [first, second, ...rest] = overLimit(points, () => -100, all);
    assert.deepEqual(first, {
      upper: { x: [5, 10, 20, 25], y: [-100, -90, -90, -100] },
      lower: { x: [5, 10, 20, 25], y: [-100, -100, -100, -100] },
    });
    assert.deepEqual(second?.upper, { x: [35, 40], y: [-100, -90] });
    assert.equal(rest.length, 0);
  });

  it('finds nothing where all is below, or only touches', () => {
    assert.deepEqual(
      overLimit(points, () => -80, all),
      [],
    );
    assert.deepEqual(
      overLimit(points, () => -90, all),
      [],
    );
  });

  it('looks only inside the range', () => {
    assert.deepEqual(
      overLimit(points, () => -100, { low: 10, high: 20 }).map(({ upper }) => upper.x),
      [[10, 20]],
    );
    assert.deepEqual(
      overLimit(points, () => -100, { low: 28, high: 32 }),
      [],
    );
  });

  it('follows a limit that is no level line', () => {
    const [part] = overLimit({ x: [0, 10], y: [0, 0] }, (x) => x - 5, { low: 0, high: 10 });
    assert.deepEqual(part?.upper.x, [0, 5]);
  });
});
