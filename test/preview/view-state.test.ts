/** Tests of what the page remembers. */
import assert from 'node:assert/strict';
import { freshPanel, freshPlot, mostPlots, plotKey, readPanelState, withPlot } from '../../src/preview/view-state';
import type { PanelState } from '../../src/preview/view-state';

describe('view state', () => {
  it('survives the way through the workbench', () => {
    const zoomed = {
      ...freshPlot,
      panes: { input: { x: { low: 1, high: 2 }, y: null, scale: 'log' as const } },
      hidden: ['noise'],
    };
    const state: PanelState = { ...freshPanel, uri: 'file:///a', channel: 'x', pinned: true, folded: ['path'], scroll: 120 };
    const kept = withPlot(state, plotKey('x', 'sampling'), zoomed);
    assert.deepEqual(readPanelState(JSON.parse(JSON.stringify(kept))), kept);
  });

  it('starts afresh from what it cannot understand', () => {
    for (const odd of [undefined, null, 7, [], 'state', { plots: 3, folded: 'path', scroll: Infinity, pinned: 'yes' }]) {
      assert.deepEqual(readPanelState(odd), freshPanel);
    }
  });

  it('drops a range that is none', () => {
    const odd = { plots: { a: { panes: { input: { x: { low: 5, high: 1 }, y: 'all', scale: 'cubic' } } } } };
    assert.deepEqual(readPanelState(odd).plots['a']?.panes['input'], { x: null, y: null, scale: null });
  });

  it('forgets the oldest plots, so that it never grows without end', () => {
    const many = Array.from({ length: mostPlots + 10 }, (_, index) => `channel ${index}`);
    const state = many.reduce((kept, name) => withPlot(kept, plotKey(name, 'sampling'), freshPlot), freshPanel);
    assert.equal(Object.keys(state.plots).length, mostPlots);
    assert.ok(plotKey(`channel ${mostPlots + 9}`, 'sampling') in state.plots);
    assert.ok(!(plotKey('channel 0', 'sampling') in state.plots));
  });
});
