/** Legendre polynomials and Gauss quadrature against closed forms. */
import { gaussPoints, legendrePolynomials } from '../../../src/signal/families/legendre-polynomials';
import { assertClose, assertWithin, roundingRelative } from '../../support/tolerance';

describe('legendrePolynomials', () => {
  it('has the first ones in closed form, at complex points too', () => {
    for (const x of [
      { re: 0.3, im: 0 },
      { re: -1, im: 0 },
      { re: 0.5, im: 2 },
    ]) {
      const all = legendrePolynomials(3, x);
      const square = { re: x.re * x.re - x.im * x.im, im: 2 * x.re * x.im };
      assertWithin(all[2]!.re, 1.5 * square.re - 0.5, roundingRelative);
      assertWithin(all[2]!.im, 1.5 * square.im, roundingRelative);
      const inner = { re: 2.5 * square.re - 1.5, im: 2.5 * square.im };
      assertWithin(all[3]!.re, x.re * inner.re - x.im * inner.im, roundingRelative);
      assertWithin(all[3]!.im, x.re * inner.im + x.im * inner.re, roundingRelative);
    }
  });
});

describe('gaussPoints', () => {
  it('integrates every power up to twice its count less one', () => {
    for (let count = 1; count <= 10; count += 1) {
      for (let power = 0; power < 2 * count; power += 1) {
        const sum = gaussPoints(count).reduce((total, { at, weight }) => total + weight * at ** power, 0);
        assertWithin(sum, power % 2 === 1 ? 0 : 2 / (power + 1), 1e-13, `${count} points, power ${power}`);
      }
    }
  });

  it('has the points of order 3 in closed form', () => {
    assertClose(gaussPoints(3)[0]!.at, Math.sqrt(0.6), roundingRelative);
    assertClose(gaussPoints(3)[1]!.weight, 8 / 9, roundingRelative);
  });
});
