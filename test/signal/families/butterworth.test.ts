/** Butterworth filters against 50-digit arithmetic (test/reference/make-vectors.py) and closed forms. */
import assert from 'node:assert/strict';
import { butterworth } from '../../../src/signal/families/butterworth';
import { filterResponse, groupDelay, phaseRad } from '../../../src/signal/filter';
import { readVectors } from '../../reference/signal-vectors';
import { assertClose, assertWithin, filterRelative, roundingRelative } from '../../support/tolerance';

const { butterworth: vectors, grid } = readVectors();

describe('butterworth', () => {
  it('has the poles of 50-digit arithmetic for orders 1 to 20', () => {
    assert.deepEqual(
      vectors.map((vector) => vector.order),
      Array.from({ length: 20 }, (_, index) => index + 1),
    );
    for (const { order, poles } of vectors) {
      const upper = butterworth(order, 1).poles.filter((pole) => pole.im >= 0);
      assert.equal(upper.length, poles.length);
      upper.forEach((pole, index) => {
        const [re, im] = poles[index]!;
        const off = Math.hypot(pole.re - re, pole.im - im);
        assert.ok(off <= roundingRelative, `order ${order}, pole ${index}: off by ${off}`);
      });
    }
  });

  it('has the gain, phase and delay of 50-digit arithmetic for orders 1 to 20', () => {
    for (const { order, gain, phase, delay } of vectors) {
      const filter = butterworth(order, 1);
      const response = filterResponse(filter);
      grid.forEach((w, index) => {
        assertClose(Math.exp(response.logGain(w)), gain[index]!, filterRelative, `order ${order} at ${w}`);
        assertClose(phaseRad(filter, w), phase[index]!, filterRelative, `phase, order ${order} at ${w}`);
        assertClose(groupDelay(filter, w) * 2 * Math.PI, delay[index]!, filterRelative, `delay, order ${order} at ${w}`);
      });
    }
  });

  it('is 10·log10(2) dB down at the corner, whatever the order and the corner', () => {
    for (const order of [1, 2, 7, 20]) {
      for (const cornerHz of [1e-6, 14e3, 5.6e9]) {
        const lossDb = -20 * Math.log10(Math.exp(filterResponse(butterworth(order, cornerHz)).logGain(cornerHz)));
        assertWithin(lossDb, 10 * Math.log10(2), 1e-9);
      }
    }
  });

  it('delays by 1/sin(π/2n) over the corner in radians at 0 Hz', () => {
    // Closed form; n = 2 gives √2, n = 5 gives 3.236068.
    for (const order of [1, 2, 5, 8]) {
      assertClose(
        groupDelay(butterworth(order, 1000), 0),
        1 / Math.sin(Math.PI / (2 * order)) / (2000 * Math.PI),
        roundingRelative,
      );
    }
  });

  it('refuses an order that is not a whole number from 1 and a corner that is not above 0 Hz', () => {
    for (const order of [0, -1, 2.5, NaN, Infinity]) assert.throws(() => butterworth(order, 1), RangeError);
    for (const corner of [0, -1, NaN, Infinity]) assert.throws(() => butterworth(2, corner), RangeError);
  });
});
