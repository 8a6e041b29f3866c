/** Group delay and its spread, against numerically differentiated phase. */
import assert from 'node:assert/strict';
import { analyse, channelPath, pathPhaseRad } from '../../src/analysis';
import {
  butterworthForm,
  capture,
  chebyshevForm,
  plusMinus,
  rate,
  rectangleSeconds,
  stage,
  wanted,
} from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';
import type { Channel } from '../../src/spec/channel';

/** Largest minus smallest of −dφ/dω on a grid over the band, by central differences. */
function spreadOnGrid(channel: Channel, lowHz: number, highHz: number): number {
  const path = channelPath(channel);
  const delays = Array.from({ length: 2001 }, (_, index) => {
    const f = lowHz + ((highHz - lowHz) * index) / 2000;
    const phase = (at: number): number => pathPhaseRad(path, at) ?? NaN;
    return -(phase(f + 0.5) - phase(f - 0.5)) / (2 * Math.PI);
  });
  return Math.max(...delays) - Math.min(...delays);
}

describe('delay', () => {
  const parts = { wanted: [wanted(10, 10e3)], rate: rate(51200) };

  it('spreads over the wanted band as its phase bends', () => {
    for (const form of [butterworthForm(4, 14e3), chebyshevForm(6, 11e3, 1, 'ripple')]) {
      const channel = capture({ ...parts, stages: [stage(form)] });
      assertWithin(analyse(channel).delaySpread ?? NaN, spreadOnGrid(channel, 10, 10e3), 2e-8);
    }
  });

  it('spreads most at the end of a corner', () => {
    const channel = capture({ ...parts, stages: [stage(butterworthForm(4, 14e3), { cornerTolerance: plusMinus(0.04) })] });
    const low = capture({ ...parts, stages: [stage(butterworthForm(4, 0.96 * 14e3))] });
    assertWithin(analyse(channel).delaySpread ?? NaN, analyse(low).delaySpread ?? NaN, 1e-9);
    assert.equal(analyse(channel).delay, analyse(capture({ ...parts, stages: [stage(butterworthForm(4, 14e3))] })).delay);
  });

  it('of a pulse alone is half its width and does not spread', () => {
    const figures = analyse(capture({ ...parts, pulse: rectangleSeconds(3e-6) }));
    assert.deepEqual([figures.delay, figures.delaySpread], [1.5e-6, 0]);
  });

  it('of many stages that vary moves them together', () => {
    const loose = (index: number) => stage(butterworthForm(1, 20e3 + 1e3 * index), { cornerTolerance: plusMinus(0.05) });
    const many = capture({ ...parts, stages: Array.from({ length: 8 }, (_, index) => loose(index)) });
    const still = capture({ ...parts, stages: many.stages.map((one) => stage(one.form)) });
    assert.ok((analyse(many).delaySpread ?? 0) > (analyse(still).delaySpread ?? 0));
  });
});
