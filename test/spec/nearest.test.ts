/** Tests of finding the name that a misspelled one was meant to be. */
import assert from 'node:assert/strict';
import { nearest } from '../../src/spec/nearest';

const keys = ['wanted', 'unwanted', 'rate', 'rate-choices', 'filter', 'full-scale', 'levels-at', 'hold', 'bits'];

describe('the nearest name', () => {
  const meant: readonly [string, string | null][] = [
    ['wantd', 'wanted'],
    ['wnated', 'wanted'],
    ['Rate', 'rate'],
    ['fliter', 'filter'],
    ['fullscale', 'full-scale'],
    ['full_scale', 'full-scale'],
    ['level-at', 'levels-at'],
    ['rate-choice', 'rate-choices'],
    ['bit', 'bits'],
    ['sampling', null],
    ['x', null],
    ['', null],
  ];
  for (const [written, expected] of meant) {
    it(`takes "${written}" for ${expected ?? 'nothing known'}`, () => {
      assert.equal(nearest(written, keys), expected);
    });
  }

  it('prefers a name that differs only in case', () => {
    assert.equal(nearest('GUARD', ['guards', 'guard']), 'guard');
  });

  it('is not slow for long names among many', () => {
    const many = Array.from({ length: 2000 }, (_, index) => `channel-${index}`);
    assert.equal(nearest('x'.repeat(5000), many), null);
  });
});
