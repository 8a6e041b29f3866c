/** The exchange algorithm against exact minimax vectors, and what every minimax answer must show. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { equiripple, type WantedBand } from '../../../src/signal/digital/equiripple';
import { readDigitalFilters } from '../../reference/digital-filters';
import { assertClose, assertWithin } from '../../support/tolerance';

const vectors = readDigitalFilters();

/** The amplitude of symmetric taps, straight from its definition. */
function amplitude(taps: readonly number[], share: number): number {
  const centre = (taps.length - 1) / 2;
  return taps.reduce((sum, tap, k) => sum + tap * Math.cos(2 * Math.PI * share * (k - centre)), 0);
}

function flat(low: number, high: number, desired: number, weight: number): WantedBand {
  return { low, high, desired: () => desired, weight: () => weight };
}

/** The largest weighted error on 2000 places of each band. */
function scannedError(taps: readonly number[], bands: readonly WantedBand[]): number {
  let most = 0;
  for (const { low, high, desired, weight } of bands) {
    for (let i = 0; i <= 2000; i += 1) {
      const x = low + ((high - low) * i) / 2000;
      most = Math.max(most, weight(x) * Math.abs(desired(x) - amplitude(taps, x)));
    }
  }
  return most;
}

describe('equiripple', () => {
  for (const { count, edges, desired, weights, deviation, taps } of vectors.equiripple) {
    it(`gives the exact minimax design with ${count} taps over ${edges.join(', ')}`, () => {
      const bands = desired.map((value, i) => flat(edges[2 * i]!, edges[2 * i + 1]!, value, weights[i]!));
      const design = equiripple(count, bands);
      assertClose(design.deviation, deviation, 1e-10);
      taps.forEach((tap, index) => {
        assertWithin(design.taps[index]!, tap, 1e-12, `tap ${index}`);
        assertWithin(design.taps[count - 1 - index]!, tap, 1e-12, `tap ${count - 1 - index}`);
      });
    });
  }

  it('alternates at one more place than it has free numbers, everywhere by the same error, and is nowhere worse', () => {
    const property = fc.property(
      fc.integer({ min: 2, max: 45 }),
      fc.double({ min: 0.05, max: 0.35, noNaN: true }),
      fc.double({ min: 0.03, max: 0.1, noNaN: true }),
      fc.double({ min: 0.05, max: 20, noNaN: true }),
      (count, edge, width, weight) => {
        const bands = [flat(0, edge, 1, 1), flat(edge + width, 0.5, 0, weight)];
        const { taps, deviation, extremes } = equiripple(count, bands);
        assert.equal(extremes.length, Math.ceil(count / 2) + 1);
        extremes.forEach(({ x, error }, index) => {
          const band = bands[x <= edge ? 0 : 1]!;
          assertWithin(error, band.weight(x) * (band.desired(x) - amplitude(taps, x)), 1e-10, 'told error');
          assertWithin(Math.abs(error), deviation, 1e-10 + 1e-10 * deviation, 'equal error');
          if (index > 0) assert.notEqual(Math.sign(error), Math.sign(extremes[index - 1]!.error));
        });
        assert.deepEqual([...taps].reverse(), taps);
        assert.ok(scannedError(taps, bands) <= deviation + 1e-10);
      },
    );
    fc.assert(property, { seed: 81, numRuns: 60 });
  });

  it('is the constant that lies in the middle, for one tap', () => {
    // 1 over one band and 0 over the other: both errors are 1/2 at best.
    const { taps, deviation } = equiripple(1, [flat(0, 0.1, 1, 1), flat(0.3, 0.5, 0, 1)]);
    assertWithin(taps[0]!, 0.5, 1e-14);
    assertWithin(deviation, 0.5, 1e-14);
  });

  it('follows a wanted slope', () => {
    const { deviation } = equiripple(3, [{ low: 0, high: 0.25, desired: (x) => x, weight: () => 1 }]);
    assertClose(deviation, slopeDeviation(), 1e-9);
  });

  /** min over a, b of max |x − a − b·cos 2πx| on 0 … 1/4: equal errors at 0, at 1/4, and where the error turns, in closed form. */
  function slopeDeviation(): number {
    // The ends have the same error only if b = −1/4; the error turns where 1 = (π/2)·sin 2πx.
    const turn = Math.asin(2 / Math.PI) / (2 * Math.PI);
    const atTurn = turn + Math.cos(2 * Math.PI * turn) / 4;
    return Math.abs(atTurn - 0.25) / 2;
  }

  it('has no error left where the taps can do exactly what is wanted', () => {
    const { taps, deviation } = equiripple(11, [flat(0, 0.4, 1, 1)]);
    assert.equal(deviation, 0);
    taps.forEach((tap, index) => {
      assertWithin(tap, index === 5 ? 1 : 0, 1e-13);
    });
  });

  for (const count of [200, 401]) {
    it(`settles with ${count} taps and a narrow transition`, () => {
      const bands = [flat(0, 0.2, 1, 1), flat(0.2 + 4 / count, 0.5, 0, 10)];
      const { taps, deviation, extremes } = equiripple(count, bands);
      assert.equal(extremes.length, Math.ceil(count / 2) + 1);
      // By the alternation theorem no taps do better than the smallest of the alternating errors.
      assertClose(Math.min(...extremes.map(({ error }) => Math.abs(error))), deviation, 1e-9);
      // Taps of 1e−13 rounding each, 400 of them, times the weight of 10.
      assert.ok(scannedError(taps, bands) <= deviation + 1e-10);
    });
  }

  it('refuses numbers of taps and bands that make no sense, each with its reason', () => {
    const pass = flat(0, 0.1, 1, 1);
    for (const count of [0, -3, 2.5, NaN]) assert.throws(() => equiripple(count, [pass]), /number of taps/);
    assert.throws(() => equiripple(5, []), /at least one band/);
    for (const [low, high] of [
      [-0.1, 0.1],
      [0.2, 0.2],
      [0.3, 0.2],
      [0.3, 0.6],
      [NaN, 0.3],
    ] as const) {
      assert.throws(() => equiripple(5, [flat(low, high, 1, 1)]), /Bands must ascend/);
    }
    assert.throws(() => equiripple(5, [pass, flat(0.1, 0.5, 0, 1)]), /Bands must ascend/);
    assert.throws(() => equiripple(5, [flat(0, 0.1, 1, 0)]), /weight above 0/);
    assert.throws(() => equiripple(5, [flat(0, 0.1, Infinity, 1)]), /finite/);
    assert.throws(() => equiripple(4, [flat(0.4, 0.5, 1, 1)]), /odd number/);
  });
});
