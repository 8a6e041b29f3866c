/** Tests of zoom and pan: anchored to data, never beyond it. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import type { PaneView } from '../../src/drawing/frame';
import { framed, isZoomed, panned, rangeInView, refitted, rescaled, wholePane, zoomed } from '../../src/preview/zoom';
import { samplePlot } from '../drawing/sample-plot';

const [log, linear] = samplePlot.panes as [(typeof samplePlot.panes)[0], (typeof samplePlot.panes)[0]];

const near = (actual: number, expected: number): void => {
  assert.ok(Math.abs(actual / expected - 1) < 1e-9, `${actual} is not ${expected}`);
};

describe('zoom', () => {
  it('keeps the value under the pointer in its place, on either scale', () => {
    const view = zoomed(linear, wholePane, 2, 6400);
    assert.deepEqual(view.x, { low: 3200, high: 16_000 });
    const { low, high } = rangeInView(log, zoomed(log, wholePane, 5, 1000));
    near(Math.log(1000 / low) / Math.log(high / low), Math.log(1000 / 10) / Math.log(1e6 / 10));
  });

  it('gives back the whole once it is zoomed out as far', () => {
    const back = zoomed(linear, zoomed(linear, wholePane, 4, 12_800), 1 / 4, 12_800);
    assert.equal(isZoomed(back), false);
  });

  it('never shows what lies beyond the axis, nor nothing at all', () => {
    const acts = fc.array(
      fc.record({
        factor: fc.double({ min: 0.05, max: 200, noNaN: true }),
        at: fc.double({ min: 0, max: 1e6, noNaN: true }),
        pan: fc.double({ min: -2, max: 2, noNaN: true }),
      }),
      { maxLength: 20 },
    );
    const property = fc.property(acts, fc.constantFrom(log, linear), (list, pane) => {
      const view = list.reduce<PaneView>(
        (seen, { factor, at, pan }) => panned(pane, zoomed(pane, seen, factor, at), pan),
        wholePane,
      );
      const { low, high } = rangeInView(pane, view);
      const least = pane === log ? pane.x.logLowHz : pane.x.lowHz;
      return low >= least * (1 - 1e-9) && high <= pane.x.highHz * (1 + 1e-9) && low < high;
    });
    fc.assert(property, { seed: 7, numRuns: 200 });
  });

  it('moves by a share of what is in view and stops at the end without changing its width', () => {
    const view = framed(linear, wholePane, { low: 1000, high: 2000 }, null);
    assert.deepEqual(panned(linear, view, 0.5).x, { low: 1500, high: 2500 });
    assert.deepEqual(panned(linear, view, -5).x, { low: 0, high: 1000 });
  });

  it('frames levels only where they were chosen', () => {
    assert.equal(framed(linear, wholePane, { low: 1, high: 2 }, null).y, null);
    assert.deepEqual(framed(linear, wholePane, { low: 0, high: 100 }, { low: -500, high: -50 }).y, { low: -140, high: -50 });
  });

  it('keeps the stretch when the scale changes', () => {
    const view = framed(log, wholePane, { low: 1000, high: 2000 }, null);
    const other = rescaled(log, view, 'linear');
    assert.deepEqual([other.scale, other.x], ['linear', { low: 1000, high: 2000 }]);
    assert.equal(rescaled(log, other, 'log').scale, null);
  });

  it('lets go of a stretch that newer data no longer reach, and keeps any other', () => {
    const view = framed(linear, wholePane, { low: 20_000, high: 25_000 }, null);
    const slower = { ...linear, x: { ...linear.x, highHz: 16_000 } };
    const faster = { ...linear, x: { ...linear.x, highHz: 32_000 } };
    assert.equal(refitted(slower, view).x, null);
    assert.deepEqual(refitted(faster, view).x, { low: 20_000, high: 25_000 });
  });
});
