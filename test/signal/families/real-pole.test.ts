/** One real pole against its closed form. */
import assert from 'node:assert/strict';
import { realPole } from '../../../src/signal/families/real-pole';
import { filterResponse, groupDelay, phaseRad } from '../../../src/signal/filter';
import { assertClose, roundingRelative } from '../../support/tolerance';

describe('realPole', () => {
  it('has gain 1/√(1 + (f/corner)²), phase −atan(f/corner) and delay 1/(2π·corner) at 0 Hz', () => {
    const filter = realPole(400e3);
    const response = filterResponse(filter);
    for (const f of [0, 1, 10e3, 400e3, 3e6, 1e12]) {
      assertClose(Math.exp(response.logGain(f)), 1 / Math.hypot(1, f / 400e3), roundingRelative);
      assertClose(phaseRad(filter, f), -Math.atan(f / 400e3), roundingRelative);
    }
    assertClose(groupDelay(filter, 0), 1 / (2 * Math.PI * 400e3), roundingRelative);
  });

  it('is that of a resistor and a capacitor: 1 kΩ and 1 nF give half power at 159.155 kHz', () => {
    const corner = 1 / (2 * Math.PI * 1e3 * 1e-9);
    assertClose(corner, 159154.9430918953, roundingRelative);
    assertClose(Math.exp(2 * filterResponse(realPole(corner)).logGain(corner)), 0.5, roundingRelative);
  });

  it('lets nothing through at infinity', () => {
    assert.equal(filterResponse(realPole(1)).logGain(Infinity), -Infinity);
  });
});
