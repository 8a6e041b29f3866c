/** Delay and phase of every pulse against quadrature of its waveform, closed forms at 0 Hz, and the phase's own slope. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { pulseArea } from '../../../src/signal/pulses/pulse-area';
import { pulseDelay, pulseDelayRange } from '../../../src/signal/pulses/pulse-delay';
import { pulsePhase } from '../../../src/signal/pulses/pulse-phase';
import { pulseResponse } from '../../../src/signal/pulses/pulse-response';
import { readPulseVectors, vectorShape } from '../../reference/pulse-vectors';
import { assertClose, assertWithin } from '../../support/tolerance';
import { everyShape, transform, widthOf } from './waveforms';

const { pulses } = readPulseVectors();

describe('pulseDelay and pulsePhase', () => {
  for (const vector of pulses) {
    const name = `${vector.shape}${vector.extra === null ? '' : ` with ${vector.extra} of its width`}`;
    it(`are those of the waveform of ${name} at 60 digits`, () => {
      for (const [x, , phase, delay] of vector.rows) {
        if (phase === null || delay === null) continue;
        assertClose(pulseDelay(vectorShape(vector, 2 ** -18), x / 2 ** -18), delay * 2 ** -18, 1e-11, `at ${x}`);
        const difference = pulsePhase(vectorShape(vector), x) - phase;
        assertWithin(Math.sin(0.5 * difference), 0, 1e-9, `at ${x}`);
      }
    });
  }

  // Closed form at 0 Hz: τ − w/(e^{w/τ} − 1).
  it('is 0.19321634 of the width at 0 Hz for a decay of 0.2 of it', () => {
    assertClose(pulseDelay({ shape: 'exponential', widthSeconds: 1, decaySeconds: 0.2 }, 0), 0.2 - 1 / Math.expm1(5), 1e-14);
    assertWithin(pulseDelay({ shape: 'exponential', widthSeconds: 1, decaySeconds: 0.2 }, 0), 0.19321634, 1e-8);
  });

  it('is half the width for symmetric shapes and split, and one period for linear', () => {
    for (const shape of ['rectangle', 'triangle', 'half-sine', 'split'] as const)
      assert.equal(pulseDelay({ shape, widthSeconds: 3 }, 7), 1.5);
    for (const shape of ['trapezoid', 'raised-cosine'] as const)
      assert.equal(pulseDelay({ shape, widthSeconds: 3, edgeSeconds: 1 }, 7), 1.5);
    assert.equal(pulseDelay({ shape: 'linear', periodSeconds: 3 }, 7), 3);
  });

  it('gives the complex spectrum that a numerical Fourier transform gives, at either sign of the frequency', () => {
    fc.assert(
      fc.property(everyShape, fc.double({ min: -6, max: 6, noNaN: true }), (shape, x) => {
        const f = x / widthOf(shape);
        const { re, im } = transform(shape, f);
        const size = pulseArea(shape) * Math.exp(pulseResponse(shape).logGain(Math.abs(f)));
        assertWithin(size * Math.cos(pulsePhase(shape, f)), re, 1e-8 * pulseArea(shape));
        assertWithin(size * Math.sin(pulsePhase(shape, f)), im, 1e-8 * pulseArea(shape));
      }),
      { seed: 53, numRuns: 150 },
    );
  });

  it('lies in its range over any interval, which closes as the interval does', () => {
    const decays = fc.double({ min: -2, max: 4, noNaN: true }).map((x) => 10 ** x);
    const starts = fc.double({ min: 0, max: 4, noNaN: true });
    const widths = fc.double({ min: -6, max: 1, noNaN: true }).map((x) => 10 ** x);
    fc.assert(
      fc.property(decays, starts, widths, fc.double({ min: 0, max: 1, noNaN: true }), (decaySeconds, low, width, share) => {
        const shape = { shape: 'exponential', widthSeconds: 1, decaySeconds } as const;
        const range = pulseDelayRange(shape, low, low + width);
        const delay = pulseDelay(shape, low + share * width);
        assert.ok(range.low <= delay && delay <= range.high, `${delay} outside ${range.low} .. ${range.high}`);
        const point = pulseDelayRange(shape, low, low);
        assertWithin(point.high, point.low, 1e-11 * (1 + Math.abs(point.low)));
      }),
      { seed: 54, numRuns: 500 },
    );
  });
});
