/** A pulse that passes nothing where gains are measured from. */
import assert from 'node:assert/strict';
import { read } from '../../../src/spec';

const messages = (direction: string, rest: string, band = '0 Hz .. 1 kHz'): readonly string[] =>
  read(`bandkeep: 1
channels:
  a:
    direction: ${direction}
    wanted: { band: ${band} }
    rate: 10 kHz
${rest}`).problems.map(({ code, message }) => `${code}: ${message}`);

describe('a `split` pulse', () => {
  const hold = '    hold: { shape: split, width: 100 % }\n';

  it('contradicts a reference at 0 Hz, stated or not', () => {
    for (const found of [messages('generate', hold), messages('generate', `${hold}    reference: 0 Hz\n`)]) {
      assert.equal(found.length, 1);
      assert.match(found[0] ?? '', /^contradiction: .*`split` pulse passes nothing at 0 Hz/);
    }
    assert.equal(messages('capture', '    aperture: { shape: split, width: 10 % }\n').length, 1);
  });

  it('goes with a reference where it passes something', () => {
    assert.deepEqual(messages('generate', `${hold}    reference: 500 Hz\n`), []);
    assert.deepEqual(messages('generate', hold, '6 kHz .. 9 kHz'), []);
  });
});
