/** The path as others use it: pulse, stages and total at any frequency, delay, half power, nulls. */
import assert from 'node:assert/strict';
import {
  channelPath,
  gainDb,
  halfPowerPoints,
  lossDb,
  pathDelay,
  pathPhaseRad,
  pulseNulls,
  pulseSeconds,
  relativeTo,
} from '../../src/analysis';
import { constantResponse } from '../../src/signal/response-algebra';
import {
  butterworthForm,
  capture,
  chebyshevForm,
  generate,
  rate,
  rectangleSeconds,
  rectangleShare,
  stage,
  wanted,
} from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';

const parts = { wanted: [wanted(0, 20e3)], rate: rate(48e3) };

describe('a path', () => {
  it('of a zero-order hold loses 3.92 dB at half the rate', () => {
    // sinc(1/2) = 2/π, −3.9224 dB (any textbook).
    assertWithin(gainDb(channelPath(generate(parts)).pulse, 24e3), -3.9224, 1e-4);
  });

  it('of a half-width pulse starts 6.02 dB down in generate and at 0 dB in capture', () => {
    const half = { ...parts, pulse: rectangleShare(0.5) };
    assertWithin(gainDb(channelPath(generate(half)).pulse, 0), -6.0206, 1e-4);
    assert.equal(gainDb(channelPath(capture(half)).pulse, 0), 0);
  });

  it('multiplies its stages and its pulse', () => {
    const channel = capture({
      ...parts,
      pulse: rectangleSeconds(5e-6),
      stages: [stage(butterworthForm(2, 10e3)), stage({ kind: 'rc', ohm: 1e3, farad: 1e-8 })],
    });
    const path = channelPath(channel);
    const rcCorner = 1 / (2 * Math.PI * 1e-5);
    const expected =
      -10 * Math.log10(2) -
      10 * Math.log10(1 + (10e3 / rcCorner) ** 2) +
      20 * Math.log10(Math.sin(0.05 * Math.PI) / (0.05 * Math.PI));
    assertWithin(gainDb(path.total, 10e3), expected, 1e-9);
    assertWithin(gainDb(path.analogue, 10e3) + gainDb(path.pulse, 10e3), expected, 1e-9);
    assertWithin(lossDb(path.total, 10e3, 0), -expected, 1e-9);
    assert.equal(path.stages.length, 2);
  });

  it('is flat where there is nothing', () => {
    assert.equal(channelPath(capture(parts)).total.logGain(1e9), 0);
  });

  it('delays by its stages and half its pulse', () => {
    const path = channelPath(
      capture({ ...parts, pulse: rectangleSeconds(4e-6), stages: [stage({ kind: 'bandwidth', cornerHz: 1e3 })] }),
    );
    assertWithin(pathDelay(path, 0) ?? NaN, 1 / (2 * Math.PI * 1e3) + 2e-6, 1e-12);
    assertWithin(pathPhaseRad(path, 1e3) ?? NaN, -Math.PI / 4, 1e-12);
  });

  it('follows another rate where its pulse does', () => {
    const channel = generate(parts);
    assertWithin(gainDb(channelPath(channel, 96e3).pulse, 48e3), -3.9224, 1e-4);
  });

  it('has its half-power point where a filter says', () => {
    const path = channelPath(capture({ ...parts, stages: [stage(butterworthForm(5, 12e3))] }));
    assertWithin(halfPowerPoints(path.total)[0] ?? NaN, 12e3, 1e-3);
    const rippled = channelPath(capture({ ...parts, stages: [stage(chebyshevForm(6, 12e3, 1))] }));
    assertWithin(halfPowerPoints(rippled.total)[0] ?? NaN, 12e3, 1e-3);
    // A zero-order hold: 0.44294647 of the rate (closed form).
    assertWithin(halfPowerPoints(channelPath(generate(parts)).total)[0] ?? NaN, 0.44294647 * 48e3, 1e-2);
    assert.deepEqual(halfPowerPoints(constantResponse(0)), []);
  });

  it('can be measured from a frequency, unless nothing comes through there', () => {
    const { total } = channelPath(generate(parts));
    assert.equal(relativeTo(total, 10e3).logGain(10e3), 0);
    assert.equal(relativeTo(total, 48e3), total);
  });
});

describe('a pulse', () => {
  it('lasts a time or a share of the period', () => {
    assert.deepEqual(
      [pulseSeconds({ shape: 'instant' }, 100), pulseSeconds(rectangleShare(0.5), 100), pulseSeconds(rectangleSeconds(1), 100)],
      [0, 0.005, 1],
    );
  });

  it('has its nulls at multiples of one over its width', () => {
    assert.deepEqual(pulseNulls(rectangleShare(0.5), 100, 3), [200, 400, 600]);
    assert.deepEqual(pulseNulls({ shape: 'instant' }, 100, 3), []);
  });
});
