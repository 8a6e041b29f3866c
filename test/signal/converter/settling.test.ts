/** Settling of one pole against published tables of time constants. */
import assert from 'node:assert/strict';
import { settlingTime } from '../../../src/signal/converter/settling';
import { assertClose, assertWithin } from '../../support/tolerance';

describe('settlingTime', () => {
  it('is N·ln 2 time constants to one step, and ln 2 more for each halving', () => {
    // mpmath, 50 digits, in time constants: to 1, 1/2 and 1/4 of a step.
    const rows = [
      [8, 5.54518, 6.23832, 6.93147],
      [12, 8.31777, 9.01091, 9.70406],
      [16, 11.09035, 11.7835, 12.47665],
      [24, 16.63553, 17.32868, 18.02183],
    ] as const;
    for (const [bits, ...times] of rows) {
      [1, 0.5, 0.25].forEach((fraction, index) => {
        assertWithin(settlingTime(1, fraction, bits), times[index] ?? NaN, 6e-6);
      });
    }
  });

  it('leaves just that fraction of a step', () => {
    const timeConstant = 230 * 30e-12;
    const left = Math.exp(-settlingTime(timeConstant, 0.3, 14) / timeConstant) * 2 ** 14;
    assertClose(left, 0.3, 1e-12);
  });

  it('is nothing where the whole step may be left, and refuses to leave nothing', () => {
    assert.equal(settlingTime(1, 256, 8), 0);
    assert.equal(settlingTime(1, 1000, 8), 0);
    assert.throws(() => settlingTime(1, 0, 8), RangeError);
  });
});
