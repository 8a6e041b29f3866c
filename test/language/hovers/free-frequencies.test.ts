/** Where a tone may stand, against folding it there. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { foldFrequency } from '../../../src/analysis';
import { freedomOf } from '../../../src/language/hovers/free-frequencies';

const rateHz = 64_000;
const ranges = [{ low: 5, high: 10_000 }];
const landsInside = (hz: number): boolean => {
  const { landsHz } = foldFrequency(hz, rateHz);
  return ranges.some(({ low, high }) => low <= landsHz && landsHz <= high);
};

describe('the freedom of a tone', () => {
  it('knows whether the tone lands inside, and the edges are where that changes', () => {
    fc.assert(
      fc.property(fc.double({ min: 1, max: 1e6, noNaN: true }), (hz) => {
        const { inside, below, above } = freedomOf(hz, rateHz, ranges);
        assert.equal(inside, landsInside(hz));
        for (const [edge, outward] of [
          [below, -0.5],
          [above, 0.5],
        ] as const) {
          if (edge === null) continue;
          assert.equal(landsInside((edge + hz) / 2), inside, `between ${hz} and ${edge}`);
          if (edge + outward > 0) assert.equal(landsInside(edge + outward), !inside, `beyond ${edge}`);
        }
      }),
      { seed: 2, numRuns: 500 },
    );
  });

  it('joins the stretches of a range that begins at 0 Hz', () => {
    assert.deepEqual(freedomOf(64_000, rateHz, [{ low: 0, high: 10_000 }]), { inside: true, below: 54_000, above: 74_000 });
  });

  it('has no edge below where the range begins at 0 Hz', () => {
    assert.deepEqual(freedomOf(3000, rateHz, [{ low: 0, high: 10_000 }]), { inside: true, below: null, above: 10_000 });
  });
});
