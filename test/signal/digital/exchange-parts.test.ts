/** The parts of the exchange: interpolation in cos 2πx, the choice of alternating extremes, places to start from. */
import assert from 'node:assert/strict';
import { alternating } from '../../../src/signal/digital/alternation';
import { cosinePolynomial, cosineWeights } from '../../../src/signal/digital/barycentric';
import { clusteredShare } from '../../../src/signal/digital/clustered-shares';
import { errorExtremes } from '../../../src/signal/digital/error-extremes';
import { firstNodes, stretchedNodes } from '../../../src/signal/digital/first-nodes';
import { tapsFromAmplitude } from '../../../src/signal/digital/taps-from-amplitude';
import { assertWithin } from '../../support/tolerance';

const points = (...errors: readonly number[]): { x: number; error: number }[] => errors.map((error, x) => ({ x, error }));

describe('cosinePolynomial', () => {
  it('gives back a sum of cosines from its values at as many places as it has terms', () => {
    const sum = (x: number): number => 0.3 - Math.cos(2 * Math.PI * x) + 0.5 * Math.cos(6 * Math.PI * x);
    const nodes = firstNodes([{ low: 0, high: 0.5 }], 4);
    const weights = cosineWeights(nodes);
    for (const x of [0, 0.1, nodes[2]!, 0.33, 0.5])
      assertWithin(cosinePolynomial(nodes, weights, nodes.map(sum), x), sum(x), 1e-14);
  });
});

describe('alternating', () => {
  it('keeps the largest of neighbours with the same sign', () => {
    assert.deepEqual(
      alternating(points(1, 3, -2, -5, 4), 3).map(({ x }) => x),
      [1, 3, 4],
    );
  });

  it('drops the smaller end where one is too many, and a pair where two are', () => {
    assert.deepEqual(
      alternating(points(1, -2, 3), 2).map(({ x }) => x),
      [1, 2],
    );
    assert.deepEqual(
      alternating(points(5, -6, 1, -2, 7, -8), 4).map(({ x }) => x),
      [0, 1, 4, 5],
    );
  });
});

describe('errorExtremes', () => {
  it('moves each extreme from the grid to its true place', () => {
    const found = errorExtremes((x) => Math.cos(2 * Math.PI * 7 * (x - 0.01)), [{ low: 0, high: 0.5 }], 7, []);
    const inner = found.filter(({ x }) => x > 0 && x < 0.5);
    assert.equal(inner.length, 7);
    inner.forEach(({ x, error }, index) => {
      assertWithin(x, 0.01 + index / 14, 1e-7);
      assertWithin(Math.abs(error), 1, 1e-14);
    });
  });
});

describe('places to start from', () => {
  it('are as many as wanted, ascending, each within a band', () => {
    const bands = [
      { low: 0, high: 0.13 },
      { low: 0.2, high: 0.5 },
    ];
    for (const wanted of [2, 9, 40]) {
      for (const places of [
        firstNodes(bands, wanted),
        stretchedNodes(
          [
            [0, 0.1, 0.13],
            [0.2, 0.3, 0.5],
          ],
          wanted,
        ),
      ]) {
        assert.equal(places.length, wanted);
        places.forEach((x, index) => {
          assert.ok(bands.some(({ low, high }) => low <= x && x <= high));
          if (index > 0) assert.ok(x > places[index - 1]!);
        });
      }
    }
  });

  it('reach from one end of a band to the other', () => {
    const band = { low: 0.1, high: 0.3 };
    assert.equal(clusteredShare(band, 0), 0.1);
    assert.equal(clusteredShare(band, 1), 0.3);
    assert.ok(clusteredShare(band, 0.01) - 0.1 < 0.0002);
  });
});

describe('tapsFromAmplitude', () => {
  for (const taps of [[0.2, 0.5, 0.2], [0.1, 0.4, 0.4, 0.1], [0.7]] as const) {
    it(`gives back ${taps.join(', ')} from their amplitude`, () => {
      const centre = (taps.length - 1) / 2;
      const amplitude = (x: number): number =>
        taps.reduce((sum: number, tap, k) => sum + tap * Math.cos(2 * Math.PI * x * (k - centre)), 0);
      tapsFromAmplitude(amplitude, taps.length).forEach((tap, k) => {
        assertWithin(tap, taps[k]!, 1e-15);
      });
    });
  }
});
