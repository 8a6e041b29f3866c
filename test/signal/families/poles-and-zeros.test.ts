/** Poles and zeros as they are written. */
import assert from 'node:assert/strict';
import { polesAndZeros } from '../../../src/signal/families/poles-and-zeros';
import { filterResponse } from '../../../src/signal/filter';
import { assertClose, filterRelative, roundingRelative } from '../../support/tolerance';

describe('polesAndZeros', () => {
  it('adds the conjugates that are not written, as often as they are missing', () => {
    const pole = { re: -800, im: 600 };
    const one = (poles: readonly { re: number; im: number }[]): number =>
      polesAndZeros({ poles, zeros: [], gain: 1, gainAtHz: 0 }).poles.length;
    assert.equal(one([pole]), 2);
    assert.equal(one([pole, { re: -800, im: -600 }]), 2);
    assert.equal(one([pole, pole]), 4);
    assert.equal(one([pole, pole, { re: -800, im: -600 }]), 4);
    assert.equal(one([{ re: -1200, im: 0 }, pole]), 3);
  });

  it('has the stated gain at the stated frequency, and elsewhere what its roots make of it', () => {
    const filter = polesAndZeros({
      poles: [
        { re: -1200, im: 0 },
        { re: -800, im: 600 },
      ],
      zeros: [
        { re: 0, im: 50 },
        { re: 0, im: 0 },
      ],
      gain: 2.5,
      gainAtHz: 3000,
    });
    const response = filterResponse(filter);
    assertClose(Math.exp(response.logGain(3000)), 2.5, roundingRelative);
    const distances = (f: number): number =>
      (Math.abs(f - 50) * (f + 50) * f) / (Math.hypot(1200, f) * Math.hypot(800, f - 600) * Math.hypot(800, f + 600));
    for (const f of [1, 49, 700, 1e6])
      assertClose(Math.exp(response.logGain(f)), (2.5 * distances(f)) / distances(3000), filterRelative);
    assert.equal(response.logGain(50), -Infinity);
    assert.equal(response.logGain(0), -Infinity);
  });

  it('is refused where its gain is stated at a zero or its poles stand right of the axis', () => {
    const written = { poles: [{ re: -1, im: 0 }], zeros: [{ re: 0, im: 0 }], gain: 1, gainAtHz: 0 };
    assert.throws(() => filterResponse(polesAndZeros(written)), RangeError);
    assert.throws(() => filterResponse(polesAndZeros({ ...written, poles: [{ re: 1, im: 0 }], gainAtHz: 1 })), RangeError);
  });
});
