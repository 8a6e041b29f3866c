/** Fourier coefficients of gates: the limit of a narrow gate, Parseval, and a numerical series. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { gateCoefficient, logGateWeight, relativeGateWeight } from '../../../src/signal/pulses/gate';
import { pulseArea, pulseEnergy } from '../../../src/signal/pulses/pulse-area';
import type { PulseShape } from '../../../src/signal/pulses/pulse-shape';
import { assertClose, assertWithin } from '../../support/tolerance';
import { everyShape, transform, widthOf } from './waveforms';

const rate = 44.1e3;
const share = (duty: number): PulseShape => ({ shape: 'rectangle', widthSeconds: duty / rate });

describe('gate coefficients', () => {
  // Common practice: an impulse train has a flat spectrum.
  it('all become 1/T as a gate narrows with its area held at 1, and c_0 is the duty', () => {
    const period = 1 / rate;
    for (const duty of [0.1, 1e-3, 1e-6]) {
      for (const shape of [share(duty), { shape: 'half-sine', widthSeconds: duty * period }] as const) {
        const height = 1 / pulseArea(shape);
        for (const k of [0, 1, 5, 20]) {
          const weight = height * Math.exp(logGateWeight(shape, rate, k));
          // |P(x)| = 1 − (πx)²/6 at most for these shapes, x = k·duty.
          assertWithin(weight * period, 1, (Math.PI * k * duty) ** 2 / 6 + 1e-12, `k = ${k}, duty ${duty}`);
        }
      }
      assertClose(Math.exp(logGateWeight(share(duty), rate, 0)), duty, 1e-14);
    }
  });

  it('have |c_k|/|c_0| = |P(k·fs)|, and none for a split gate', () => {
    assertClose(relativeGateWeight(share(0.12), rate, 1) ?? NaN, Math.sin(0.12 * Math.PI) / (0.12 * Math.PI), 1e-14);
    assert.equal(relativeGateWeight(share(0.12), rate, 0), 1);
    assert.equal(relativeGateWeight({ shape: 'split', widthSeconds: 0.1 / rate }, rate, 1), null);
  });

  it('are the Fourier series of the gate', () => {
    fc.assert(
      fc.property(everyShape, fc.integer({ min: -5, max: 5 }), (shape, k) => {
        const rateHz = 0.9 / widthOf(shape);
        const expected = transform(shape, k * rateHz);
        const actual = gateCoefficient(shape, rateHz, k);
        assertWithin(actual.re, rateHz * expected.re, 1e-8);
        assertWithin(actual.im, rateHz * expected.im, 1e-8);
      }),
      { seed: 55, numRuns: 150 },
    );
  });

  it('have squares that sum to the energy over the period (Parseval)', () => {
    const shapes: readonly PulseShape[] = [
      share(0.3),
      { shape: 'triangle', widthSeconds: 0.5 / rate },
      { shape: 'half-sine', widthSeconds: 0.7 / rate },
      { shape: 'split', widthSeconds: 0.4 / rate },
      { shape: 'trapezoid', widthSeconds: 0.5 / rate, edgeSeconds: 0.1 / rate },
      { shape: 'raised-cosine', widthSeconds: 0.5 / rate, edgeSeconds: 0.2 / rate },
      { shape: 'exponential', widthSeconds: 0.5 / rate, decaySeconds: 0.2 / rate },
    ];
    for (const shape of shapes) {
      let sum = 0;
      for (let k = -20_000; k <= 20_000; k += 1) sum += Math.exp(2 * logGateWeight(shape, rate, k));
      // What is left out is at most 2·Σ (V/2πk)², V ≤ 4.
      assertWithin(sum, pulseEnergy(shape) * rate, 5e-5, shape.shape);
    }
  });
});
