/** What the text may say and no figure takes into account is refused at its key. */
import assert from 'node:assert/strict';
import { read } from '../../../src/spec';

const spec = (rest: string) => `bandkeep: 1
channels:
  a:
    direction: capture
    wanted: { band: 0 Hz .. 1 kHz }
    rate: 10 kHz
${rest}`;

const messages = (rest: string) => read(spec(rest)).problems.map(({ message }) => message);

describe('what is not computed yet', () => {
  for (const [rest, word] of [
    ['    limits: { delay: 1 ms }\n', '`delay`'],
    ['    filter: { family: butterworth, order: 2, corner: 2 kHz, kind: highpass }\n', '`kind: highpass`'],
    ['    filter: { second-order: { frequency: 2 kHz, q: 1 } }\n', '`second-order`'],
    ['    aperture: { shape: triangle, width: 50 % }\n', '`triangle`'],
    ['    unwanted: { tone: 9 kHz, level: -20 dBFS, enters: sampler }\n', '`enters`'],
  ] as const) {
    it(`is refused, not passed over: ${word}`, () => {
      const found = messages(rest);
      assert.equal(found.length, 1, found.join('\n'));
      assert.ok(found[0]?.includes(word) && found[0].includes('not supported yet'), found[0]);
    });
  }

  it('leaves whole what is computed', () => {
    assert.deepEqual(messages('    filter: { family: bessel, order: 4, corner: 2 kHz }\n'), []);
  });
});
