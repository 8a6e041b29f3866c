/** A fix says nothing of channels that it does not touch, however many findings stand at one place of theirs. */
import assert from 'node:assert/strict';
import { cured, titles } from '../support/cured';

const spec = `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 400 Hz
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { delay: 20 ms }
  fog-horn:
    direction: generate
    wanted: { band: 20 Hz .. 20 kHz, level: -1 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 2, corner: 40 kHz }
    limits: { image: -60 dBc }
`;

describe('a fix of one channel', () => {
  it('leaves out what stands unchanged in another, though several copies break its limit in one place', () => {
    const found = cured(spec, 'delay-over-limit');
    assert.ok(found.judgement.findings.filter(({ code }) => code === 'image-over-limit').length > 1);
    const words = titles(found);
    assert.ok(words.length > 0);
    assert.deepEqual(
      words.filter((title) => title.includes('fog-horn')),
      [],
    );
    assert.ok(
      words.some((title) => /delay margin [\d.]+ [mµ]s/u.test(title)),
      words.join('\n'),
    );
  });
});
