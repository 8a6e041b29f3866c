/** Noise rules against published values, and integrated power against closed forms. */
import assert from 'node:assert/strict';
import { butterworth } from '../../src/signal/families/butterworth';
import { chebyshev } from '../../src/signal/families/chebyshev';
import { filterResponse } from '../../src/signal/filter';
import { integratePower, jitterNoiseDb, quantisationSnrDb } from '../../src/signal/noise';
import { rectangleResponse } from '../../src/signal/pulses/rectangle';
import { constantResponse, product } from '../../src/signal/response-algebra';
import { assertClose, assertWithin } from '../support/tolerance';

describe('quantisationSnrDb', () => {
  // 20·N·log10(2) + 10·log10(1.5) by mpmath at 50 digits; the rule is W. R. Bennett's of 1948.
  const known = [
    [1, 7.781512503836436],
    [6, 37.88451207023456],
    [8, 49.92571189679381],
    [10, 61.96691172335305],
    [12, 74.0081115499123],
    [14, 86.04931137647155],
    [16, 98.0905112030308],
    [18, 110.1317110295901],
    [20, 122.1729108561492],
    [24, 146.2553105092678],
  ] as const;
  for (const [bits, db] of known) {
    it(`is ${db.toFixed(4)} dB for ${bits} bits`, () => {
      assertWithin(quantisationSnrDb(bits), db, 1e-12);
      assertWithin(quantisationSnrDb(bits), 6.0206 * bits + 1.7609, 1e-4);
    });
  }
});

describe('jitterNoiseDb', () => {
  // −20·log10(2πfσ) by mpmath at 50 digits; 100 fs at 100 MHz is the trade's "84 dB".
  const known = [
    [1e6, 10e-12, 84.0364],
    [10e6, 1e-12, 84.0364],
    [70e6, 1e-12, 67.1344],
    [100e6, 100e-15, 84.0364],
    [1e9, 100e-15, 64.0364],
    [5e9, 100e-15, 50.057],
    [10e9, 100e-15, 44.0364],
    [20e3, 1e-9, 78.0158],
    [20e3, 250e-12, 90.057],
    [190e6, 0.5e-12, 64.4819],
  ] as const;
  for (const [f, sigma, db] of known) {
    it(`is ${db} dB below a tone of ${f} Hz with ${sigma} s`, () => {
      assertWithin(jitterNoiseDb(f, sigma), -db, 1e-4);
    });
  }

  it('is near the exact noise of a Gaussian jitter, E|e|² = 2(1 − exp(−(2πfσ)²/2))', () => {
    const angle = 2 * Math.PI * 100e6 * 100e-15;
    assertWithin(jitterNoiseDb(100e6, 100e-15), 10 * Math.log10(-2 * Math.expm1(-(angle ** 2) / 2)), 1e-6);
  });

  it('is nothing without jitter or at 0 Hz', () => {
    assert.equal(jitterNoiseDb(1e6, 0), -Infinity);
    assert.equal(jitterNoiseDb(0, 1e-12), -Infinity);
  });
});

describe('integratePower', () => {
  it('gives the width of the band for a flat gain of 1', () => {
    assertClose(integratePower(constantResponse(0), 3, 13).value, 10, 1e-14);
  });

  it('gives atan for one pole: ∫ df/(1 + f²) from 0 to F is atan F', () => {
    const { value, errorBound } = integratePower(filterResponse(butterworth(1, 1)), 0, 50);
    assertClose(value, Math.atan(50), 1e-9);
    assert.ok(Math.abs(value - Math.atan(50)) <= errorBound);
  });

  it('gives the noise bandwidth (π/2n)/sin(π/2n) of a Butterworth filter, the tail left out in closed form', () => {
    // Source: ∫ df/(1 + f^2n) from 0 to ∞; beyond F the tail is F^(1−2n)/(2n−1)·(1 − …), below 1e−13 for F = 1000 and n ≥ 3.
    for (const order of [3, 4, 8, 20]) {
      const angle = Math.PI / (2 * order);
      assertClose(integratePower(filterResponse(butterworth(order, 1)), 0, 1000).value, angle / Math.sin(angle), 1e-9);
    }
  });

  it('agrees with a plain midpoint sum for a hold and a rippling filter, and says how far it may be off', () => {
    const response = product([rectangleResponse(1 / 48e3), filterResponse(chebyshev(9, 20e3, 1, 'ripple'))]);
    const points = 400_000;
    let sum = 0;
    for (let i = 0; i < points; i += 1) sum += Math.exp(2 * response.logGain(((i + 0.5) * 90e3) / points));
    const plain = (sum * 90e3) / points;
    const { value, errorBound } = integratePower(response, 0, 90e3);
    assertClose(value, plain, 1e-8);
    assert.ok(errorBound <= 1e-9 * value * 1.000001);
  });

  it('gives nothing over no width, and refuses an endless band', () => {
    assert.deepEqual(integratePower(constantResponse(0), 5, 5), { value: 0, errorBound: 0 });
    assert.throws(() => integratePower(constantResponse(0), 0, Infinity), RangeError);
  });
});
