/** Natural frequencies and Q of second-order sections, as tables print them. */
import assert from 'node:assert/strict';
import type { OutsideDesign } from '../../reference/outside-filters';
import type { OutsideGroup } from '../group';
import { filterOf, nameOf } from '../outside-design';

/** Natural frequency and Q of each pair, by rising Q; the real poles of odd orders are left out. */
const printedSections: readonly (readonly [OutsideDesign, readonly (readonly [w0: number, q: number])[]])[] = [
  [
    { family: 'butterworth', order: 4 },
    [
      [1, 0.541196],
      [1, 1.306563],
    ],
  ],
  [
    { family: 'butterworth', order: 5 },
    [
      [1, 0.618034],
      [1, 1.618034],
    ],
  ],
  [
    { family: 'butterworth', order: 6 },
    [
      [1, 0.517638],
      [1, 0.707107],
      [1, 1.931852],
    ],
  ],
  [
    { family: 'butterworth', order: 8 },
    [
      [1, 0.509796],
      [1, 0.601345],
      [1, 0.899976],
      [1, 2.562915],
    ],
  ],
  [
    { family: 'bessel', order: 4 },
    [
      [1.430172, 0.521935],
      [1.603358, 0.805538],
    ],
  ],
  [
    { family: 'chebyshev', order: 4, ripple: 0.5 },
    [
      [0.597002, 0.70511],
      [1.03127, 2.940554],
    ],
  ],
];

/** Natural frequency and Q of our pairs, by rising Q. */
function pairsOf(design: OutsideDesign): readonly (readonly [number, number])[] {
  const upper = filterOf(design).poles.filter(({ im }) => im > 0);
  return upper
    .map(({ re, im }): readonly [number, number] => [Math.hypot(re, im), -Math.hypot(re, im) / (2 * re)])
    .toSorted((a, b) => a[1] - b[1]);
}

/** The group of sections. */
export const printedSectionTables: OutsideGroup = {
  title: 'Printed natural frequencies and Q of sections',
  source: 'the normalised tables of sections, recomputed at 50 digits',
  define: (tally) => {
    it('is that of our pairs of poles', () => {
      for (const [design, expected] of printedSections) {
        const pairs = pairsOf(design);
        assert.equal(pairs.length, expected.length);
        expected.forEach(([w0, q], index) => {
          tally.absolute(pairs[index]![0], w0, 5.001e-7, `${nameOf(design)}, natural frequency`);
          tally.absolute(pairs[index]![1], q, 5.001e-7, `${nameOf(design)}, Q`);
        });
      }
      tally.absolute(
        pairsOf({ family: 'chebyshev', order: 6, ripple: 3 }).at(-1)![1],
        12.78,
        5e-4,
        'chebyshev 6 3 dB, highest Q',
      );
    });
  },
};
