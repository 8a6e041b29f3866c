/** Half-power points against closed forms. */
import assert from 'node:assert/strict';
import { halfPowerPoints } from '../../src/analysis/half-power-points';
import { designFilter } from '../../src/signal/families/design-filter';
import { realPole } from '../../src/signal/families/real-pole';
import { secondOrder } from '../../src/signal/families/second-order';
import { filterResponse, type Filter } from '../../src/signal/filter';
import { constantResponse } from '../../src/signal/response-algebra';

const points = (filter: Filter): readonly number[] => halfPowerPoints(filterResponse(filter));

const near = (found: readonly number[], expected: readonly number[]): void => {
  assert.equal(found.length, expected.length, `${found.join(', ')} for ${expected.join(', ')}`);
  found.forEach((hz, index) => {
    assert.ok(Math.abs(hz / (expected[index] ?? 0) - 1) < 1e-7, `${hz} for ${expected[index]}`);
  });
};

describe('half-power points', () => {
  it('are one for a low-pass, at its corner', () => {
    near(points(realPole(1234)), [1234]);
  });

  it('are both edges of a band-pass and of a band-stop', () => {
    for (const kind of ['bandpass', 'bandstop'] as const) {
      const corners = { low: 3.8e6, high: 4.9e6 };
      const design = { family: 'butterworth', kind, order: 3, corners, cornerAt: 'half-power', gain: 1 } as const;
      near(points(designFilter({ ...design, rippleDb: null, attenuationDb: null })), [3.8e6, 4.9e6]);
    }
  });

  it('are the lower edge of a high-pass', () => {
    const design = { family: 'butterworth', kind: 'highpass', order: 5, corners: 20, cornerAt: 'half-power', gain: 1 } as const;
    near(points(designFilter({ ...design, rippleDb: null, attenuationDb: null })), [20]);
  });

  it('lie f₀/Q apart about a resonance and a notch', () => {
    // For both kinds the half-power points have the product f₀² and the difference f₀/Q, exactly.
    for (const kind of ['bandpass', 'notch'] as const) {
      const half = 1000 / (2 * 5);
      const middle = Math.hypot(1000, half);
      near(points(secondOrder(kind, 1000, 5)), [middle - half, middle + half]);
    }
  });

  it('are none for what lets everything through', () => {
    near(points(secondOrder('allpass', 1000, 5)), []);
    near(halfPowerPoints(constantResponse(0)), []);
  });
});
