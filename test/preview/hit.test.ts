/** Tests of what lies under the pointer. */
import assert from 'node:assert/strict';
import { toPixel } from '../../src/drawing/axis-scale';
import { frameOf } from '../../src/drawing/frame';
import { hitAt, paneAt } from '../../src/preview/hit';
import { samplePlot } from '../drawing/sample-plot';

const frame = frameOf(samplePlot, 700, () => null);
const at = (pane: string, frequencyHz: number, level: number): string | undefined => {
  const place = frame.panes.find(({ id }) => id === pane)!;
  return hitAt(samplePlot, frame, toPixel(place.x, frequencyHz), toPixel(place.y, level))?.item.id;
};

describe('hit', () => {
  it('finds a curve within a few pixels, before the fill it runs over', () => {
    assert.equal(at('input', 100_000, -80), 'hash');
    assert.equal(at('input', 100_000, -20), undefined);
  });

  it('finds a mark before the area it stands on', () => {
    assert.equal(at('output', 10_000, -88), 'landing');
    assert.equal(at('output', 20_000, -120), 'landing');
  });

  it('finds blocks and limits', () => {
    assert.equal(at('input', 1000, -50), 'wanted');
    assert.equal(at('output', 5000, -96), 'limit');
  });

  it('finds a ribbon between the panes', () => {
    const [above, below] = frame.panes;
    const x = toPixel(above!.x, 46_000);
    assert.equal(hitAt(samplePlot, frame, x, above!.box.bottom + 2)?.item.id, 'ribbon');
    assert.equal(hitAt(samplePlot, frame, 690, (above!.box.bottom + below!.box.top) / 2), null);
  });

  it('takes a height for the pane that stands there', () => {
    assert.equal(paneAt(frame, 5)?.id, 'input');
    assert.equal(paneAt(frame, frame.height - 60)?.id, 'output');
  });
});
