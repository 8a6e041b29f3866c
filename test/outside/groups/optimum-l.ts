/** Legendre (optimum-L) filters against their characteristic polynomials and the steepness that they are optimum in. */
import assert from 'node:assert/strict';
import { filterResponse } from '../../../src/signal/filter';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup } from '../group';
import { filterOf } from '../outside-design';

/** L in powers of ω², from the first on; 1 + L is the loss of power. */
const polynomials: Readonly<Record<number, readonly number[]>> = {
  2: [0, 1],
  3: [1, -3, 3],
  4: [0, 3, -8, 6],
  5: [1, -8, 28, -40, 20],
  6: [0, 6, -40, 105, -120, 50],
};

/** dL/dω at the half-power frequency, orders 1 to 8. */
const slopes = [2, 4, 8, 12, 18, 24, 32, 40];

/** The group. */
export const optimumL: OutsideGroup = {
  title: 'Optimum-L polynomials and slopes',
  source: 'A. Papoulis (1958, 1959) after an encyclopaedia article; the polynomials recomputed exactly',
  define: (tally) => {
    it('has the loss of the polynomials', () => {
      for (const [order, powers] of Object.entries(polynomials)) {
        const response = filterResponse(filterOf({ family: 'legendre', order: Number(order) }));
        for (const omega of [0.1, 0.3, 0.5, 0.7, 0.9, 1, 1.1, 1.5, 2, 5]) {
          const expected = 1 + powers.reduceRight((sum, c) => (sum + c) * omega * omega, 0);
          tally.relative(Math.exp(-2 * response.logGain(omega)), expected, filterRelative, `order ${order} at ${omega} rad/s`);
        }
      }
    });

    it('has the slopes at half power, the steepest that never rise', () => {
      slopes.forEach((expected, index) => {
        const slope = filterResponse(filterOf({ family: 'legendre', order: index + 1 })).slope(1, 1);
        assert.ok(slope !== null);
        // |H|² = 1/(1 + L) and L = 1, so dL/dω = −4·d ln|H|/dω.
        tally.relative(-4 * slope.low, expected, 1e-8, `order ${index + 1}`);
        tally.relative(-4 * slope.high, expected, 1e-8, `order ${index + 1}`);
      });
    });
  },
};
