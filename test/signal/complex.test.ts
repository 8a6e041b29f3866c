/** Complex numbers against the identities they must keep. */
import fc from 'fast-check';
import {
  complexDifference,
  complexProduct,
  complexQuotient,
  complexRoot,
  complexScaled,
  complexSum,
} from '../../src/signal/complex';
import { assertClose, assertWithin, roundingRelative } from '../support/tolerance';

const part = fc.double({ min: -1e3, max: 1e3, noNaN: true });
const number = fc.record({ re: part, im: part });

describe('complex numbers', () => {
  it('take back what they add and scale', () => {
    fc.assert(
      fc.property(number, number, (a, b) => {
        const back = complexDifference(complexSum(a, b), b);
        assertWithin(back.re, a.re, 1e-12);
        assertWithin(back.im, a.im, 1e-12);
        assertWithin(complexScaled(a, -2).im, -2 * a.im, 0);
      }),
      { seed: 71, numRuns: 200 },
    );
  });

  it('take back what they multiply', () => {
    fc.assert(
      fc.property(number, number, (a, b) => {
        fc.pre(Math.hypot(b.re, b.im) > 1e-3);
        const back = complexQuotient(complexProduct(a, b), b);
        assertWithin(Math.hypot(back.re - a.re, back.im - a.im), 0, 1e-12 * (1 + Math.hypot(a.re, a.im)));
      }),
      { seed: 72, numRuns: 200 },
    );
  });

  it('have a square root right of the axis whose smaller part keeps its digits', () => {
    fc.assert(
      fc.property(number, (a) => {
        const root = complexRoot(a);
        const square = complexProduct(root, root);
        assertWithin(Math.hypot(square.re - a.re, square.im - a.im), 0, 1e-12 * (1e-300 + Math.hypot(a.re, a.im)));
        assertWithin(Math.min(root.re, 0), 0, 0);
      }),
      { seed: 73, numRuns: 200 },
    );
    assertClose(complexRoot({ re: -1, im: 1e-20 }).re, 5e-21, roundingRelative);
    assertClose(complexRoot({ re: 1, im: -1e-20 }).im, -5e-21, roundingRelative);
  });
});
