/** RC ladders from their resistors and capacitors: half power, noise bandwidth and delay of their own eigenvalues. */
import assert from 'node:assert/strict';
import { polesAndZeros } from '../../../src/signal/families/poles-and-zeros';
import { realPole } from '../../../src/signal/families/real-pole';
import { groupDelay, type Filter } from '../../../src/signal/filter';
import { noiseBandwidth } from '../../../src/signal/noise-bandwidth';
import { readCircuits } from '../../reference/circuits';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup, Tally } from '../group';
import { gainDbOf } from '../outside-design';
import { naturalFrequencies, type RcLadder } from '../rc-ladder';

const halfPowerDb = -10 * Math.log10(2);

/** The filter of a ladder's own eigenvalues. */
function filterOfLadder(ladder: RcLadder): Filter {
  const poles = naturalFrequencies(ladder).map((rad) => ({ re: -rad / (2 * Math.PI), im: 0 }));
  const series = ladder.ohms.reduce((sum, ohm) => sum + ohm, 0);
  const gain = ladder.loadOhm === null ? 1 : ladder.loadOhm / (series + ladder.loadOhm);
  return polesAndZeros({ poles, zeros: [], gain, gainAtHz: 0 });
}

/** Where filters in series, whose gain only falls, have half of their power at 0 Hz. */
function halfPowerOf(filters: readonly Filter[]): number {
  const gainDb = (hz: number): number => filters.reduce((sum, filter) => sum + gainDbOf(filter, hz), 0);
  let [low, high] = [0, Math.min(...filters.flatMap(({ poles }) => poles.map(({ re }) => -2 * re)))];
  for (let i = 0; i < 100; i += 1) {
    const middle = 0.5 * (low + high);
    if (gainDb(middle) - gainDb(0) > halfPowerDb) low = middle;
    else high = middle;
  }
  return low;
}

function bandwidthOverZeroHz(filter: Filter): number {
  const found = noiseBandwidth([filter]);
  assert.ok(found.kind === 'finite');
  return found.value / filter.gainAt.gain ** 2;
}

function equal(sections: number): RcLadder {
  return { ohms: Array<number>(sections).fill(1), farads: Array<number>(sections).fill(1), loadOhm: null };
}

/** Six significant digits of the page's poles; gain, half power and noise bandwidth to its own places. */
const printedRows: readonly (readonly [RcLadder, readonly number[], number, number, number])[] = [
  [{ ohms: [1e3], farads: [1e-9], loadOhm: 1e3 }, [2e6], 0.5, 318309.8862, 500000],
  [{ ohms: [1e3, 1e3], farads: [1e-9, 1e-9], loadOhm: 1e4 }, [453414, 2646590], 0.833333, 70186.5969, 96774.1935],
  [{ ohms: [1e3, 1e4], farads: [1e-8, 1e-9], loadOhm: null }, [72984.4, 137016], 1, 9561.1504, 11904.7619],
  [{ ohms: [1e3, 1e4], farads: [1e-8, 1e-9], loadOhm: 1e5 }, [78377.2, 141623], 0.900901, 10153.9397, 12613.6364],
  [
    { ohms: [50, 100, 200], farads: [1e-9, 470e-12, 220e-12], loadOhm: 1e4 },
    [7307710, 26934600, 50854500],
    0.966184,
    1072157.9331,
    1374521.2106,
  ],
  [
    { ohms: [330, 330, 330, 330], farads: [1e-9, 1e-9, 1e-9, 1e-9], loadOhm: 5e3 },
    [449006, 3098400, 7150720, 10714000],
    0.791139,
    69662.8538,
    95596.3334,
  ],
];

/** Poles of equal sections times RC, half power over the corner of one, delay over RC. */
const printedEqual = [
  [[0.381966, 2.618034], 0.374239, 3],
  [[0.198062, 1.554958, 3.24698], 0.194286, 6],
  [[0.120615, 1, 2.347296, 3.532089], 0.11849, 10],
] as const;

function tallyNatural(tally: Tally, ladder: RcLadder, expected: readonly number[], what: string): void {
  const found = naturalFrequencies(ladder);
  assert.equal(found.length, expected.length);
  found.forEach((rad, index) => {
    tally.relative(rad, expected[index]!, filterRelative, `${what}, natural frequency ${index + 1}`);
  });
}

