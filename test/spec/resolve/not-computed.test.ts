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
    ['    filter: { second-order: { frequency: 2 kHz, q: 1 }, tolerance: { q: 5 % } }\n', '`q`'],
    ['    filter: { rlc: { r: 50 Ω, l: 1 mH ± 5 %, c: 10 nF } }\n', '`rlc`'],
  ] as const) {
    it(`is refused, not passed over: ${word}`, () => {
      const found = messages(rest);
      assert.equal(found.length, 1, found.join('\n'));
      assert.ok(found[0]?.includes(word) && found[0].includes('not supported yet'), found[0]);
    });
  }

  it('leaves whole what is computed', () => {
    assert.deepEqual(messages('    filter: { family: bessel, order: 4, corner: 2 kHz }\n'), []);
    assert.deepEqual(
      messages('    filter: { family: elliptic, order: 4, corner: 2 kHz, ripple: 1 dB, attenuation: 40 dB, gain: 6 dB }\n'),
      [],
    );
    assert.deepEqual(messages('    filter: { poles: [-1200 Hz], zeros: [-5 kHz], gain: 2 V/V }\n'), []);
  });
});
