/** Step responses: overshoot, rise and settling of our poles, by partial fractions in the test. */
import assert from 'node:assert/strict';
import { readCircuits, type StoredStep } from '../../reference/circuits';
import type { OutsideGroup, Tally } from '../group';
import { filterOf, nameOf } from '../outside-design';
import { stepFigures } from '../step';

/** Of percent and of seconds at 1 rad/s; the stored times have eight or nine places. */
const slack = 1e-6;

function tallyStep(tally: Tally, stored: StoredStep): void {
  const what = nameOf(stored);
  const { overshootPercent, reaches, settles } = stepFigures(filterOf(stored).poles);
  tally.absolute(overshootPercent, stored.overshootPercent, slack, `${what}, overshoot`);
  tally.absolute(reaches(0.9) - reaches(0.1), stored.rise, slack, `${what}, rise`);
  tally.absolute(reaches(0.5), stored.middle, slack, `${what}, middle`);
  [0.01, 0.001, 2 ** -13, 2 ** -17].forEach((share, index) => {
    tally.absolute(settles(share), stored.settled[index]!, slack, `${what}, settled to ${share}`);
  });
}

/** Rows as printed: overshoot in %, rise, then last crossing of 1 %, 2^−13 and 2^−17. */
const printed = {
  butterworth: [
    [1, 0.0, 2.197225, 4.60517, 9.01091, 11.7835],
    [2, 4.3214, 2.148038, 6.58644, 11.72211, 16.00889],
    [3, 8.1465, 2.290158, 9.42028, 17.36206, 23.81336],
    [4, 10.8302, 2.432409, 10.42311, 23.35863, 30.35943],
    [5, 12.777, 2.562139, 13.86439, 27.34904, 37.0235],
    [8, 16.3441, 2.887246, 21.77259, 44.27652, 57.50513],
  ],
  bessel: [
    [1, 0.0, 2.197225, 4.60517, 9.01091, 11.7835],
    [2, 0.4333, 2.149274, 3.66468, 8.20594, 11.31799],
    [3, 0.7537, 2.180667, 3.7756, 9.06299, 11.77076],
    [4, 0.8354, 2.199932, 4.0236, 8.42044, 12.26294],
    [5, 0.7727, 2.202219, 4.2801, 9.62337, 12.10032],
    [8, 0.3439, 2.177853, 4.98119, 9.8747, 13.06385],
  ],
  chebyshev: [
    [3, 8.9297, 2.145283, 11.59256, 26.6783, 35.76522],
    [4, 18.1001, 2.391069, 18.89729, 45.92927, 61.63465],
  ],
} as const;

/** The group. */
export const steps: OutsideGroup = {
  title: 'Step responses',
  source: 'mpmath residues, a scan of 400001 points and root refinement; ours: partial fractions of our poles in the test',
  define: (tally) => {
    const stored = readCircuits().steps;
    for (const family of new Set(stored.map((one) => one.family))) {
      it(`overshoots, rises and settles as every one of ${family}`, () => {
        for (const one of stored) if (one.family === family) tallyStep(tally, one);
      });
    }
  },
};

/** The group of the rows as printed. */
export const printedSteps: OutsideGroup = {
  title: 'Printed step responses',
  source: 'the same, to the places that are printed',
  define: (tally) => {
    it('are ours; the Chebyshev ones with 0.5 dB', () => {
      for (const family of ['butterworth', 'bessel', 'chebyshev'] as const) {
        for (const [order, overshoot, rise, ...settled] of printed[family]) {
          const design = family === 'chebyshev' ? { family, order, ripple: 0.5 } : { family, order };
          const figures = stepFigures(filterOf(design).poles);
          // Half a unit of the last printed place.
          tally.absolute(figures.overshootPercent, overshoot, 5.001e-5, `${family} ${order}, overshoot`);
          tally.absolute(figures.reaches(0.9) - figures.reaches(0.1), rise, 5.001e-7, `${family} ${order}, rise`);
          [0.01, 2 ** -13, 2 ** -17].forEach((share, index) => {
            tally.absolute(figures.settles(share), settled[index]!, 5.001e-6, `${family} ${order}, settled to ${share}`);
          });
        }
      }
    });

    it('settles to 2^−13 sooner with a Bessel filter of order 4 than with those of orders 3 and 5', () => {
      const times = [3, 4, 5].map((order) => stepFigures(filterOf({ family: 'bessel', order }).poles).settles(2 ** -13));
      assert.ok(times[0]! > times[1]! && times[1]! < times[2]!);
    });
  },
};
