/** Roots, gain and delay of every family for orders 1 to 20, beside a brick wall too. */
import assert from 'node:assert/strict';
import type { FilterFamily } from '../../../src/signal/families/design-filter';
import { filterResponse, groupDelay } from '../../../src/signal/filter';
import { readFilterVectors, type StoredFilter } from '../../reference/filter-vectors';
import { readVectors } from '../../reference/signal-vectors';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup, Tally } from '../group';
import { filterOf, nameOf } from '../outside-design';
import { tallyRoots } from '../roots';

interface Part {
  readonly family: FilterFamily;
  readonly stored: readonly StoredFilter[];
  readonly grid: readonly number[];
  readonly sets: number;
}

function partsOf(): readonly Part[] {
  const first = readVectors();
  const second = readFilterVectors();
  const withZeros = (stored: readonly Omit<StoredFilter, 'zeros'>[]): readonly StoredFilter[] =>
    stored.map((one) => ({ ...one, zeros: [] }));
  return [
    { family: 'butterworth', stored: withZeros(first.butterworth), grid: first.grid, sets: 1 },
    { family: 'chebyshev', stored: withZeros(first.chebyshev), grid: first.grid, sets: 6 },
    { family: 'inverse-chebyshev', stored: second.inverseChebyshev, grid: second.grid, sets: 4 },
    { family: 'elliptic', stored: second.elliptic, grid: second.grid, sets: 8 },
    { family: 'bessel', stored: second.bessel, grid: second.grid, sets: 1 },
    { family: 'legendre', stored: second.legendre, grid: second.grid, sets: 1 },
    { family: 'gaussian', stored: second.gaussian, grid: second.grid, sets: 1 },
  ];
}

function tallyFilter(tally: Tally, stored: StoredFilter, { family, grid }: Pick<Part, 'family' | 'grid'>): void {
  const what = nameOf({ ...stored, family });
  const filter = filterOf({ ...stored, family });
  tallyRoots(tally, filter.poles, { expected: stored.poles, scale: 1, allowed: filterRelative, what });
  tallyRoots(tally, filter.zeros, { expected: stored.zeros, scale: 1, allowed: filterRelative, what });
  const response = filterResponse(filter);
  grid.forEach((point, index) => {
    const delay = 2 * Math.PI * groupDelay(filter, point);
    // On the edge of a filter that turns within a millionth of it, the last digit of the frequency moves more than rounding does.
    const allowed = Math.max(filterRelative, 8 * Number.EPSILON * point * delay);
    tally.relative(Math.exp(response.logGain(point)), stored.gain[index]!, allowed, `${what} at ${point}`);
    tally.relative(delay, stored.delay[index]!, allowed, `delay, ${what} at ${point}`);
  });
}

/** The group of all families. */
export const toOrderTwenty: OutsideGroup = {
  title: 'Every family, orders 1 to 20: roots, gain, delay',
  source: 'mpmath, 50 digits and more (make-vectors.py, make-filter-vectors.py), checked against scipy.signal there',
  define: (tally) => {
    for (const part of partsOf()) {
      it(`${part.family}, all ${part.stored.length}`, () => {
        const orders = Array.from({ length: 20 }, (_, index) => index + 1);
        assert.deepEqual([...new Set(part.stored.map(({ order }) => order))], orders);
        assert.equal(part.stored.length, part.sets * 20);
        for (const one of part.stored) tallyFilter(tally, one, part);
      });
    }
  },
};

/** The group beside a brick wall. */
export const brickWalls: OutsideGroup = {
  title: 'Elliptic filters whose edges are 2e−11 and less apart',
  source: 'mpmath, 90 digits (make-filter-vectors.py); scipy.signal loses its digits here',
  define: (tally) => {
    it('keep their digits', () => {
      const { tight, tightGrid: grid } = readFilterVectors();
      assert.equal(tight.length, 6);
      assert.ok(tight.some(({ stopEdgeLessOne }) => stopEdgeLessOne! < 2e-11));
      for (const one of tight) tallyFilter(tally, one, { family: 'elliptic', grid });
    });
  },
};
