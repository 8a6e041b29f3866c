/** All-pole filters from where 1/|H|² vanishes: for those families whose magnitude, not their poles, has a formula. */
import { complexRoot, complexScaled } from '../complex';
import type { Complex } from '../complex';
import type { Filter } from '../filter';
import type { Root } from '../sections';

/**
 * A falling low-pass filter from the roots of 1/|H|² in y = (f/corner)², of which s = √(−y)·corner is a pole.
 *
 * @param squares every root, conjugates included.
 * @returns gain 1 at 0 Hz.
 * @example allPole([{ re: -1, im: 0 }], 1000).poles[0].re // -1000
 */
export function allPole(squares: readonly Complex[], cornerHz: number): Filter {
  const poles = squares
    .filter((y) => y.im >= 0)
    .flatMap((y): Root[] => {
      const { re, im } = complexScaled(complexRoot({ re: -y.re, im: -y.im }), cornerHz);
      if (y.im === 0) return [{ re: -re, im: 0 }];
      return [
        { re: -re, im: Math.abs(im) },
        { re: -re, im: -Math.abs(im) },
      ];
    });
  return { poles, zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] };
}
