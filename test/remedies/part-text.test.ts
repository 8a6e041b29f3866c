import assert from 'node:assert/strict';
import { rewritePart } from '../../src/remedies/part-text';

describe('a rewritten part', () => {
  it('keeps the form of its old value and the tolerance', () => {
    assert.equal(rewritePart('4k7 ± 1 %', 5600, 'Ω'), '5k6 ± 1 %');
    assert.equal(rewritePart('2n2 ± 5 %', 1.8e-9, 'F'), '1n8 ± 5 %');
    assert.equal(rewritePart('100n', 82e-9, 'F'), '82n');
    assert.equal(rewritePart('820', 1000, 'Ω'), '1 kΩ');
    assert.equal(rewritePart('4.7 nF ± 5 %', 5.6e-9, 'F'), '5.6 nF ± 5 %');
    assert.equal(rewritePart('10 µF + 80 % - 20 %', 12e-6, 'F'), '12 µF + 80 % - 20 %');
    assert.equal(rewritePart('4k7 +/- 1 %', 3900, 'Ω'), '3k9 +/- 1 %');
  });

  it('has a letter of its own kind', () => {
    assert.equal(rewritePart('1k', 820, 'Ω'), '820R');
    assert.equal(rewritePart('R47', 0.56, 'Ω'), '0R56');
    assert.equal(rewritePart('1u', 820e-9, 'F'), '820n');
    assert.equal(rewritePart('10k', 12e3, 'Ω'), '12k');
  });
});
