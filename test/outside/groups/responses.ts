/** Level and group delay over four decades of frequency, low-pass prototypes and filters of other kinds. */
import { groupDelay, type Filter } from '../../../src/signal/filter';
import { readOutsideFilters, type OutsideKind } from '../../reference/outside-filters';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup, Tally } from '../group';
import { filterOf, gainDbOf, nameOf } from '../outside-design';
import { tallyRoots } from '../roots';

/** dB; the tables print levels to 13 digits and more, of up to some hundreds of dB. */
const levelDb = 1e-9;

interface Grid {
  readonly db: readonly (number | null)[];
  readonly delay: readonly number[];
  /** In Hz, and what our delay is multiplied by. */
  readonly frequencies: readonly number[];
  readonly perSecond: number;
}

function tallyGrid(tally: Tally, filter: Filter, { db, delay, frequencies, perSecond }: Grid, what: string): void {
  frequencies.forEach((frequency, index) => {
    const seconds = groupDelay(filter, frequency);
    // Where the level turns fastest, the last digits of the frequency move level and delay by more than rounding.
    const steep = 8 * Number.EPSILON * 2 * Math.PI * frequency * seconds;
    const expected = db[index] ?? -Infinity;
    const slack = Math.abs(expected) * 1e-12 + (20 / Math.LN10) * steep;
    tally.decibels(gainDbOf(filter, frequency), expected, Math.max(levelDb, slack), `${what} at ${frequency}`);
    tally.relative(seconds * perSecond, delay[index] ?? NaN, Math.max(filterRelative, steep), `delay, ${what} at ${frequency}`);
  });
}

/** The group of low-pass prototypes. */
export const responses: OutsideGroup = {
  title: 'Prototypes: level and group delay',
  source: 'mpmath, 50 digits',
  define: (tally) => {
    const { responses: stored, responseStep } = readOutsideFilters();
    for (const one of stored) {
      it(`runs along ${nameOf(one)}`, () => {
        const frequencies = one.db.map((_, index) => 10 ** (-2 + (4 * index * responseStep) / 200));
        tallyGrid(tally, filterOf(one), { ...one, frequencies, perSecond: 2 * Math.PI }, nameOf(one));
      });
    }
  },
};

function kindOf({ edges, kind, ...design }: OutsideKind): Filter {
  const [low = NaN, high] = edges;
  return filterOf(design, { kind, corners: high === undefined ? low : { low, high } });
}

/** The group of high-pass, band-pass and band-stop filters. */
export const kinds: OutsideGroup = {
  title: 'High-pass, band-pass and band-stop filters',
  source: 'mpmath, 50 digits; transformations cross-checked with scipy.signal lp2hp, lp2bp, lp2bs',
  define: (tally) => {
    for (const one of readOutsideFilters().kinds) {
      const what = `${one.kind} ${nameOf(one)}`;
      it(`has roots, level and delay of ${what} at ${one.edges.map(Math.round).join(' .. ')} Hz`, () => {
        const filter = kindOf(one);
        const rest = { scale: 2 * Math.PI, allowed: filterRelative, what };
        tallyRoots(tally, filter.poles, { ...rest, expected: one.poles });
        tallyRoots(tally, filter.zeros, { ...rest, expected: one.zeros });
        tallyGrid(tally, filter, { ...one, frequencies: one.grid, perSecond: 1 }, what);
      });
    }
  },
};
