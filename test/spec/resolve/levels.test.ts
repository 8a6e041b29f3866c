/** Tests of levels in volts, dBV, dBu and dBm against closed forms. */
import assert from 'node:assert/strict';
import { wholeChannel } from '../tree-of';

function levelOf(level: string, ...keys: readonly string[]): number {
  const lines = ['direction: capture', `wanted: { band: 1 kHz .. 2 kHz, level: ${level} }`, 'rate: 9 kHz', ...keys];
  return wholeChannel(`channels:\n  x:\n${lines.map((line) => `    ${line}\n`).join('')}`, 'x').wanted[0]?.levelDb ?? NaN;
}

// A sine that just reaches a 4 V span has 2 V peaks, √2 V rms.
const cases: readonly [string, string, number, string][] = [
  ['4 V pp', '4 V', 0, 'the whole span'],
  ['2 V pk', '4 V', 0, 'its peaks'],
  ['2 V', '4 V', 20 * Math.log10(2 / Math.SQRT2), 'rms, though beyond full scale'],
  ['1 V rms', '4 V', -20 * Math.log10(Math.SQRT2), 'rms'],
  ['1 V', '± 2 V', -20 * Math.log10(Math.SQRT2), 'rms against ± 2 V'],
  ['1 V', '0 V .. 4 V', -20 * Math.log10(Math.SQRT2), 'rms against 0 to 4 V'],
  ['1 V', '2 V pk', -20 * Math.log10(Math.SQRT2), 'rms against 2 V pk'],
  ['0 dBV', '4 V', -20 * Math.log10(Math.SQRT2), '0 dBV is 1 V rms'],
  // 0 dBu is √0.6 V = 0.774597 V (IEC 60268-17).
  ['0 dBu', '4 V', 20 * Math.log10(Math.sqrt(0.6) / Math.SQRT2), '0 dBu is √0.6 V rms'],
  ['-6 dBFS', '4 V', -6, 'dBFS as it is'],
];

describe('levels', () => {
  for (const [level, fullScale, expected, why] of cases) {
    it(`takes ${level} of ${fullScale} as ${expected.toFixed(2)} dBFS: ${why}`, () => {
      assert.ok(Math.abs(levelOf(level, `full-scale: ${fullScale}`) - expected) < 1e-12);
    });
  }

  it('takes dBm in the stated impedance: 10 dBm into 50 Ω is √0.5 V', () => {
    const expected = 20 * Math.log10(Math.sqrt(0.5) / Math.SQRT2);
    assert.ok(Math.abs(levelOf('10 dBm', 'full-scale: 4 V', 'impedance: 50 Ω') - expected) < 1e-12);
  });
});
