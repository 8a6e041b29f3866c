/** Pieces that fold onto a band, against folding every frequency. */
import assert from 'node:assert/strict';
import { gridPieces } from '../../../src/signal/converter/grid-pieces';
import { foldFrequency } from '../../../src/signal/folding';

describe('gridPieces', () => {
  it('are what folds onto the band and nothing else, for even and odd ratios', () => {
    for (const by of [1, 2, 3, 4, 7]) {
      const pieces = gridPieces(1.2, 3.7, 10 * by, by);
      for (let f = 0; f <= 5 * by; f += 0.0703) {
        const lands = foldFrequency(f, 10).landsHz;
        const inside = pieces.some(({ low, high }) => f >= low && f <= high);
        assert.equal(inside, lands >= 1.2 && lands <= 3.7, `${f} by ${by}`);
      }
    }
  });
});
