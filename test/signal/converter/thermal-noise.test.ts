/** kT/C and resistor noise against 50-digit arithmetic. */
import assert from 'node:assert/strict';
import { capacitorNoiseRms, johnsonDensity, zeroCelsiusK } from '../../../src/signal/converter/thermal-noise';
import { assertClose, assertWithin, roundingRelative } from '../../support/tolerance';

const single = (capacitance: number, temperatureK: number): number =>
  capacitorNoiseRms({ capacitance, temperatureK, differential: false });

describe('thermal noise', () => {
  it('of a sampling capacitor is √(kT/C)', () => {
    // mpmath, 50 digits, k = 1.380649e−23 J/K: μV at 300 K, 290 K and 298.15 K.
    const rows = [
      [0.1e-12, 203.51773878461, 200.09702896345, 202.88925534636],
      [1e-12, 64.357959880655, 63.276236455719, 64.159215966998],
      [5e-12, 28.78175463727, 28.297993215067, 28.69287365706],
      [1e-9, 2.0351773878461, 2.0009702896345, 2.0288925534636],
    ] as const;
    for (const [capacitance, ...expected] of rows) {
      [300, 290, zeroCelsiusK + 25].forEach((temperature, index) => {
        assertClose(1e6 * single(capacitance, temperature), expected[index] ?? NaN, roundingRelative, `${capacitance} F`);
      });
    }
    // A circuit simulator at 27 °C, to its printed digits.
    assertWithin(1e6 * single(1e-12, 300.15), 64.374, 5e-4);
  });

  it('of a difference has twice the power', () => {
    const difference = capacitorNoiseRms({ capacitance: 2e-12, temperatureK: 350, differential: true });
    assertClose(difference ** 2, 2 * single(2e-12, 350) ** 2, roundingRelative);
  });

  it('of a resistor has the density 4kTR', () => {
    // mpmath, 50 digits: nV/√Hz at 300 K and 290 K.
    const rows = [
      [50, 0.91015899709886, 0.89486111771604],
      [1000, 4.0703547756922, 4.001940579269],
      [1e6, 128.71591976131, 126.55247291144],
    ] as const;
    for (const [resistance, at300, at290] of rows) {
      assertClose(1e9 * Math.sqrt(johnsonDensity(resistance, 300)), at300, roundingRelative);
      assertClose(1e9 * Math.sqrt(johnsonDensity(resistance, 290)), at290, roundingRelative);
    }
  });

  it('of a resistor, through the pole it makes with a capacitor, is that of the capacitor', () => {
    const [resistance, capacitance] = [4700, 3e-12];
    const bandwidth = (Math.PI / 2) * (1 / (2 * Math.PI * resistance * capacitance));
    assertClose(Math.sqrt(johnsonDensity(resistance, 310) * bandwidth), single(capacitance, 310), roundingRelative);
  });

  it('refuses what is not physical', () => {
    assert.throws(() => single(0, 300), RangeError);
    assert.throws(() => single(1e-12, -1), RangeError);
    assert.throws(() => johnsonDensity(-1, 300), RangeError);
    assert.throws(() => johnsonDensity(1, NaN), RangeError);
  });
});
