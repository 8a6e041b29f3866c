/** An LC ladder between resistors: its response and natural frequencies by chain matrices in s, with no family of filters in sight. */
import { complexProduct, complexQuotient, complexSum, type Complex } from '../../src/signal/complex';

/** Series inductors and shunt capacitors in turn, from the source on. */
export interface LcLadder {
  /** H and F in turn, whichever comes first. */
  readonly elements: readonly number[];
  readonly first: 'shunt' | 'series';
  readonly sourceOhm: number;
  /** Infinity where the far end is open. */
  readonly loadOhm: number;
}

/** Source voltage over load voltage as a polynomial in s, lowest power first; its zeros are the natural frequencies. */
export function sourceOverLoad({ elements, first, sourceOhm, loadOhm }: LcLadder): readonly number[] {
  // Walked from the load to the source, which multiplies the chain matrices from the right: all terms are positive.
  let voltage: readonly number[] = [1];
  let current: readonly number[] = [1 / loadOhm];
  for (let index = elements.length - 1; index >= 0; index -= 1) {
    const element = elements[index]!;
    if ((index % 2 === 0) === (first === 'shunt')) current = plusRaised(current, voltage, element);
    else voltage = plusRaised(voltage, current, element);
  }
  return Array.from({ length: elements.length + 1 }, (_, power) => (voltage[power] ?? 0) + sourceOhm * (current[power] ?? 0));
}

/** a + g·s·b. */
function plusRaised(a: readonly number[], b: readonly number[], g: number): readonly number[] {
  return Array.from({ length: Math.max(a.length, b.length + 1) }, (_, i) => (a[i] ?? 0) + g * (i === 0 ? 0 : (b[i - 1] ?? 0)));
}

/** A polynomial, lowest power first, at s. */
function at(polynomial: readonly number[], s: Complex): Complex {
  return polynomial.reduceRight<Complex>((sum, c) => complexSum(complexProduct(sum, s), { re: c, im: 0 }), { re: 0, im: 0 });
}

/** Load voltage over source voltage at ω, in dB. */
export function levelDb(ladder: LcLadder, omega: number): number {
  const { re, im } = at(sourceOverLoad(ladder), { re: 0, im: omega });
  return -20 * Math.log10(Math.hypot(re, im));
}

/** How far rounding may have taken each element, and the load in siemens. */
export interface Rounding {
  readonly element: number;
  readonly loadSiemens: number;
}

/** How far from s the natural frequency nearest to it is, and how far it may be as every element moves by its rounding. */
export function nearestNatural(ladder: LcLadder, s: Complex, rounding: Rounding): { distance: number; mobility: number } {
  const polynomial = sourceOverLoad(ladder);
  const slope = at(
    polynomial.slice(1).map((c, index) => c * (index + 1)),
    s,
  );
  // One Newton step; its error is of the second order, as is that of the sum of what each element moves.
  const step = (value: Complex): number => {
    const { re, im } = complexQuotient(value, slope);
    return Math.hypot(re, im);
  };
  // Each element, and the load's conductance, enters linearly, so the difference for 1 more is the derivative.
  const moved = (more: LcLadder): number => {
    const other = sourceOverLoad(more);
    return step(
      at(
        polynomial.map((c, power) => (other[power] ?? 0) - c),
        s,
      ),
    );
  };
  const moves = ladder.elements.map((_, index) =>
    moved({ ...ladder, elements: ladder.elements.map((g, k) => (k === index ? g + 1 : g)) }),
  );
  const byLoad = moved({ ...ladder, loadOhm: 1 / (1 / ladder.loadOhm + 1) });
  const mobility = rounding.element * moves.reduce((sum, move) => sum + move, 0) + rounding.loadSiemens * byLoad;
  return { distance: step(at(polynomial, s)), mobility };
}
