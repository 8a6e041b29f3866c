/** Headroom: amplitudes that may peak together. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import {
  anything,
  band,
  butterworthForm,
  capture,
  generate,
  limit,
  plusMinus,
  rate,
  stage,
  tone,
  wanted,
} from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';

const below = (...amplitudes: readonly number[]): number => -20 * Math.log10(amplitudes.reduce((sum, one) => sum + one, 0));

describe('headroom', () => {
  it('adds amplitudes of wanted bands and sources at the sampler, and leaves out anything', () => {
    const channel = capture({
      wanted: [wanted(0, 10e3, -6), wanted(12e3, 14e3, -20)],
      rate: rate(100e3),
      stages: [stage(butterworthForm(1, 50e3))],
      unwanted: [tone(50e3, -10), band(100e3, 1e6, -20), anything()],
    });
    const high = 1 / Math.sqrt(1 + (12 / 50) ** 2);
    const expected = below(10 ** (-6 / 20), 0.1 * high, 10 ** (-10 / 20) * Math.SQRT1_2, 0.1 / Math.sqrt(5));
    assertWithin(analyse(channel).headroom ?? NaN, expected, 1e-6);
  });

  it('is negative where the peaks clip', () => {
    const channel = capture({ wanted: [wanted(0, 10e3, -3)], rate: rate(100e3), unwanted: [tone(200e3, -3)] });
    assertWithin(analyse(channel).headroom ?? NaN, 3 - 20 * Math.log10(2), 1e-9);
  });

  it('of levels that hold at the sampler takes them as they are at the reference', () => {
    const channel = capture({
      wanted: [wanted(0, 10e3, -6)],
      rate: rate(100e3),
      levelsAt: 'sampler',
      referenceHz: 10e3,
      stages: [stage(butterworthForm(1, 10e3))],
    });
    assertWithin(analyse(channel).headroom ?? NaN, 6 - 10 * Math.log10(2), 1e-6);
  });

  it('shrinks with gains and tones that may deviate', () => {
    const channel = capture({
      wanted: [wanted(0, 10e3, -6)],
      rate: rate(100e3),
      stages: [stage(butterworthForm(1, 50e3), { label: 'amplifier', gainTolerance: plusMinus(0.05) })],
      unwanted: [tone(50e3, -10, { tolerance: plusMinus(0.1) })],
      limits: [limit('headroom', 0)],
    });
    const [found] = analyse(channel).limits;
    const [wantedPeak, tonePeak] = [10 ** (-6 / 20), 10 ** (-10 / 20)];
    assertWithin(found?.nominal ?? NaN, below(wantedPeak, tonePeak / Math.sqrt(2)), 1e-6);
    assertWithin(found?.value ?? NaN, below(1.05 * wantedPeak, (1.05 * tonePeak) / Math.sqrt(1 + 0.9 ** 2)), 1e-6);
    assert.deepEqual(found?.worstAt, { 'amplifier, gain': 0.05 });
  });

  it('of generate is that of the words', () => {
    const channel = generate({ wanted: [wanted(0, 10e3, -6), wanted(12e3, 14e3, -6)], rate: rate(100e3) });
    assertWithin(analyse(channel).headroom ?? NaN, 6 - 20 * Math.log10(2), 1e-9);
  });
});
