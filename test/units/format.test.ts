/** Tests of how values are printed for people, and of frequencies as spec text. */
import assert from 'node:assert/strict';
import * as format from '../../src/units/format';
import { formatSpecFrequency } from '../../src/units/format-spec';

describe('printing for people', () => {
  it('prints frequencies with four significant digits and a fitting prefix', () => {
    assert.equal(format.formatFrequency(41200), '41.2 kHz');
    assert.equal(format.formatFrequency(10000), '10 kHz');
    assert.equal(format.formatFrequency(223.606), '223.6 Hz');
    assert.equal(format.formatFrequency(999960), '1 MHz');
    assert.equal(format.formatFrequency(0), '0 Hz');
    assert.equal(format.formatFrequency(0.0125), '12.5 mHz');
    assert.equal(format.formatFrequency(Infinity), '∞ Hz');
  });

  it('prints a frequency finer where the resolution asks for it', () => {
    assert.equal(format.formatFrequency(455123.4, 10), '455.12 kHz');
    assert.equal(format.formatFrequency(70001234, 100), '70.0012 MHz');
    assert.equal(format.formatFrequency(41200, 1000), '41.2 kHz');
  });

  it('prints levels with a true minus sign and no idle zeros', () => {
    assert.equal(format.formatDb(-91.2, 'dBFS'), '−91.2 dBFS');
    assert.equal(format.formatDb(-96, 'dBFS'), '−96 dBFS');
    assert.equal(format.formatDb(0.217, 'dB', 2), '0.22 dB');
    assert.equal(format.formatDb(-0.04), '0 dB');
    assert.equal(format.formatDb(-Infinity, 'dBFS'), '−∞ dBFS');
    assert.equal(format.formatDb(100), '100 dB');
  });

  it('prints times, voltages, percentages and counts', () => {
    assert.equal(format.formatTime(300e-9), '300 ns');
    assert.equal(format.formatTime(1e-9), '1 ns');
    assert.equal(format.formatVoltage(Math.SQRT2), '1.414 V');
    assert.equal(format.formatVoltage(0.12, 'V rms'), '120 mV rms');
    assert.equal(format.formatPercent(0.04), '4 %');
    assert.equal(format.formatSignedPercent(0.04), '+4 %');
    assert.equal(format.formatSignedPercent(-0.04), '−4 %');
    assert.equal(format.formatSignedPercent(0), '0 %');
    assert.equal(format.formatCount(1, 'fault'), '1 fault');
    assert.equal(format.formatCount(2, 'fault'), '2 faults');
  });

  it('writes frequencies as spec text without loss', () => {
    assert.equal(formatSpecFrequency(64000), '64 kHz');
    assert.equal(formatSpecFrequency(24576000), '24.576 MHz');
    assert.equal(formatSpecFrequency(12180), '12.18 kHz');
    assert.equal(formatSpecFrequency(0), '0 Hz');
    assert.equal(formatSpecFrequency(1 / 3), '333.3333333333333 mHz');
  });
});
