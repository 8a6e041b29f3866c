/** Corners at which a figure is worst. */
import assert from 'node:assert/strict';
import { channelPath } from '../../src/analysis';
import { atCorners, cornerSets } from '../../src/analysis/corners';
import { factorOf } from '../../src/analysis/stage-setting';
import { worstCorners } from '../../src/analysis/worst-corners';
import { butterworthForm, capture, chebyshevForm, plusMinus, rate, stage, wanted } from '../support/channel-builder';
import { assertWithin } from '../support/tolerance';

const loose = { cornerTolerance: plusMinus(0.1) };
const path = channelPath(
  capture({
    wanted: [wanted(0, 5e3)],
    rate: rate(50e3),
    stages: [
      stage(chebyshevForm(5, 10e3, 1, 'ripple'), loose),
      stage(butterworthForm(2, 20e3), loose),
      stage(butterworthForm(1, 90e3)),
    ],
  }),
);

describe('corners', () => {
  it('are nominal and every combination of the ends that vary', () => {
    assert.deepEqual(cornerSets(path), [
      [1, 1, 1],
      [0.9, 0.9, 1],
      [0.9, 1.1, 1],
      [1.1, 0.9, 1],
      [1.1, 1.1, 1],
    ]);
  });

  it('move together, and each by itself, where too many vary', () => {
    const stages = Array.from({ length: 9 }, () => stage(butterworthForm(1, 20e3), loose));
    assert.equal(cornerSets(channelPath(capture({ wanted: [wanted(0, 5e3)], rate: rate(50e3), stages }))).length, 1 + 2 + 9 * 2);
  });

  it('stretch the stages they belong to', () => {
    const moved = atCorners(path, [1.1, 1, 1]);
    const plain = path.stages[0]?.response.logGain(8e3 / 1.1) ?? NaN;
    assertWithin(moved.stages[0]?.response.logGain(8e3) ?? NaN, plain, 1e-12);
    assert.equal(atCorners(path, [1, 1, 1]), path);
  });

  it('are found inside the tolerance of a rippled stage', () => {
    const found = worstCorners(path, [], (corners) => {
      const [first = 1, second = 1] = corners.map(factorOf);
      return second - (first - 1.0371) ** 2;
    });
    assertWithin(factorOf(found[0] ?? NaN), 1.0371, 1e-3);
    assert.equal(found[1], 1.1);
  });

  it('include further sets', () => {
    const further = [0.97, 1.03, 1];
    assert.equal(
      worstCorners(path, [further], (corners) => (corners === further ? 1 : 0)),
      further,
    );
  });
});
