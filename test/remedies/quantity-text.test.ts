import assert from 'node:assert/strict';
import { rewriteQuantity } from '../../src/remedies/quantity-text';

const rewriteFrequency = (text: string, old: number, next: number): string => rewriteQuantity(text, old, next, 'Hz');

describe('a rewritten quantity', () => {
  it('keeps the unit, the spacing and the tolerance of the old one', () => {
    assert.equal(rewriteFrequency('14 kHz', 14e3, 12.18e3), '12.18 kHz');
    assert.equal(rewriteFrequency('14000Hz', 14e3, 12.18e3), '12180Hz');
    assert.equal(rewriteFrequency('51.2 kS/s', 51.2e3, 64e3), '64 kS/s');
    assert.equal(rewriteFrequency('0.1 MHz ± 20 ppm', 100e3, 120e3), '0.12 MHz ± 20 ppm');
    assert.equal(rewriteFrequency('1.4e6 Hz', 1.4e6, 2.1e6), '2100000 Hz');
  });

  it('may be a time or a share', () => {
    assert.equal(rewriteQuantity('300 ns', 3e-7, 1.2e-6, 's'), '1200 ns');
    assert.equal(rewriteQuantity('12 %', 0.12, 0.1, '%'), '10 %');
  });

  it('loses nothing of a rate that a clock gives', () => {
    const hz = 24.576e6 / 418;
    assert.ok(Math.abs(Number.parseFloat(rewriteFrequency('51.2 kHz', 51.2e3, hz)) * 1000 - hz) < 1e-10);
  });

  it('writes a text that it cannot follow afresh', () => {
    assert.equal(rewriteFrequency('{ }', 14e3, 12e3), '12 kHz');
    assert.equal(rewriteQuantity('zero-order', 1, 0.5, '%'), '50 %');
  });
});
