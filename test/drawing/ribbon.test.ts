/** Tests of the ribbons' geometry. */
import assert from 'node:assert/strict';
import { frameOf } from '../../src/drawing/frame';
import type { PaneFrame } from '../../src/drawing/frame';
import { toPixel } from '../../src/drawing/axis-scale';
import { onRibbon, ribbonSteps } from '../../src/drawing/ribbon';
import type { Ribbon } from '../../src/protocol/picture';
import { samplePlot } from './sample-plot';

const ribbon: Ribbon = {
  ...{ kind: 'ribbon', lowHz: 41_200, highHz: 51_200, landsPane: 'output', strength: 1 },
  ...{ landsLowHz: 0, landsHighHz: 10_000, inverted: true },
};

function panes(zoom: { readonly low: number; readonly high: number } | null): readonly [PaneFrame, PaneFrame] {
  const [above, below] = frameOf(samplePlot, 700, (pane) => (pane === 'input' ? { x: zoom, y: null, scale: null } : null)).panes;
  assert.ok(above !== undefined && below !== undefined);
  return [above, below];
}

describe('ribbon', () => {
  it('joins the exact stretch of the input with the exact stretch where it lands', () => {
    const [above, below] = panes(null);
    const [start, edge, end] = ribbonSteps({ ...ribbon, inverted: false }, above, below);
    assert.deepEqual(start, ['M', toPixel(above.x, 41_200), above.box.bottom]);
    assert.deepEqual(edge?.slice(5), [toPixel(below.x, 0), below.box.top]);
    assert.deepEqual(end, ['L', toPixel(below.x, 10_000), below.box.top]);
  });

  it('crosses its edges where the fold turns the stretch round', () => {
    const [above, below] = panes(null);
    const [, edge] = ribbonSteps(ribbon, above, below);
    assert.deepEqual(edge?.slice(5), [toPixel(below.x, 10_000), below.box.top]);
  });

  it('scales with zoom', () => {
    const [above, below] = panes({ low: 40_000, high: 60_000 });
    const [start] = ribbonSteps(ribbon, above, below);
    assert.deepEqual(start, ['M', toPixel(above.x, 41_200), above.box.bottom]);
  });

  it('is never thinner than can be seen', () => {
    const [above, below] = panes(null);
    const [start, , , back] = ribbonSteps({ ...ribbon, highHz: ribbon.lowHz, landsHighHz: 0, inverted: false }, above, below);
    assert.ok(start?.[0] === 'M' && back?.[0] === 'C' && back[5] - start[1] >= 2);
  });

  it('is hit between its edges and nowhere else', () => {
    const [above, below] = panes(null);
    const straight = { ...ribbon, inverted: false };
    const top = above.box.bottom + 1;
    assert.ok(onRibbon(straight, above, below, toPixel(above.x, 46_000), top));
    assert.ok(!onRibbon(straight, above, below, toPixel(above.x, 1000), top));
    assert.ok(onRibbon(straight, above, below, toPixel(below.x, 5000), below.box.top - 1));
    assert.ok(!onRibbon(straight, above, below, toPixel(below.x, 20_000), below.box.top - 1));
    assert.ok(!onRibbon(straight, above, below, toPixel(below.x, 5000), below.box.top + 1));
  });
});
