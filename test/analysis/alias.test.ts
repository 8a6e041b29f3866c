/** Aliases: which part of a source counts, at which frequency it is weighed, and what the tolerances do to it. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import type { Channel } from '../../src/spec/channel';
import {
  anything,
  band,
  butterworthForm,
  capture,
  limit,
  plusMinus,
  rate,
  rectangleShare,
  stage,
  tone,
  wanted,
} from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';

/** Gain of a Butterworth low-pass in dB, from its definition. */
function butterworthDb(order: number, u: number): number {
  return -10 * Math.log10(1 + u ** (2 * order));
}

const guarded = (parts: Partial<Channel>): Channel =>
  capture({ wanted: [wanted(0, 10e3)], rate: rate(50e3), stages: [stage(butterworthForm(4, 14e3))], ...parts });

describe('aliases', () => {
  it('are weighed by the aperture at the input frequency, not where they land', () => {
    // 1.0723 times the rate with an aperture as long as the period: 23.50 dB; the swapped rule would say 0.07 dB. Closed form, sinc(1.0723).
    const channel = capture({
      wanted: [wanted(0, 10e3)],
      rate: rate(100e3),
      pulse: rectangleShare(1),
      unwanted: [tone(107.23e3)],
    });
    assertWithin(analyse(channel).alias?.level ?? NaN, -23.5, 0.005);
  });

  it('of a band come from where the filter lets most through', () => {
    const { alias } = analyse(guarded({ unwanted: [band(30e3, 3e6, -55, 'drive hash')] }));
    assert.deepEqual([alias?.frequency, alias?.lands, alias?.fold, alias?.inverted], [40e3, 10e3, 1, true]);
    assertWithin(alias?.level ?? NaN, -55 + butterworthDb(4, 40 / 14), 0.001);
  });

  it('of a tone that lands outside are none', () => {
    const { alias, aliases, aliasSum } = analyse(guarded({ unwanted: [tone(65e3, -10)] }));
    assert.equal(alias, null);
    assert.equal(aliasSum, null);
    assert.deepEqual([aliases[0]?.frequency, aliases[0]?.level, aliases[0]?.margin], [null, null, null]);
  });

  it('leave out the part of a source inside the wanted band, which is reported once', () => {
    const figures = analyse(guarded({ unwanted: [band(8e3, 30e3, -20)] }));
    assert.equal(figures.alias, null);
    assert.deepEqual(figures.overlaps, [{ index: 0, harmonic: 1, lowHz: 8e3, highHz: 10e3 }]);
  });

  it('do not come from a source that only touches the wanted band, and that is no overlap', () => {
    const figures = analyse(guarded({ unwanted: [band(10e3, 30e3, -20), tone(10e3, -20)] }));
    assert.deepEqual([figures.alias, figures.overlaps], [null, []]);
  });

  it('come from next to the wanted band where the protected range is wider', () => {
    const figures = analyse(guarded({ unwanted: [band(10e3, 30e3, -20)], protect: [{ lowHz: 0, highHz: 12e3 }] }));
    assert.equal(figures.alias?.fold, 0);
    assertWithin(figures.alias.level ?? NaN, -20 + butterworthDb(4, 10 / 14), 0.001);
  });

  it('reach a band in zone 3 from low frequencies', () => {
    const channel = capture({ wanted: [wanted(65e6, 75e6)], rate: rate(52e6), unwanted: [tone(18e6, -30)] });
    assert.deepEqual(
      [analyse(channel).alias?.lands, analyse(channel).alias?.fold, analyse(channel).alias?.level],
      [18e6, 0, -30],
    );
  });

  it('of anything come from the mirror beside a band that touches half the rate', () => {
    const channel = guarded({ wanted: [wanted(1e3, 25e3)], unwanted: [anything()] });
    const { alias } = analyse(channel);
    assertWithin(alias?.frequency ?? NaN, 25e3, 1e-3);
    assertWithin(alias?.level ?? NaN, butterworthDb(4, 25 / 14), 0.001);
  });

  it('are approached at infinity where nothing holds them back', () => {
    const flat = capture({ wanted: [wanted(0, 10e3)], rate: rate(50e3), unwanted: [band(1e6, Infinity, -40)] });
    assertWithin(analyse(flat).alias?.level ?? NaN, -40, 0.001);
  });

  it('are worst at the highest corner, and say so', () => {
    const stages = [stage(butterworthForm(4, 14e3), { label: 'guard', cornerTolerance: plusMinus(0.04) })];
    const { alias } = analyse(guarded({ stages, unwanted: [band(30e3, 3e6, -55)] }));
    assertWithin(alias?.level ?? NaN, -55 + butterworthDb(4, 40 / 14 / 1.04), 0.001);
    assertWithin(alias?.nominal ?? NaN, -55 + butterworthDb(4, 40 / 14), 0.001);
    assert.deepEqual(alias?.worstAt, { 'guard, corner': 0.04 });
  });

  it('are raised by a gain that may be high, but not against the wanted tone, which is raised too', () => {
    const stages = [stage(butterworthForm(4, 14e3), { label: 'guard', gainTolerance: plusMinus(0.1) })];
    const channel = guarded({ stages, unwanted: [tone(42e3, -10)] });
    const { alias } = analyse(channel);
    assertWithin((alias?.level ?? NaN) - (alias?.nominal ?? NaN), 20 * Math.log10(1.1), 1e-9);
    assert.deepEqual(alias?.worstAt, { 'guard, gain': 0.1 });
    assertWithin(alias.relative ?? NaN, -10 + butterworthDb(4, 42 / 14), 1e-6);
    const dbc = analyse({ ...channel, limits: [limit('alias', -40, { unit: 'dBc' })] });
    assertWithin(dbc.limits[0]?.value ?? NaN, -10 + butterworthDb(4, 42 / 14), 1e-6);
  });

  it('against the wanted tone take the weakest wanted level', () => {
    const channel = guarded({
      wanted: [wanted(0, 10e3, -6), wanted(14e3, 16e3, -20)],
      unwanted: [tone(42e3, -10)],
      limits: [limit('alias', -40, { unit: 'dBc' })],
    });
    assertWithin(analyse(channel).limits[0]?.value ?? NaN, -10 + butterworthDb(4, 42 / 14) + 20, 1e-6);
  });

  it('of levels that hold at the sampler are first divided by the gain at the reference', () => {
    const channel = guarded({ levelsAt: 'sampler', referenceHz: 10e3, unwanted: [tone(42e3, -10)] });
    const expected = -10 + butterworthDb(4, 42 / 14) - butterworthDb(4, 10 / 14);
    assertWithin(analyse(channel).alias?.level ?? NaN, expected, 1e-6);
    assertWithin(analyse(channel).alias?.relative ?? NaN, expected, 1e-6);
  });

  it('of a tone that may move come from where it reaches the protected range', () => {
    const channel = guarded({ unwanted: [tone(62e3, -10, { name: 'switcher', tolerance: plusMinus(0.05) })] });
    const { alias } = analyse(channel);
    assert.equal(alias?.nominal, null);
    assert.deepEqual(alias.worstAt, { 'switcher, frequency': -0.05 });
    assertWithin(alias.frequency ?? NaN, 58.9e3, 1e-6);
    assertWithin(alias.lands ?? NaN, 8.9e3, 1e-6);
  });

  it('of a tone that lands only at one end of the clock say which', () => {
    const channel = guarded({
      rate: rate(50e3, { tolerance: plusMinus(0.001), clock: 'board' }),
      unwanted: [tone(60.02e3, -10)],
    });
    const { alias } = analyse(channel);
    assert.deepEqual([alias?.nominal, alias?.frequency], [null, 60.02e3]);
    const moved = alias?.worstAt?.['board, frequency'] ?? NaN;
    assert.ok(moved >= 0.0004 - 1e-9 && moved <= 0.001, String(moved));
  });

  it('of several sources are listed one by one and added as powers', () => {
    const figures = analyse(guarded({ stages: [], unwanted: [tone(42e3, -50, { name: 'a' }), tone(45e3, -50, { name: 'b' })] }));
    assert.deepEqual(
      figures.aliases.map((alias) => alias.source),
      ['a', 'b'],
    );
    assertWithin(figures.aliasSum ?? NaN, -50 + 10 * Math.log10(2), 1e-9);
  });

  it('do not exist in generate', () => {
    const figures = analyse({ ...guarded({ unwanted: [tone(42e3)] }), direction: 'generate' });
    assert.deepEqual([figures.alias, figures.aliases, figures.overlaps], [null, [], []]);
  });
});
