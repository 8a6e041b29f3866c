/** Filters against the hold's droop, against exact minimax vectors; gains made 1; taps as words. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { coefficientWords } from '../../../src/signal/digital/coefficient-words';
import { withUnitGain } from '../../../src/signal/digital/fir-gain';
import { firResponse } from '../../../src/signal/digital/fir-response';
import { inverseHold } from '../../../src/signal/digital/inverse-hold';
import { rectangleResponse } from '../../../src/signal/pulses/rectangle';
import { readDigitalFilters } from '../../reference/digital-filters';
import { assertWithin } from '../../support/tolerance';

const hold = rectangleResponse(1);
const magnitude = (share: number): number => Math.exp(hold.logGain(share));

describe('inverseHold', () => {
  for (const { count, edge, deviation, taps } of readDigitalFilters().inverseSinc) {
    it(`gives the exact design with ${count} taps up to ${edge} of the rate`, () => {
      const design = inverseHold(count, [{ low: 0, high: edge }], magnitude);
      assertWithin(design.deviation, deviation, 1e-11);
      const centre = (count - 1) / 2;
      taps.forEach((tap, index) => {
        assertWithin(design.taps[centre + index]!, tap, 1e-11);
        assertWithin(design.taps[centre - index]!, tap, 1e-11);
      });
    });
  }

  it('leaves hold and filter flat to its deviation in a band that does not begin at 0 Hz', () => {
    const { taps, deviation } = inverseHold(9, [{ low: 0.1, high: 0.42 }], magnitude);
    const response = firResponse(taps, 1);
    for (let i = 0; i <= 300; i += 1) {
      const share = 0.1 + (0.32 * i) / 300;
      assertWithin(Math.exp(response.logGain(share) + hold.logGain(share)), 1, deviation * (1 + 1e-9));
    }
    // A part of a band is never harder than the whole.
    assert.ok(deviation < inverseHold(9, [{ low: 0, high: 0.42 }], magnitude).deviation);
  });

  it('refuses an even number of taps, and a hold that lets nothing through', () => {
    assert.throws(() => inverseHold(4, [{ low: 0, high: 0.4 }], magnitude), /odd number/);
    assert.throws(() => inverseHold(5, [{ low: 0, high: 0.5 }], (share) => 0.5 - share), /finite/);
  });
});

describe('withUnitGain', () => {
  it('makes the gain 1 at the reference, and nothing else of the shape', () => {
    const { taps } = inverseHold(7, [{ low: 0, high: 0.4 }], magnitude);
    const scaled = withUnitGain(taps, 0.13);
    assertWithin(firResponse(scaled, 1).logGain(0.13), 0, 1e-13);
    assertWithin(scaled[0]! / scaled[3]!, taps[0]! / taps[3]!, 1e-15);
  });

  it('refuses taps that are not symmetric, and ones without gain at the reference', () => {
    assert.throws(() => withUnitGain([1, 2], 0), /symmetric/);
    assert.throws(() => withUnitGain([1, 1], 0.5), /no gain/);
  });
});

describe('coefficientWords', () => {
  it('rounds to the nearest word, by half a step at most, keeps symmetry, and changes nothing the second time', () => {
    const taps = fc.array(fc.double({ min: -4, max: 4, noNaN: true }), { minLength: 1, maxLength: 20 });
    const property = fc.property(taps, fc.integer({ min: 2, max: 24 }), (some, bits) => {
      const both = [...some, ...[...some].reverse()];
      const words = coefficientWords(both, bits);
      const largest = Math.max(...both.map(Math.abs));
      // The largest tap fills at least a quarter of the range, so that a step is at most 4/2^(bits − 1) of it.
      words.forEach((word, index) => {
        assert.ok(Math.abs(word - both[index]!) <= (largest * 2) / 2 ** (bits - 1) + 1e-300);
        assert.equal(word, words[words.length - 1 - index]);
      });
      assert.ok(new Set(words).size <= 2 ** bits);
      assert.deepEqual(coefficientWords(words, bits), words);
    });
    fc.assert(property, { seed: 91, numRuns: 200 });
  });

  it('holds −1 but not 1 in words of the same scale', () => {
    // Three bits with a step of 1/4 hold −1 … 0.75; a tap of 1 takes a step of 1/2.
    assert.deepEqual(coefficientWords([-1, 0.3], 3), [-1, 0.25]);
    assert.deepEqual(coefficientWords([1, 0.3], 3), [1, 0.5]);
    assert.deepEqual(coefficientWords([0, 0], 3), [0, 0]);
  });

  it('refuses words too short for a sign and a figure, and taps that are not finite', () => {
    for (const bits of [1, 0, 2.5, NaN]) assert.throws(() => coefficientWords([1], bits), /bits/);
    assert.throws(() => coefficientWords([Infinity], 8), /finite/);
  });
});
