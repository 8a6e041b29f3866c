/** All roots of a polynomial at once from its logarithmic derivative alone, without its coefficients. */
import { complexDifference, complexQuotient, complexSum, type Complex } from '../complex';

/** A polynomial and its derivative at one point. */
export interface Evaluated {
  readonly value: Complex;
  readonly derivative: Complex;
}

/** Enough for every filter family many times over; each step of the last ones squares the error. */
const stepLimit = 200;

/**
 * Every root of a polynomial with simple roots, by Newton's method on all of them together, each pushed away from the others.
 *
 * @param evaluate the polynomial of degree `count`.
 * @param centre where the starting circle lies, on the real axis; it is turned so that no start is the mirror image of another.
 * @returns in no particular order; those nearer to the real axis than rounding are put on it.
 * Source: O. Aberth, "Iteration methods for finding all zeros of a polynomial simultaneously", Math. Comp. 27 (1973) 339–344.
 * @example simultaneousRoots((z) => ({ value: { re: z.re * 2 - 6, im: z.im * 2 }, derivative: { re: 2, im: 0 } }), 1, { centre: 0, radius: 1 })[0].re // 3
 */
export function simultaneousRoots(
  evaluate: (z: Complex) => Evaluated,
  count: number,
  { centre, radius }: { readonly centre: number; readonly radius: number },
): readonly Complex[] {
  const roots = Array.from({ length: count }, (_, index): Complex => {
    const angle = (2 * Math.PI * (index + 0.3)) / count;
    return { re: centre + radius * Math.cos(angle), im: radius * Math.sin(angle) };
  });
  let before = Infinity;
  for (let step = 0; step < stepLimit; step += 1) {
    const moved = roots.map((root, index) => {
      const shift = shiftOf(evaluate(root), root, roots, index);
      roots[index] = complexDifference(root, shift);
      return Math.hypot(shift.re, shift.im) / Math.hypot(root.re, root.im);
    });
    const most = Math.max(...moved);
    // Near the roots every step gains digits until rounding moves them about.
    if (most < 1e-15 || (most < 1e-8 && most > 0.1 * before)) break;
    before = most;
  }
  return roots.map(({ re, im }) => (Math.abs(im) < 1e-12 * Math.abs(re) ? { re, im: 0 } : { re, im }));
}

/** Newton's step with the other roots divided out: N/(1 − N·Σ 1/(z − z_j)). */
function shiftOf({ value, derivative }: Evaluated, root: Complex, roots: readonly Complex[], index: number): Complex {
  if (value.re === 0 && value.im === 0) return value;
  const newton = complexQuotient(derivative, value);
  const others = roots.reduce<Complex>(
    (sum, other, j) => (j === index ? sum : complexSum(sum, complexQuotient({ re: 1, im: 0 }, complexDifference(root, other)))),
    { re: 0, im: 0 },
  );
  return complexQuotient({ re: 1, im: 0 }, complexDifference(newton, others));
}
