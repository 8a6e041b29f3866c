/** All roots of polynomials at once. */
import assert from 'node:assert/strict';
import { complexProduct, complexSum, type Complex } from '../../../src/signal/complex';
import { simultaneousRoots, type Evaluated } from '../../../src/signal/families/simultaneous-roots';
import { assertWithin } from '../../support/tolerance';

/** From coefficients, highest power first. */
function polynomial(coefficients: readonly number[]): (z: Complex) => Evaluated {
  return (z) =>
    coefficients.reduce<Evaluated>(
      ({ value, derivative }, c) => ({
        value: complexSum(complexProduct(value, z), { re: c, im: 0 }),
        derivative: complexSum(complexProduct(derivative, z), value),
      }),
      { value: { re: 0, im: 0 }, derivative: { re: 0, im: 0 } },
    );
}

describe('simultaneousRoots', () => {
  it('finds the roots of unity, the real one on the axis', () => {
    const roots = simultaneousRoots(polynomial([1, 0, 0, 0, 0, 0, 0, -1]), 7, { centre: 0.3, radius: 2 });
    assert.equal(roots.length, 7);
    assert.equal(roots.filter(({ im }) => im === 0).length, 1);
    for (let k = 0; k < 7; k += 1) {
      const angle = (2 * Math.PI * k) / 7;
      const nearest = Math.min(...roots.map(({ re, im }) => Math.hypot(re - Math.cos(angle), im - Math.sin(angle))));
      assertWithin(nearest, 0, 1e-14);
    }
  });

  it('finds real roots of very different size from one circle', () => {
    // (z + 0.01)(z + 1)(z + 300)
    const roots = simultaneousRoots(polynomial([1, 301.01, 303.01, 3]), 3, { centre: 0, radius: 5 });
    const sorted = roots.map(({ re }) => re).sort((one, other) => other - one);
    [-0.01, -1, -300].forEach((root, index) => {
      assertWithin(sorted[index]! / root, 1, 1e-11);
    });
  });
});
