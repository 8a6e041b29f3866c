/** Sections of parts against their voltage dividers in complex impedances. */
import { seriesCapacitor, seriesResonance, zeroAtOrigin } from '../../../src/signal/families/passive-sections';
import { filterResponse, phaseRad } from '../../../src/signal/filter';
import { assertClose, assertWithin, roundingRelative } from '../../support/tolerance';

describe('seriesCapacitor', () => {
  it('divides R over R − j/(ωC)', () => {
    const filter = seriesCapacitor(4.7e3, 22e-9);
    for (const f of [1, 300, 1539, 40e3, 1e9]) {
      const reactance = -1 / (2 * Math.PI * f * 22e-9);
      assertClose(Math.exp(filterResponse(filter).logGain(f)), 4.7e3 / Math.hypot(4.7e3, reactance), roundingRelative);
      assertWithin(phaseRad(filter, f), -Math.atan2(reactance, 4.7e3), roundingRelative);
    }
  });
});

describe('zeroAtOrigin', () => {
  it('has gain 1/√(1 + (corner/f)²) and 1 at infinity', () => {
    const response = filterResponse(zeroAtOrigin(300));
    for (const f of [1e-3, 10, 300, 5000, Infinity]) {
      assertClose(Math.exp(response.logGain(f)), 1 / Math.hypot(1, 300 / f), roundingRelative);
    }
  });
});

describe('seriesResonance', () => {
  it('divides 1/(jωC) over R + jωL + 1/(jωC), damped or not', () => {
    for (const ohm of [1, 50, 2e3]) {
      const filter = seriesResonance(ohm, 100e-6, 1e-9);
      for (const f of [1e3, 300e3, 503e3, 520e3, 20e6]) {
        const omega = 2 * Math.PI * f;
        const expected = 1 / Math.hypot(omega * 1e-9 * ohm, 1 - omega * omega * 1e-13);
        assertClose(Math.exp(filterResponse(filter).logGain(f)), expected, 1e-11);
      }
    }
  });
});
