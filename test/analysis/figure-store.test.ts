/** Figures are computed once for each channel object. */
import assert from 'node:assert/strict';
import { createFigureStore } from '../../src/analysis';
import { capture, rate, wanted } from '../support/channel-builder';

describe('a figure store', () => {
  it('analyses a channel object once and counts it', () => {
    const store = createFigureStore();
    const channel = capture({ wanted: [wanted(0, 1e3)], rate: rate(4e3) });
    assert.equal(store.figuresOf(channel), store.figuresOf(channel));
    assert.equal(store.analysed, 1);
    store.figuresOf({ ...channel });
    assert.equal(store.analysed, 2);
  });

  it('shares nothing with another', () => {
    const channel = capture({ wanted: [wanted(0, 1e3)], rate: rate(4e3) });
    createFigureStore().figuresOf(channel);
    const other = createFigureStore();
    assert.equal(other.analysed, 0);
  });
});
