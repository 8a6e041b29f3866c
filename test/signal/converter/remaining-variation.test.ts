/** What is left to vary, against sampled curves. */
import assert from 'node:assert/strict';
import { remainingVariation } from '../../../src/signal/converter/remaining-variation';
import { designFilter } from '../../../src/signal/families/design-filter';
import { realPole } from '../../../src/signal/families/real-pole';
import { secondOrder } from '../../../src/signal/families/second-order';
import { filterResponse, type Filter } from '../../../src/signal/filter';
import { assertClose } from '../../support/tolerance';

const ripples = designFilter({
  family: 'chebyshev',
  order: 5,
  kind: 'lowpass',
  corners: 100,
  cornerAt: 'ripple',
  rippleDb: 3,
  attenuationDb: null,
  gain: 1,
});

/** The sum of the steps of |H|² along a fine grid: never more than the variation. */
function sampled(filters: readonly Filter[], fromHz: number): number {
  const responses = filters.map(filterResponse);
  const power = (f: number): number => Math.exp(2 * responses.reduce((sum, one) => sum + one.logGain(f), 0));
  let [sum, before] = [0, power(fromHz)];
  for (let f = fromHz; f < 1e6; f = f * 1.0003 + 1e-3) {
    const now = power(f);
    sum += Math.abs(now - before);
    before = now;
  }
  return sum;
}

describe('remainingVariation', () => {
  it('is what a filter with known turning points varies by', () => {
    for (const from of [0, 50, 90, 300]) assertClose(remainingVariation([ripples], from), sampled([ripples], from), 1e-4);
  });

  it('is never less than the curve varies by, in series or with turns unknown', () => {
    const unknown = { ...ripples, turnsHz: null };
    for (const filters of [[ripples, realPole(30)], [unknown], [unknown, secondOrder('bandpass', 40, 5)]]) {
      for (const from of [0, 35, 99, 400]) assert.ok(remainingVariation(filters, from) >= sampled(filters, from));
    }
  });

  it('of nothing is nothing', () => {
    assert.equal(remainingVariation([], 10), 0);
  });
});
