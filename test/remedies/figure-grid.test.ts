import assert from 'node:assert/strict';
import fc from 'fast-check';
import { fromGrid, roundedTowards, toGrid } from '../../src/remedies/figure-grid';

describe('the grid of four figures', () => {
  it('counts every number of four figures, without gaps between decades', () => {
    assert.equal(fromGrid(toGrid(12180)), 12180);
    assert.equal(fromGrid(toGrid(9999) + 1), 10000);
    assert.equal(fromGrid(toGrid(10000) - 1), 9999);
    assert.equal(fromGrid(toGrid(0.01234)), 0.01234);
  });

  it('gives back each of its values exactly', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1000, max: 9999 }), fc.integer({ min: -9, max: 9 }), (mantissa, exponent) => {
        const hz = Number(`${mantissa}e${exponent}`);
        assert.equal(fromGrid(toGrid(hz)), hz);
      }),
      { seed: 1 },
    );
  });

  it('rounds to fewer figures, never back across the value', () => {
    assert.equal(fromGrid(roundedTowards(toGrid(12180), -1, 2)), 12000);
    assert.equal(fromGrid(roundedTowards(toGrid(12180), -1, 3)), 12100);
    assert.equal(fromGrid(roundedTowards(toGrid(12730), 1, 2)), 13000);
    assert.equal(fromGrid(roundedTowards(toGrid(9951), 1, 2)), 10000);
    assert.equal(fromGrid(roundedTowards(toGrid(12000), 1, 2)), 12000);
  });
});
