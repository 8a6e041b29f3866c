/** Bounds of copies and lines against every assignment of extremes to the ways. */
import assert from 'node:assert/strict';
import { interleaveCopies, offsetLines, type Way } from '../../../src/signal/converter/interleaving';
import { interleaveCopyBound, offsetLineBound, worstCopyShare } from '../../../src/signal/converter/interleaving-bounds';
import { assertClose, assertWithin } from '../../support/tolerance';

/** Every way at one of two extremes, all assignments. */
function everyAssignment(count: number, wayOf: (sign: number) => Way): readonly (readonly Way[])[] {
  return Array.from({ length: 2 ** count }, (_, bits) =>
    Array.from({ length: count }, (__, way) => wayOf(((bits >> way) & 1) === 1 ? 1 : -1)),
  );
}

const worst = (shares: readonly (readonly number[])[], index: number): number =>
  Math.max(...shares.map((row) => row[index] ?? NaN));

describe('bounds of interleaving', () => {
  it('have the shares of evenly spaced angles', () => {
    // Computed apart in double precision, 2, 3, 4 and 8 ways; tolerance 1e−6.
    const rows = [[1], [0.666667, 0.666667], [0.707107, 1, 0.707107]] as const;
    for (const row of rows)
      row.forEach((share, index) => {
        assertWithin(worstCopyShare(index + 1, row.length + 1), share, 1e-6);
      });
    const eight = [0.653281, 0.707107, 0.653281, 1, 0.653281, 0.707107, 0.653281];
    eight.forEach((share, index) => {
      assertWithin(worstCopyShare(index + 1, 8), share, 1e-6);
    });
  });

  it('are reached by some assignment of extremes, and by none passed', () => {
    const extreme = 1e-7;
    for (const count of [2, 3, 4, 5, 6, 8]) {
      const fromGains = everyAssignment(count, (sign) => ({ gain: sign * extreme, skewSeconds: 0, offset: sign * extreme }));
      const fromSkews = everyAssignment(count, (sign) => ({ gain: 0, skewSeconds: sign * extreme, offset: 0 }));
      for (let k = 1; k < count; k += 1) {
        const gains = worst(
          fromGains.map((ways) => interleaveCopies(ways, 1)),
          k - 1,
        );
        assertClose(gains, interleaveCopyBound({ gain: 2 * extreme, skewSeconds: 0 }, 1, k, count), 1e-6, `gain ${k}/${count}`);
        const skews = worst(
          fromSkews.map((ways) => interleaveCopies(ways, 3)),
          k - 1,
        );
        assertClose(skews, interleaveCopyBound({ gain: 0, skewSeconds: 2 * extreme }, 3, k, count), 1e-5, `skew ${k}/${count}`);
        if (2 * k > count) continue;
        assertClose(worst(fromGains.map(offsetLines), k - 1), offsetLineBound(2 * extreme, k, count), 1e-9, `line ${k}/${count}`);
      }
    }
  });

  it('add gain and skew of two ways as powers', () => {
    // Computed apart in double precision; tolerance 1e−4 dB.
    const bound = interleaveCopyBound({ gain: 0.004, skewSeconds: 0.002 }, 3001 / 16384, 1, 2);
    assertWithin(20 * Math.log10(bound), -52.73721, 1e-4);
  });

  it('refuse a copy that does not exist', () => {
    assert.throws(() => worstCopyShare(0, 4), RangeError);
    assert.throws(() => worstCopyShare(4, 4), RangeError);
    assert.throws(() => worstCopyShare(1.5, 4), RangeError);
  });
});
