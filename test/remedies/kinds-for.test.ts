import assert from 'node:assert/strict';
import { kindsFor } from '../../src/remedies/kinds-for';
import type { Finding } from '../../src/findings';
import { generate, rate, wanted } from '../support/channel-builder';
import { bearing } from '../support/found';

const finding = (code: Finding['code'], limit: string | null): Finding => ({
  code,
  limit,
  severity: 'warning',
  channel: 'bearing-x',
  ref: null,
  message: '',
  at: { place: { channel: 'bearing-x', path: [] } },
  related: [],
  figures: null,
  accepted: null,
});

const all = ['rate', 'pulse', 'corner', 'part', 'order', 'family'];

describe('the kinds of change to try', () => {
  it('are those of the code', () => {
    assert.deepEqual(kindsFor(finding('alias-over-limit', 'alias'), bearing()), all);
    assert.deepEqual(kindsFor(finding('wanted-folds', null), bearing()), ['rate']);
  });

  it('are for a thin margin those that cure its limit', () => {
    assert.deepEqual(kindsFor(finding('thin-margin', 'headroom'), bearing()), ['corner', 'part', 'order', 'family']);
  });

  it('are none for the headroom of words, which no filter behind them changes', () => {
    const sounder = generate({ wanted: [wanted(100, 2000)], rate: rate(16e3) });
    assert.deepEqual(kindsFor(finding('headroom-short', 'headroom'), sounder), []);
    assert.deepEqual(kindsFor(finding('image-over-limit', 'image'), sounder), all);
  });
});
