/** A path at the worst of its tolerances, against each stage at its own ends. */
import assert from 'node:assert/strict';
import { channelPath, worstPath } from '../../src/analysis';
import { onAxis } from '../../src/analysis/axis';
import type { Channel } from '../../src/spec/channel';
import { butterworthForm, capture, plusMinus, rate, rectangleShare, stage, wanted } from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';

const log = (db: number): number => (db * Math.LN10) / 20;
const butterworthDb = (order: number, u: number): number => -10 * Math.log10(1 + u ** (2 * order));

describe('a path at its worst', () => {
  const channel: Channel = capture({
    wanted: [wanted(0, 5e3)],
    rate: rate(50e3),
    stages: [
      stage(butterworthForm(2, 10e3), { label: 'first', cornerTolerance: plusMinus(0.1), gainTolerance: plusMinus(0.02) }),
      stage(butterworthForm(3, 20e3), { label: 'second', cornerTolerance: { low: -0.05, high: 0 } }),
    ],
  });
  const path = channelPath(channel);

  it('takes every stage at its own end', () => {
    const most = worstPath(path, { sense: 'largest', referenceHz: null, axis: 'hertz' });
    assertWithin(most.response.logGain(30e3), log(butterworthDb(2, 3 / 1.1) + butterworthDb(3, 1.5)) + Math.log(1.02), 1e-9);
    const least = worstPath(path, { sense: 'smallest', referenceHz: null, axis: 'hertz' });
    assertWithin(
      least.response.logGain(30e3),
      log(butterworthDb(2, 3 / 0.9) + butterworthDb(3, 1.5 / 0.95)) + Math.log(0.98),
      1e-9,
    );
  });

  it('says where it lies', () => {
    const most = worstPath(path, { sense: 'largest', referenceHz: null, axis: 'hertz' });
    assert.deepEqual(most.worstAt(30e3), { 'first, corner': 0.1, 'first, gain': 0.02, 'second, corner': 0 });
    const relative = worstPath(path, { sense: 'smallest', referenceHz: 0, axis: 'hertz' });
    assert.deepEqual(relative.worstAt(30e3), { 'first, corner': -0.1, 'second, corner': -0.05 });
  });

  it('measured from a reference has the same parts there', () => {
    const relative = worstPath(path, { sense: 'largest', referenceHz: 8e3, axis: 'hertz' });
    const expected = butterworthDb(2, 3 / 1.1) - butterworthDb(2, 0.8 / 1.1) + butterworthDb(3, 1.5) - butterworthDb(3, 0.4);
    assertWithin(relative.response.logGain(30e3), log(expected), 1e-6);
  });

  it('in periods stretches the stages by the clock and leaves the pulse', () => {
    const moving = capture({
      wanted: [wanted(0, 5e3)],
      rate: rate(50e3, { tolerance: plusMinus(0.01) }),
      pulse: rectangleShare(1),
      stages: [stage(butterworthForm(2, 10e3))],
    });
    const most = worstPath(channelPath(moving), { sense: 'largest', referenceHz: null, axis: 'periods' });
    assertWithin(
      most.response.logGain(30e3),
      log(butterworthDb(2, 3 * 0.99)) + Math.log(Math.sin(0.6 * Math.PI) / (0.6 * Math.PI)),
      1e-9,
    );
    assert.deepEqual(onAxis(moving, 'periods', { low: 99, high: 101 }), { low: 99 / 1.01, high: 101 / 0.99 });
  });

  it('is the path itself where nothing varies', () => {
    const still = channelPath(capture({ wanted: [wanted(0, 5e3)], rate: rate(50e3), stages: [stage(butterworthForm(2, 10e3))] }));
    const found = worstPath(still, { sense: 'largest', referenceHz: null, axis: 'hertz' });
    assert.equal(found.response, still.total);
    assert.equal(found.worstAt(1e3), null);
  });
});
