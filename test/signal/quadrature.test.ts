/** Adaptive quadrature against integrals that are known in closed form. */
import assert from 'node:assert/strict';
import { integrate } from '../../src/signal/quadrature';
import { assertClose } from '../support/tolerance';

describe('integrate', () => {
  it('is exact for polynomials of degree 22, as a 15-point Kronrod rule must be', () => {
    assertClose(integrate((x) => x ** 22, 0, 1, 1).value, 1 / 23, 1e-14);
  });

  it('follows a sharp peak: ∫ dx/(x² + w²) over ±1 is 2·atan(1/w)/w', () => {
    const { value, errorBound } = integrate((x) => 1 / (x * x + 1e-8), -1, 1, 1e-9);
    const exact = (2 * Math.atan(1e4)) / 1e-4;
    assertClose(value, exact, 1e-9);
    assert.ok(Math.abs(value - exact) <= errorBound);
  });

  it('gives up with an honest bound where the integrand is noise', () => {
    const { value, errorBound } = integrate((x) => Math.abs(Math.sin(1e9 * x)), 0, 1, 1e-9);
    assert.ok(errorBound > 1e-9 * value);
  });
});
