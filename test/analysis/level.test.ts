/** The range of the wanted output's level, both ways, against closed forms. */
import assert from 'node:assert/strict';
import { analyse, type LimitFigure } from '../../src/analysis';
import type { Channel } from '../../src/spec/channel';
import { butterworthForm, capture, generate, plusMinus, rate, rectangleSeconds, stage, wanted } from '../support/channel-builder';
import { assertWithin, provedGapDb } from '../support/tolerance';

const dB = (gain: number): number => 20 * Math.log10(gain);
const sincDb = (x: number): number => dB(Math.sin(Math.PI * x) / (Math.PI * x));

function level(channel: Channel, lowDb: number, highDb: number): LimitFigure {
  const levelLimit = { lowDb, highDb, ref: 'R-9', margin: null };
  return analyse({ ...channel, levelLimit }).limits[0] ?? assert.fail('no limit');
}

describe('the level of the wanted output', () => {
  const player = generate({ wanted: [wanted(0, 20e3, -1)], rate: rate(48e3) });

  it('is held to the end of its range that it comes nearer to', () => {
    const weak = level(player, -4, 2);
    assert.deepEqual(
      [weak.limit, weak.ref, weak.unit, weak.sense, weak.at, weak.passes],
      ['level', 'R-9', 'dBFS', 'inside', -4, true],
    );
    assertWithin(weak.value ?? NaN, -1 + sincDb(20 / 48), provedGapDb);
    assertWithin(weak.margin ?? NaN, 3 + sincDb(20 / 48), provedGapDb);
    assert.deepEqual(weak.where, { frequency: 20e3 });
    const strong = level(player, -10, -1.2);
    assert.deepEqual([strong.at, strong.passes], [-1.2, false]);
    assertWithin(strong.margin ?? NaN, -0.2, provedGapDb);
    assert.deepEqual(strong.where, { frequency: 0 });
  });

  it('may be open to one side', () => {
    assert.equal(level(player, -Infinity, 0).at, 0);
    assert.equal(level(player, -6, Infinity).at, -6);
  });

  it('counts the tolerance of gains and of corners both ways', () => {
    const loose = stage(butterworthForm(1, 20e3), {
      label: 'filter',
      cornerTolerance: plusMinus(0.1),
      gainTolerance: plusMinus(0.05),
    });
    const channel = capture({ wanted: [wanted(0, 10e3, -6)], rate: rate(100e3), stages: [loose] });
    const strong = level(channel, -20, -6);
    assertWithin(strong.value ?? NaN, -6 + dB(1.05), provedGapDb);
    assertWithin(strong.nominal ?? NaN, -6, provedGapDb);
    const weak = level(channel, -7, 10);
    assertWithin(weak.value ?? NaN, -6 + dB(0.95) - 10 * Math.log10(1 + (10 / 18) ** 2), provedGapDb);
    assertWithin(weak.nominal ?? NaN, -6 - 10 * Math.log10(1 + (10 / 20) ** 2), provedGapDb);
    assert.deepEqual(weak.worstAt, { 'filter, corner': -0.1, 'filter, gain': -0.05 });
  });

  it('of a hold of fixed width rises and falls with the clock, of one that follows it only by its droop', () => {
    const fixed = generate({
      wanted: [wanted(0, 1e3)],
      rate: rate(100e3, { tolerance: plusMinus(0.1) }),
      pulse: rectangleSeconds(4e-6),
    });
    assertWithin(level(fixed, -100, -8).value ?? NaN, dB(0.44), provedGapDb);
    assert.deepEqual(level(fixed, -100, -8).worstAt, { rate: 0.1 });
    assertWithin(level(fixed, -9, 8).value ?? NaN, dB(0.36) + sincDb(0.004), provedGapDb);
    assert.deepEqual(level(fixed, -9, 8).worstAt, { rate: -0.1 });
    const following = generate({ wanted: [wanted(0, 20e3)], rate: rate(100e3, { tolerance: plusMinus(0.1) }) });
    assertWithin(level(following, -1, 8).value ?? NaN, sincDb(20 / 90), provedGapDb);
  });

  it('stated at the sampler is measured from the gain at the reference', () => {
    const parts = {
      wanted: [wanted(0, 10e3, -6)],
      rate: rate(100e3),
      stages: [stage(butterworthForm(1, 10e3))],
      referenceHz: 10e3,
    };
    assertWithin(level(capture(parts), -100, -7).value ?? NaN, -6, provedGapDb);
    assertWithin(level(capture({ ...parts, levelsAt: 'sampler' }), -100, -7).value ?? NaN, -6 + dB(Math.SQRT2), provedGapDb);
  });

  it('takes every wanted band at its own level', () => {
    const channel = capture({ wanted: [wanted(0, 1e3, -12), wanted(5e3, 6e3, -3)], rate: rate(50e3) });
    assert.equal(level(channel, -20, -2).value, -3);
    assert.equal(level(channel, -12.5, 20).value, -12);
  });
});
