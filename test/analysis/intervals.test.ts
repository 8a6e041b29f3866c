/** Sets of frequencies. */
import assert from 'node:assert/strict';
import { contains, intersection, widthOf, without } from '../../src/analysis/intervals';

describe('intervals', () => {
  it('have in common what lies in both, a single point where they touch', () => {
    assert.deepEqual(intersection([{ low: 0, high: 5 }], [{ low: 3, high: Infinity }]), [{ low: 3, high: 5 }]);
    assert.deepEqual(intersection([{ low: 0, high: 5 }], [{ low: 5, high: 9 }]), [{ low: 5, high: 5 }]);
    assert.deepEqual(intersection([{ low: 0, high: 5 }], [{ low: 6, high: 9 }]), []);
  });

  it('lose a hole and keep no single point at its edges', () => {
    assert.deepEqual(without([{ low: 0, high: Infinity }], [{ low: 2, high: 3 }]), [
      { low: 0, high: 2 },
      { low: 3, high: Infinity },
    ]);
    assert.deepEqual(without([{ low: 2, high: 3 }], [{ low: 2, high: 3 }]), []);
    assert.deepEqual(without([{ low: 3, high: 3 }], [{ low: 2, high: 3 }]), []);
    assert.deepEqual(without([{ low: 4, high: 4 }], [{ low: 2, high: 3 }]), [{ low: 4, high: 4 }]);
    assert.deepEqual(without([{ low: 3, high: 5 }], [{ low: 2, high: 3 }]), [{ low: 3, high: 5 }]);
  });

  it('contain their edges', () => {
    assert.deepEqual([contains([{ low: 1, high: 2 }], 2), contains([{ low: 1, high: 2 }], 2.1)], [true, false]);
  });

  it('are as wide as their parts together', () => {
    assert.equal(
      widthOf([
        { low: 1, high: 2 },
        { low: 5, high: 8 },
      ]),
      4,
    );
  });
});