/** The group. */
export const rcLadders: OutsideGroup = {
  title: 'RC ladders from their elements',
  source: 'mpmath eigenvalues, 50 digits; in the test the eigenvalues of the nodal matrix, by bisection',
  define: (tally) => {
    const { rcLadders: loaded, equalRcLadders } = readCircuits();
    it('has half power and noise bandwidth with and without a load', () => {
      loaded.forEach((ladder, index) => {
        const what = `ladder ${index + 1}`;
        const filter = filterOfLadder(ladder);
        tallyNatural(
          tally,
          ladder,
          ladder.polesRad.map((rad) => -rad),
          what,
        );
        tally.relative(10 ** (gainDbOf(filter, 0) / 20), ladder.gainAtZero, filterRelative, `${what}, gain at 0 Hz`);
        tally.relative(halfPowerOf([filter]), ladder.halfPowerHz, filterRelative, `${what}, half power`);
        tally.relative(bandwidthOverZeroHz(filter), ladder.bandwidthHz, filterRelative, `${what}, noise bandwidth`);
      });
    });

    it('has the poles 4·sin²((2k − 1)·π/(4n + 2)) of equal sections, and what follows from them', () => {
      for (const { sections, poles, halfPower, delay } of equalRcLadders) {
        const closed = Array.from(
          { length: sections },
          (_, k) => 4 * Math.sin(((2 * k + 1) * Math.PI) / (4 * sections + 2)) ** 2,
        );
        tallyNatural(tally, equal(sections), closed, `${sections} sections, closed form`);
        tallyNatural(
          tally,
          equal(sections),
          poles.map((rad) => -rad),
          `${sections} sections`,
        );
        const filter = filterOfLadder(equal(sections));
        tally.relative(2 * Math.PI * halfPowerOf([filter]), halfPower, filterRelative, `${sections} sections, half power`);
        tally.relative(groupDelay(filter, 0), delay, filterRelative, `${sections} sections, delay`);
      }
    });
  },
};

/** The group of the rows as printed. */
export const printedRcLadders: OutsideGroup = {
  title: 'Printed RC ladders',
  source: 'the same, to the places that are printed',
  define: (tally) => {
    it('have our half power and noise bandwidth', () => {
      for (const [ladder, rads, gain, halfPowerHz, bandwidthHz] of printedRows) {
        const filter = filterOfLadder(ladder);
        naturalFrequencies(ladder).forEach((rad, index) => {
          // Half a unit of the sixth digit.
          tally.relative(rad, rads[index]!, 5e-6, 'printed natural frequency');
        });
        tally.absolute(10 ** (gainDbOf(filter, 0) / 20), gain, 5e-7, 'printed gain');
        tally.absolute(halfPowerOf([filter]), halfPowerHz, 5.001e-5, 'printed half power');
        tally.absolute(bandwidthOverZeroHz(filter), bandwidthHz, 5.001e-5, 'printed noise bandwidth');
      }
      for (const [rads, halfPower, delay] of printedEqual) {
        const ladder = equal(rads.length);
        naturalFrequencies(ladder).forEach((rad, index) => {
          tally.absolute(rad, rads[index]!, 5.001e-7, 'printed pole times RC');
        });
        tally.absolute(
          2 * Math.PI * halfPowerOf([filterOfLadder(ladder)]),
          halfPower,
          5.001e-7,
          'printed half power over a corner',
        );
        tally.absolute(groupDelay(filterOfLadder(ladder), 0), delay, 1e-9, 'printed delay over RC');
      }
    });

    it('has 0.643594 of a corner for two buffered sections, 72 % above that of two unbuffered ones', () => {
      const buffered = halfPowerOf([realPole(1), realPole(1)]);
      tally.absolute(buffered, 0.643594, 5.001e-7, 'two buffered sections');
      tally.absolute(buffered / (2 * Math.PI * halfPowerOf([filterOfLadder(equal(2))])) - 1, 0.72, 5e-3, 'over unbuffered ones');
    });
  },
};
