import assert from 'node:assert/strict';
import { decimalsFor, limitWords, worstCaseWords, worstWords } from '../../src/findings/wording';

describe('the words of findings', () => {
  it('show a margin with enough digits to be seen', () => {
    assert.deepEqual(
      [4.8, 0.05, 0.04, 0.004, 0].map((margin) => decimalsFor('alias', margin)),
      [1, 1, 2, 3, 3],
    );
    assert.equal(decimalsFor('flatness', 0.25), 2);
  });

  it('print a limit as it is stated', () => {
    assert.equal(limitWords({ at: -96, unit: 'dBFS' }), '−96 dBFS');
    assert.equal(limitWords({ at: 0.8, unit: 'dB' }), '0.8 dB');
  });

  it('leave out whose corner it is where only one varies', () => {
    assert.equal(worstWords({ 'pick-up guard, stage 2, corner': 0.04 }), 'corner +4 %');
    assert.equal(
      worstWords({ 'pick-up guard, stage 2, corner': -0.04, 'stage 3, corner': 0.02, 'board, frequency': -25e-6 }),
      'corner of `pick-up guard, stage 2` −4 %, corner of stage 3 +2 %, frequency of `board` −25 ppm',
    );
    assert.equal(worstWords({ 'board, frequency': 25e-6 }), 'frequency of `board` +25 ppm');
    assert.equal(worstWords({ rate: 1e-6 }), 'rate +1 ppm');
  });

  it('count what does not fit', () => {
    assert.match(
      worstWords({ 'a, gain': 0.1, 'b, gain': 0.1, 'c, gain': 0.1, 'd, gain': 0.1, 'e, gain': 0 }) ?? '',
      / and 1 more$/,
    );
  });

  it('are silent about a worst case where nothing varies', () => {
    const nominal = { nominal: -92.6, nominalPasses: false, decimals: 1 };
    assert.equal(worstCaseWords({ worstAt: null, ...nominal }), '');
    assert.equal(worstCaseWords({ worstAt: { rate: 0 }, ...nominal }), '');
    assert.equal(worstCaseWords({ worstAt: { rate: 0.01 }, ...nominal, nominal: null }), ' (worst case, rate +1 %)');
  });
});
