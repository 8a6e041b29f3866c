/** Tests of label placement: labels never collide. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { placeLabels } from '../../src/drawing/label-placement';
import type { LabelRequest, Paper } from '../../src/drawing/label-placement';
import { overlap } from '../../src/drawing/primitive';

const bounds = { left: 0, top: 0, right: 600, bottom: 200 };
const paper: Paper = { widthOf: (text) => text.length * 7, lineHeight: 16, inkUnder: () => 0, taken: [] };
const request = (parts: Partial<LabelRequest>): LabelRequest => ({
  ...{ key: 'a', text: 'a label', x: 300, y: 100, prefer: 'above', priority: 1, bounds },
  ...parts,
});

describe('label placement', () => {
  it('puts a lone label on the side it prefers', () => {
    const [above] = placeLabels([request({})], paper);
    const [right] = placeLabels([request({ prefer: 'right' })], paper);
    assert.ok(above !== undefined && above.box.bottom <= 100);
    assert.ok(right !== undefined && right.box.left >= 300);
  });

  it('never lets two labels overlap, nor one leave its bounds', () => {
    const point = fc.record({
      x: fc.integer({ min: 0, max: 600 }),
      y: fc.integer({ min: 0, max: 200 }),
      length: fc.integer({ min: 1, max: 30 }),
    });
    const property = fc.property(fc.array(point, { maxLength: 25 }), (points) => {
      const requests = points.map(({ x, y, length }, index) =>
        request({ key: `${index}`, text: 'x'.repeat(length), x, y, priority: index % 5 }),
      );
      const boxes = placeLabels(requests, paper).map(({ box }) => box);
      const inside = boxes.every((box) => box.left >= 0 && box.right <= 600 && box.top >= 0 && box.bottom <= 200);
      return inside && boxes.every((box, index) => boxes.slice(index + 1).every((other) => !overlap(box, other)));
    });
    fc.assert(property, { seed: 96, numRuns: 60 });
  });

  it('gives the more important of two labels on one point the better place', () => {
    const placed = placeLabels([request({ key: 'minor', priority: 1 }), request({ key: 'major', priority: 9 })], paper);
    const major = placed.find(({ key }) => key === 'major');
    assert.ok(major !== undefined && major.box.bottom > 85 && major.box.bottom <= 100);
  });

  it('keeps off ink where there is room beside it', () => {
    const inked = { ...paper, inkUnder: (box: { readonly bottom: number }) => (box.bottom <= 100 ? 40 : 0) };
    const [placed] = placeLabels([request({})], inked);
    assert.ok(placed !== undefined && placed.box.bottom > 100);
  });

  it('leaves a label out that is wider than its bounds', () => {
    assert.deepEqual(placeLabels([request({ text: 'x'.repeat(100) })], paper), []);
  });

  it('keeps off boxes that are taken', () => {
    const mark = { left: 250, right: 350, top: 60, bottom: 100 };
    const [placed] = placeLabels([request({})], { ...paper, taken: [mark] });
    assert.ok(placed !== undefined && !overlap(placed.box, mark));
  });
});
