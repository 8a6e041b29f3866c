/** The two-capacitor network against eigenvalues, a matrix exponential, and its limits. */
import assert from 'node:assert/strict';
import {
  kickShare,
  reservoirDecays,
  reservoirResidue,
  reservoirSettlingTime,
  type ReservoirNetwork,
} from '../../../src/signal/converter/reservoir';
import { settlingTime } from '../../../src/signal/converter/settling';
import { assertClose } from '../../support/tolerance';

type Matrix = readonly [number, number, number, number];

const network = (source: number, reservoir: number, switchResistance: number, capacitance: number): ReservoirNetwork => ({
  source,
  reservoir,
  switchResistance,
  capacitance,
});

const times = ([a, b, c, d]: Matrix, [e, f, g, h]: Matrix): Matrix => [
  a * e + b * g,
  a * f + b * h,
  c * e + d * g,
  c * f + d * h,
];

/** exp of a 2 × 2 matrix: a Taylor series of its 2^−30th part, squared 30 times. */
function exponential(matrix: Matrix): Matrix {
  const small = matrix.map((entry) => entry * 2 ** -30) as unknown as Matrix;
  let term: Matrix = [1, 0, 0, 1];
  let sum: Matrix = term;
  for (let order = 1; order < 12; order += 1) {
    term = times(term, small).map((entry) => entry / order) as unknown as Matrix;
    sum = sum.map((entry, index) => entry + term[index]!) as unknown as Matrix;
  }
  for (let squaring = 0; squaring < 30; squaring += 1) sum = times(sum, sum);
  return sum;
}

/** What is left of the capacitor's step, from the nodes' own equations. */
function byMatrix({ source, reservoir, switchResistance, capacitance }: ReservoirNetwork, seconds: number): number {
  const [g, s] = [1 / source, 1 / switchResistance];
  return exponential([
    (-(g + s) / reservoir) * seconds,
    (s / reservoir) * seconds,
    (s / capacitance) * seconds,
    (-s / capacitance) * seconds,
  ])[3];
}

describe('the reservoir network', () => {
  it('leaves what its eigenvalues say', () => {
    // Computed apart in double precision, with steps of the converter at 16 bits; tolerance 1e−6.
    const rows = [
      [network(49.9, 560e-12, 200, 30e-12), 200e-9, 9.464706e-5, 6.20279],
      [network(22, 1e-9, 150, 25e-12), 290e-9, 9.582745e-8, 0.006280148],
      [network(33, 2.2e-9, 200, 30e-12), 300e-9, 2.71121e-4, 17.76819],
    ] as const;
    for (const [one, seconds, share, steps] of rows) {
      const residue = reservoirResidue(one, seconds);
      assertClose(residue, share, 1e-6);
      assertClose(residue * 2 ** 16, steps, 1e-6);
    }
  });

  it('leaves what a matrix exponential says, whichever of the parts is the slow one', () => {
    const networks = [
      network(49.9, 560e-12, 200, 30e-12),
      network(10, 1e-9, 5000, 100e-12),
      network(1000, 10e-12, 50, 300e-12),
      network(100, 100e-12, 100, 100e-12),
    ];
    for (const one of networks) {
      const slow = reservoirDecays(one)[0].timeConstant;
      for (const share of [0, 0.01, 0.3, 1, 3, 8]) {
        // Thirty squarings of a double lose 2^30 roundings at most.
        assertClose(reservoirResidue(one, share * slow), byMatrix(one, share * slow), 1e-6, `${share} time constants`);
      }
    }
  });

  it('starts from the whole step, and its slow part is the larger time constant', () => {
    for (const one of [network(49.9, 560e-12, 200, 30e-12), network(1, 1e-9, 1e6, 1e-12), network(1e6, 1e-12, 1, 1e-9)]) {
      const [slow, fast] = reservoirDecays(one);
      assertClose(slow.weight + fast.weight, 1, 1e-12);
      assert.ok(slow.timeConstant >= fast.timeConstant);
    }
  });

  it('without a switch drops by the kick at once and then recovers through the source', () => {
    const one = network(100, 900e-12, 0, 100e-12);
    assertClose(kickShare(one), 0.1, 1e-12);
    assertClose(reservoirResidue(one, 0), 0.1, 1e-12);
    assertClose(reservoirResidue(one, 300e-9), 0.1 * Math.exp(-3), 1e-12);
    assertClose(reservoirResidue({ ...one, switchResistance: 1e-6 }, 300e-9), 0.1 * Math.exp(-3), 1e-6);
    assert.equal(reservoirSettlingTime(one, 0.2), 0);
  });

  it('without a source resistance is one pole', () => {
    const one = network(0, 1e-9, 100, 50e-12);
    assertClose(reservoirSettlingTime(one, 0.5 / 2 ** 16), settlingTime(5e-9, 0.5, 16), 1e-12);
    assertClose(reservoirResidue({ ...one, source: 1e-9 }, 20e-9), Math.exp(-4), 1e-6);
  });

  it('settles in the time that it leaves the share in', () => {
    const one = network(22, 1e-9, 150, 25e-12);
    for (const share of [0.9, 0.01, 1e-5, 1e-9]) {
      assertClose(reservoirResidue(one, reservoirSettlingTime(one, share)), share, 1e-9);
    }
    assert.equal(reservoirSettlingTime(one, 1), 0);
  });

  it('refuses what is not a network', () => {
    assert.throws(() => kickShare(network(1, 0, 1, 1)), RangeError);
    assert.throws(() => reservoirDecays(network(-1, 1, 1, 1)), RangeError);
    assert.throws(() => reservoirResidue(network(1, 1, 1, 1), -1), RangeError);
    assert.throws(() => reservoirSettlingTime(network(1, 1, 1, 1), 0), RangeError);
  });
});
