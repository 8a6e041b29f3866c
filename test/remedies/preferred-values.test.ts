/** Neighbours in E12 and E24; the members are those of IEC 60063, from memory of the standard's table. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { neighbour, seriesOf } from '../../src/remedies/preferred-values';

const e12 = seriesOf(4700);

describe('preferred values', () => {
  it('are 12 a decade, and 24 where the present value is one of those between', () => {
    assert.deepEqual(e12, [10, 12, 15, 18, 22, 27, 33, 39, 47, 56, 68, 82]);
    assert.deepEqual(
      seriesOf(5.1e-9),
      [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91],
    );
  });

  it('have neighbours above and below, across the ends of a decade', () => {
    assert.deepEqual(
      [-3, -2, -1, 1, 2, 3].map((step) => neighbour(e12, 1000, step)),
      [560, 680, 820, 1200, 1500, 1800],
    );
    assert.equal(neighbour(e12, 8.2e-9, 1), 10e-9);
    assert.equal(neighbour(e12, 4.7e-9, 12), 47e-9);
  });

  it('take a value that is no member to the nearest one on either side', () => {
    assert.equal(neighbour(e12, 5000, 1), 5600);
    assert.equal(neighbour(e12, 5000, -1), 4700);
    // Just under a decade the next one is in the decade above.
    assert.equal(neighbour(e12, 9950, 1), 10e3);
    assert.equal(neighbour(e12, 9950, -1), 8200);
  });

  it('lead back: a step up and a step down from a member is that member', () => {
    fc.assert(
      fc.property(
        fc.constantFrom(...e12),
        fc.integer({ min: -13, max: 6 }),
        fc.integer({ min: 1, max: 30 }),
        (member, exponent, step) => {
          const value = Number(`${member}e${exponent}`);
          assert.equal(neighbour(e12, neighbour(e12, value, step), -step), value);
        },
      ),
      { seed: 41, numRuns: 200 },
    );
  });
});
