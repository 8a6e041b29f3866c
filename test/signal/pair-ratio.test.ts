/** Ratios of a part to itself at two frequencies: the largest of several, and measured from one. */
import assert from 'node:assert/strict';
import { FactorRatio } from '../../src/signal/factor-ratio';
import { secondOrder } from '../../src/signal/families/second-order';
import { filterResponse } from '../../src/signal/filter';
import { largestRatio, measuredFrom } from '../../src/signal/pair-ratio';
import { stretchedRatio } from '../../src/signal/stretched';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertWithin } from '../support/tolerance';

const sharp = filterResponse(secondOrder('lowpass', 1000, 3));
const broad = filterResponse(secondOrder('lowpass', 1000, 0.6));
const factors = { low: 0.9, high: 1.1 };
const members = [new FactorRatio(sharp, factors), new FactorRatio(broad, factors)];

describe('the largest of several ratios', () => {
  it('is that of the one that has it', () => {
    const both = largestRatio(members);
    for (const [f, r] of [
      [900, 100],
      [3000, 100],
      [3000, 1000],
      [200, 1000],
    ] as const) {
      assert.equal(both.at(f, r).logGain, Math.max(...members.map((one) => one.at(f, r).logGain)));
    }
  });

  it('encloses its values and slopes', () => {
    for (const sense of ['largest', 'smallest'] as const) {
      assertBoundsEnclose(measuredFrom(largestRatio(members), 700, sense), 1000, 93);
      assertSlopeEncloses(measuredFrom(largestRatio(members), 700, sense), 1000, 94);
    }
  });

  it('refuses to be made of nothing', () => {
    assert.throws(() => largestRatio([]), RangeError);
  });
});

describe('a ratio measured from one frequency', () => {
  it('is the stretched ratio in both senses', () => {
    for (const sense of ['largest', 'smallest'] as const) {
      const measured = measuredFrom(new FactorRatio(sharp, factors), 800, sense);
      const stretched = stretchedRatio(sharp, 800, factors, sense);
      for (const f of [0, 500, 950, 1200, 5000])
        assertWithin(measured.logGain(f), stretched.logGain(f), 3e-6, `${sense} at ${f}`);
    }
  });
});
