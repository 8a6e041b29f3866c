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
  it('is refused, not passed over: the Qs of more sections than every combination can be looked at of', () => {
    const found = messages('    filter: { family: butterworth, order: 10, corner: 2 kHz, tolerance: { q: 5 % } }\n');
    assert.equal(found.length, 1, found.join('\n'));
    assert.ok(found[0]?.includes('`q`') && found[0].includes('not supported yet'), found[0]);
  });

  for (const filter of [
    '{ family: bessel, order: 4, corner: 2 kHz }',
    '{ family: elliptic, order: 4, corner: 2 kHz, ripple: 1 dB, attenuation: 40 dB, gain: 6 dB }',
    '{ family: butterworth, order: 8, corner: 2 kHz, tolerance: { q: 5 %, corner: 2 % } }',
    '{ second-order: { frequency: 2 kHz, q: 1, kind: allpass }, tolerance: { q: 5 % } }',
    '{ rlc: { r: 50 Ω, l: 1 mH ± 5 %, c: 10 nF ± 2 % } }',
    '{ poles: [-1200 Hz, -800 ± 600j Hz], zeros: [-5 kHz], gain: 2 V/V, tolerance: { q: 1 % } }',
  ]) {
    it(`leaves whole what is computed: ${filter}`, () => {
      assert.deepEqual(messages(`    filter: ${filter}\n`), []);
    });
  }
});
