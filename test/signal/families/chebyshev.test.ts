/** Chebyshev filters against 50-digit arithmetic (test/reference/make-vectors.py) and what the family promises. */
import assert from 'node:assert/strict';
import { chebyshev } from '../../../src/signal/families/chebyshev';
import { filterResponse, groupDelay, phaseRad } from '../../../src/signal/filter';
import { readVectors } from '../../reference/signal-vectors';
import { assertClose, assertWithin, filterRelative, roundingRelative } from '../../support/tolerance';

const { chebyshev: vectors, grid } = readVectors();
const toDb = (logGain: number): number => (20 / Math.LN10) * logGain;

describe('chebyshev', () => {
  it('has the poles of 50-digit arithmetic for orders 1 to 20 and ripples from 0.01 to 6 dB', () => {
    assert.equal(vectors.length, 6 * 20);
    for (const { order, ripple, poles } of vectors) {
      const upper = chebyshev(order, 1, ripple, 'ripple').poles.filter((pole) => pole.im >= 0);
      assert.equal(upper.length, poles.length);
      upper.forEach((pole, index) => {
        const [re, im] = poles[index]!;
        const off = Math.hypot(pole.re - re, pole.im - im) / Math.hypot(re, im);
        assert.ok(off <= roundingRelative, `order ${order}, ${ripple} dB, pole ${index}: off by ${off}`);
      });
    }
  });

  it('has the gain, phase and delay of 50-digit arithmetic', () => {
    for (const { order, ripple, gain, phase, delay } of vectors) {
      const filter = chebyshev(order, 1, ripple, 'ripple');
      const response = filterResponse(filter);
      grid.forEach((w, index) => {
        const at = `order ${order}, ${ripple} dB, at ${w}`;
        assertClose(Math.exp(response.logGain(w)), gain[index]!, filterRelative, at);
        assertClose(phaseRad(filter, w), phase[index]!, filterRelative, `phase, ${at}`);
        assertClose(groupDelay(filter, w) * 2 * Math.PI, delay[index]!, filterRelative, `delay, ${at}`);
      });
    }
  });

  it('puts the corner at the last half-power point unless it names the end of the ripple', () => {
    for (const { order, ripple, halfPower } of vectors) {
      const byRipple = chebyshev(order, 1000, ripple, 'ripple').poles;
      const byHalfPower = chebyshev(order, 1000 * halfPower, ripple, 'half-power').poles;
      byHalfPower.forEach((pole, index) => {
        assertWithin(pole.re, byRipple[index]!.re, filterRelative * 1000);
        assertWithin(pole.im, byRipple[index]!.im, filterRelative * 1000);
      });
    }
  });

  it('starts an even order the ripple below 0 dB and an odd one at 0 dB', () => {
    for (const { order, ripple } of vectors) {
      const response = filterResponse(chebyshev(order, 500, ripple, 'half-power'));
      assertWithin(toDb(response.logGain(0)), order % 2 === 0 ? -ripple : 0, 1e-12);
    }
  });

  it('turns exactly where its list says: 0 dB and the ripple in turn', () => {
    for (const { order, ripple } of vectors) {
      const filter = chebyshev(order, 1, ripple, 'ripple');
      const response = filterResponse(filter);
      const turns = filter.turnsHz ?? [];
      assert.equal(turns.length, order - 1);
      turns.toReversed().forEach((turn, fromTop) => {
        assertWithin(
          toDb(response.logGain(turn)),
          fromTop % 2 === 0 ? 0 : -ripple,
          1e-9,
          `order ${order}, ${ripple} dB, at ${turn}`,
        );
      });
    }
  });

  it('refuses a ripple that is not above 0 dB', () => {
    for (const ripple of [0, -1, NaN, Infinity]) assert.throws(() => chebyshev(3, 1, ripple, 'ripple'), RangeError);
  });
});
