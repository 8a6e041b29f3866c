/** A filter from poles and zeros as they are written. */
import type { Filter } from '../filter';
import type { Root } from '../sections';

/** Poles, zeros and gain as they are written: in Hz, s = 2π times the value, of a conjugate pair one or both. */
export interface WrittenRoots {
  readonly poles: readonly Root[];
  readonly zeros: readonly Root[];
  /** Linear, and where; 0 Hz only where no zero stands there. */
  readonly gain: number;
  readonly gainAtHz: number;
}

/**
 * The filter of written roots. A complex root without its conjugate gets it.
 *
 * @param written poles left of the axis, no more zeros than poles; anything else is refused where the response is made.
 * @returns its turning points are not known: bounds come from its sections.
 * Source: elementary.
 * @example polesAndZeros({ poles: [{ re: -800, im: 600 }], zeros: [], gain: 1, gainAtHz: 0 }).poles.length // 2
 */
export function polesAndZeros({ poles, zeros, gain, gainAtHz }: WrittenRoots): Filter {
  return { poles: withConjugates(poles), zeros: withConjugates(zeros), gainAt: { frequencyHz: gainAtHz, gain }, turnsHz: null };
}

/** As many of each root as of its conjugate. */
function withConjugates(roots: readonly Root[]): readonly Root[] {
  const count = (re: number, im: number): number => roots.filter((root) => root.re === re && root.im === im).length;
  const missing = roots.flatMap(({ re, im }, index) => {
    const firstOfItsKind = roots.findIndex((root) => root.re === re && root.im === im) === index;
    if (im === 0 || !firstOfItsKind) return [];
    return Array.from({ length: Math.max(0, count(re, im) - count(re, -im)) }, (): Root => ({ re, im: -im }));
  });
  return [...roots, ...missing];
}
