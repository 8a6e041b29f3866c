/** Tests of reading poles and zeros: real ones, pairs, prefixes, and slips. */
import assert from 'node:assert/strict';
import { readRoot } from '../../src/units/read-root';

describe('reading a root', () => {
  const roots: readonly [string, number, number][] = [
    ['-1200 Hz', -1200, 0],
    ['−1.2 kHz', -1200, 0],
    ['-800 ± 600j Hz', -800, 600],
    ['-0.8 ± 0.6j kHz', -800, 600],
    ['-800 Hz ± 0.6j kHz', -800, 600],
    ['-800+/-600i Hz', -800, 600],
    ['± 50j Hz', 0, 50],
    ['0 Hz', 0, 0],
    ['0', 0, 0],
    ['-1e3 ± 2e3j Hz', -1000, 2000],
  ];
  for (const [text, re, im] of roots) {
    it(`reads ${text}`, () => {
      assert.deepEqual(readRoot(text), { root: { re, im } });
    });
  }

  const slips: readonly [string, string | undefined][] = [
    ['-800 ± 600 Hz', '-800 ± 600j Hz'],
    ['-800 + 600j Hz', '-800 ± 600j Hz'],
    ['-800', '-800 Hz'],
    ['-800 ± 600j', undefined],
    ['-800 ± 600j s', undefined],
    ['near ± 600j Hz', undefined],
  ];
  for (const [text, meant] of slips) {
    it(`refuses ${text}`, () => {
      const reading = readRoot(text);
      assert.ok('fault' in reading);
      assert.equal(reading.fault.suggestions[0], meant);
    });
  }
});
