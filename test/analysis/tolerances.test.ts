/** How deviations are named and written. */
import assert from 'node:assert/strict';
import { deviation, joinWorst, rateLabel } from '../../src/analysis/tolerances';
import { plusMinus, rate } from '../support/channel-builder';

describe('deviations', () => {
  it('are the written end where that is reached, and nothing but digits that matter between', () => {
    assert.equal(deviation(1.04, plusMinus(0.04)), 0.04);
    assert.equal(deviation(1 - 0.0001, plusMinus(0.0001)), -0.0001);
    assert.equal(deviation(1, plusMinus(0.04)), 0);
    assert.equal(deviation(1.0123456789, plusMinus(0.04)), 0.0123457);
  });

  it('of several parts join into one, or into none', () => {
    assert.deepEqual(joinWorst({ a: 1 }, null, { b: 2 }), { a: 1, b: 2 });
    assert.equal(joinWorst(null, {}), null);
  });

  it('of the rate carry the clock, where there is one', () => {
    assert.deepEqual([rateLabel(rate(1e3)), rateLabel(rate(1e3, { clock: 'board' }))], ['rate', 'board, frequency']);
  });
});
