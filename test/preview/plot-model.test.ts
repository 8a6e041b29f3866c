/** Tests of how the reader's acts change what is shown. */
import assert from 'node:assert/strict';
import { toPixel } from '../../src/drawing/axis-scale';
import { frameOf } from '../../src/drawing/frame';
import {
  fittedState,
  isPartial,
  selectionOf,
  shownPlot,
  withToggled,
  withView,
  withWholeView,
} from '../../src/preview/plot-model';
import { freshPlot } from '../../src/preview/view-state';
import { framed, rescaled } from '../../src/preview/zoom';
import { samplePlot } from '../drawing/sample-plot';

const frame = frameOf(samplePlot, 700, () => null);
const output = frame.panes[1]!;

describe('plot model', () => {
  it('hides the items of a series and shows them again', () => {
    const hidden = withToggled(freshPlot, 'hash');
    assert.deepEqual(
      shownPlot(samplePlot, hidden).items.map(({ id }) => id),
      ['wanted', 'limit'],
    );
    assert.equal(shownPlot(samplePlot, withToggled(hidden, 'hash')), samplePlot);
  });

  it('takes a flat drag for a stretch of frequencies', () => {
    const box = {
      left: toPixel(output.x, 5000),
      right: toPixel(output.x, 10_000),
      top: output.box.top + 50,
      bottom: output.box.top + 60,
    };
    const selection = selectionOf(frame, box)!;
    assert.equal(selection.pane, 'output');
    assert.ok(Math.abs(selection.x.low - 5000) < 1e-6 && Math.abs(selection.x.high - 10_000) < 1e-6);
    assert.deepEqual([selection.y, selection.box.top, selection.box.bottom], [null, output.box.top, output.box.bottom]);
  });

  it('takes a tall drag for levels too', () => {
    const box = { left: 200, right: 300, top: toPixel(output.y, -20), bottom: toPixel(output.y, -120) };
    const y = selectionOf(frame, box)!.y!;
    assert.deepEqual([Math.round(y.low), Math.round(y.high)], [-120, -20]);
  });

  it('takes a drag that is hardly one for none', () => {
    assert.equal(selectionOf(frame, { left: 200, right: 203, top: 0, bottom: 50 }), null);
  });

  it('shows all again and keeps the chosen scale', () => {
    const linear = withView(samplePlot, freshPlot, 'input', (pane, view) => rescaled(pane, view, 'linear'));
    const near = withView(samplePlot, linear, 'input', (pane, view) => framed(pane, view, { low: 100, high: 200 }, null));
    assert.equal(isPartial(samplePlot, near), true);
    const whole = withWholeView(samplePlot, near);
    assert.equal(isPartial(samplePlot, whole), false);
    assert.equal(whole.panes['input']?.scale, 'linear');
  });

  it('changes nothing for a pane that is not there', () => {
    assert.equal(
      withView(samplePlot, freshPlot, 'gone', (_, view) => view),
      freshPlot,
    );
  });

  it('keeps zoom when newer data still reach it', () => {
    const near = withView(samplePlot, freshPlot, 'output', (pane, view) => framed(pane, view, { low: 1000, high: 2000 }, null));
    assert.deepEqual(fittedState(samplePlot, near).panes['output']?.x, { low: 1000, high: 2000 });
  });
});
