/** Flatness and droop. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import type { LimitFigure } from '../../src/analysis';
import type { Channel } from '../../src/spec/channel';
import {
  butterworthForm,
  capture,
  chebyshevForm,
  generate,
  limit,
  plusMinus,
  rate,
  rectangleShare,
  stage,
  wanted,
} from '../support/channel-builder';
import { assertWithin, provedGapDb } from '../support/tolerance';

function flatness(channel: Channel): LimitFigure | undefined {
  return analyse({ ...channel, limits: [limit('flatness', 1)] }).limits[0];
}

describe('flatness', () => {
  it('of an even-order Chebyshev filter shows the ripple above its valley at 0 Hz', () => {
    const channel = capture({
      wanted: [wanted(0, 9e3)],
      rate: rate(96e3),
      stages: [stage(chebyshevForm(4, 10e3, 0.5, 'ripple'))],
    });
    const found = flatness(channel);
    assertWithin(found?.value ?? NaN, 0.5, provedGapDb);
    const peak = 10e3 * Math.cos((3 * Math.PI) / 8);
    assert.ok(Math.abs((found?.where?.frequency ?? NaN) - peak) < 300, 'the first ripple peak, cos 3π/8 of the corner');
    assert.ok((analyse(channel).droop ?? NaN) < 0, 'a gain at the top edge counts as negative droop');
  });

  it('of a hold alone is its droop at the top edge', () => {
    // sinc(20/48): 2.6399 dB (closed form).
    const channel = generate({ wanted: [wanted(0, 20e3)], rate: rate(48e3) });
    assertWithin(flatness(channel)?.value ?? NaN, 2.6399, 1e-3);
    assertWithin(analyse(channel).droop ?? NaN, 2.6399, 1e-4);
  });

  it('is measured with the same parts at the reference, so that a gain does not count', () => {
    const parts = { wanted: [wanted(100, 9e3)], rate: rate(96e3) };
    const plain = flatness(capture({ ...parts, stages: [stage(butterworthForm(2, 12e3))] }));
    const loose = flatness(capture({ ...parts, stages: [stage(butterworthForm(2, 12e3), { gainTolerance: plusMinus(0.1) })] }));
    assertWithin(loose?.value ?? NaN, plain?.value ?? NaN, 1e-9);
  });

  it('is worst at the lowest corner of a filter that only falls', () => {
    const channel = capture({
      wanted: [wanted(0, 9e3)],
      rate: rate(96e3),
      stages: [stage(butterworthForm(2, 12e3), { label: 'filter', cornerTolerance: plusMinus(0.05) })],
    });
    const found = flatness(channel);
    assertWithin(found?.value ?? NaN, 10 * Math.log10(1 + (9 / 12 / 0.95) ** 4), provedGapDb);
    assertWithin(found?.nominal ?? NaN, 10 * Math.log10(1 + (9 / 12) ** 4), provedGapDb);
    assert.deepEqual(found?.worstAt, { 'filter, corner': -0.05 });
    assert.equal(found.where?.frequency, 9e3);
  });

  it('of an averaging aperture moves with the clock', () => {
    const channel = capture({
      wanted: [wanted(0, 9e3)],
      rate: rate(20e3, { tolerance: plusMinus(0.01) }),
      pulse: rectangleShare(1),
    });
    const x = (9 / 20 / 0.99) * Math.PI;
    assertWithin(flatness(channel)?.value ?? NaN, -20 * Math.log10(Math.sin(x) / x), provedGapDb);
    assert.deepEqual(flatness(channel)?.worstAt, { rate: -0.01 });
  });

  it('from a reference that nothing comes through at has no end', () => {
    const channel = capture({
      wanted: [wanted(40, 60)],
      rate: rate(1000),
      referenceHz: 50,
      pulse: { shape: 'rectangle', width: { seconds: 0.02 } },
    });
    const found = flatness(channel);
    assert.deepEqual([found?.value, found?.margin, found?.passes, found?.where], [Infinity, -Infinity, false, { frequency: 40 }]);
  });

  it('covers every wanted band from one reference', () => {
    const channel = capture({
      wanted: [wanted(0, 1e3), wanted(8e3, 9e3)],
      rate: rate(96e3),
      stages: [stage(butterworthForm(1, 9e3))],
    });
    assertWithin(flatness(channel)?.value ?? NaN, 10 * Math.log10(2), provedGapDb);
  });
});
