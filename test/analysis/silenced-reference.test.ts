/** Parts that silence the wanted tone at its reference: a landing is then endlessly above it, and still has a level of its own. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import { read } from '../../src/spec';
import { designFilter } from '../../src/signal/families/design-filter';
import { filterResponse } from '../../src/signal/filter';
import { assertWithin } from '../support/tolerance';

/** An elliptic band-stop whose null a deviating corner moves onto 1030.5 Hz. */
const stop =
  '{ family: elliptic, kind: bandstop, order: 4, corners: 338 Hz .. 11.1 kHz, ripple: 0.347 dB, attenuation: 42 dB, tolerance: { corner: 3.86 % } }';

const spec = (head: string): string => `bandkeep: 1
channels:
  x:
    ${head}
    wanted: { band: 803 Hz .. 1258 Hz, level: -6 dBFS }
    reference: 1030.5 Hz
    unwanted: { name: pump, tone: 8.3 kHz, level: -2 dBFS }
    rate: 7.28 kHz
    limits: { alias: -60 dBc }
`;

const stopGainDb = (frequencyHz: number, factor: number): number => {
  const filter = designFilter({
    ...{ family: 'elliptic', kind: 'bandstop', order: 4, cornerAt: 'half-power', rippleDb: 0.347, attenuationDb: 42, gain: 1 },
    corners: { low: 338 * factor, high: 11100 * factor },
  });
  return (20 / Math.LN10) * filterResponse(filter).logGain(frequencyHz);
};

const aliasOf = (head: string) => {
  const channel = read(spec(head)).entries[0]?.channel;
  assert.ok(channel);
  const { alias } = analyse(channel);
  assert.ok(alias);
  return alias;
};

describe('a landing against a tone that the parts silence', () => {
  it('is endlessly above it in capture, at the level that those parts leave', () => {
    const alias = aliasOf(`direction: capture\n    filter: ${stop}`);
    assert.equal(alias.relative, Infinity);
    assertWithin(alias.level ?? NaN, -2 + stopGainDb(8300, 1 + (alias.worstAt?.['stage 1, corner'] ?? 0)), 1e-3);
  });

  it('is so in relay behind the output filter, with the weight of its copy', () => {
    const alias = aliasOf(`direction: relay\n    gate: 40 %\n    output-filter: ${stop}`);
    assert.equal(alias.relative, Infinity);
    const corner = Object.values(alias.worstAt ?? {})[0] ?? 0;
    const weightDb = 20 * Math.log10(Math.sin(0.4 * Math.PI) / Math.PI);
    assertWithin(alias.level ?? NaN, -2 + weightDb + stopGainDb(8300 - 7280, 1 + corner), 1e-3);
  });
});
