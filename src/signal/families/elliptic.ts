/** Elliptic (Cauer) low-pass filters: equal ripple in the passband and in the stop band, the sharpest edge of an order. */
import type { Filter } from '../filter';
import type { Root } from '../sections';
import { jacobi, modulusOfDegree, quarterPeriods, type Modulus } from './jacobi';
import { checkDb, checkFamily, epsilonOf } from './low-pass';

/** What the corner frequency names: the half-power point, the end of the ripple, or the first frequency with all of the attenuation. */
export type EllipticCorner = 'half-power' | 'ripple' | 'stopband';

/**
 * An elliptic low-pass filter: |H|² = 1 / (1 + ε²·R²(f/f_r)), R the Chebyshev rational function of the order, which is at most 1 up to the
 * end f_r of the ripple and at least ε_s/ε from the edge f_r/k of the stop band on; k follows from order, ripple and attenuation.
 *
 * @param order whole, ≥ 1; exact to 1e−9 up to 20, however near the two edges are. An even order keeps its attenuation up to infinity.
 * @param cornerHz > 0, in Hz.
 * @param rippleDb > 0, in dB.
 * @param attenuationDb above the ripple, and above 3.0103 where the corner is at half power.
 * @param cornerAt what `cornerHz` names. Above a ripple of 3.0103 dB the half-power point is the last one, inside the ripple.
 * @returns the passband's maximum is 1, so an even order starts `rippleDb` below it at 0 Hz.
 * Source: W. Cauer's theory by Jacobi functions, common practice; checked against mpmath at 50 digits.
 * @example Math.exp(filterResponse(elliptic(5, 1000, 0.1, 40, 'ripple')).logGain(1417.6176058)) // 0.01
 */
export function elliptic(
  order: number,
  cornerHz: number,
  rippleDb: number,
  attenuationDb: number,
  cornerAt: EllipticCorner,
): Filter {
  checkFamily(order, cornerHz);
  checkDb('ripple', rippleDb);
  checkDb('attenuation', attenuationDb);
  if (!(attenuationDb > rippleDb))
    throw new RangeError(`An attenuation of ${attenuationDb} dB is not above the ripple of ${rippleDb} dB.`);
  const shape = shapeOf(order, rippleDb, attenuationDb);
  const edgeHz = cornerHz / cornerRatio(shape, cornerAt);
  const inner = innerTurns(shape);
  return {
    poles: poles(shape, edgeHz),
    zeros: inner.filter(isNull).flatMap((x) => [1, -1].map((sign): Root => ({ re: 0, im: sign * mirror(shape, edgeHz, x) }))),
    gainAt: { frequencyHz: 0, gain: order % 2 === 1 ? 1 : 10 ** (-rippleDb / 20) },
    turnsHz: [...inner.map((x) => edgeHz * x), ...inner.map((x) => mirror(shape, edgeHz, x)).reverse()],
  };
}

/** What order, ripple and attenuation make of an elliptic filter. */
interface Shape {
  readonly order: number;
  /** ε of the ripple and of the attenuation. */
  readonly epsilon: number;
  readonly stopEpsilon: number;
  /** Of the ordinate, ε/ε_s, and of the frequency axis, passband edge over stop-band edge. */
  readonly ordinate: Modulus;
  readonly axis: Modulus;
}

function shapeOf(order: number, rippleDb: number, attenuationDb: number): Shape {
  const epsilon = epsilonOf(rippleDb);
  const stopEpsilon = epsilonOf(attenuationDb);
  // ε_s² − ε², without subtracting two large numbers.
  const apart = Math.sqrt(10 ** (rippleDb / 10) * Math.expm1(((attenuationDb - rippleDb) * Math.LN10) / 10));
  const ordinate = { k: epsilon / stopEpsilon, complement: apart / stopEpsilon };
  return { order, epsilon, stopEpsilon, ordinate, axis: modulusOfDegree(order, ordinate) };
}

/** −j times the pole is sn of a complex argument; its addition theorem in real parts keeps the digits of both. */
function poles({ order, epsilon, ordinate, axis }: Shape, edgeHz: number): readonly Root[] {
  const { sn: s, cn: c, dn: d } = jacobi(quarterPeriods(1 / epsilon, turned(ordinate)), turned(axis));
  const found: Root[] = [];
  for (let i = 1; 2 * i <= order; i += 1) {
    const { sn, cn, dn } = jacobi(1 - (2 * i - 1) / order, axis);
    const below = c * c + (axis.k * sn * s) ** 2;
    const re = (-edgeHz * cn * dn * s * c) / below;
    const im = (edgeHz * sn * d) / below;
    found.push({ re, im }, { re, im: -im });
  }
  if (order % 2 === 1) found.push({ re: (-edgeHz * s) / c, im: 0 });
  return found;
}

/** Where R turns inside the passband, over its edge, ascending: at its nulls and where it is ± 1, in turn. */
function innerTurns({ order, axis }: Shape): readonly number[] {
  const found: number[] = [];
  for (let j = order - 1; j >= 1; j -= 1) found.push(jacobi(1 - j / order, axis).sn);
  return found;
}

/** From the passband's edge down every second turn is a null of R, and the first is. */
function isNull(_: number, index: number, turns: readonly number[]): boolean {
  return (turns.length - 1 - index) % 2 === 0;
}

/** What a frequency of the passband becomes in the stop band: their product is that of the two edges. */
function mirror({ axis }: Shape, edgeHz: number, x: number): number {
  return edgeHz / (axis.k * x);
}

function turned({ k, complement }: Modulus): Modulus {
  return { k: complement, complement: k };
}

/** The corner over the end of the ripple. */
function cornerRatio(shape: Shape, cornerAt: EllipticCorner): number {
  const { order, epsilon, stopEpsilon, ordinate, axis } = shape;
  if (cornerAt === 'ripple') return 1;
  if (cornerAt === 'stopband') return 1 / axis.k;
  if (!(stopEpsilon > 1)) throw new RangeError('An attenuation of 3.01 dB or less has no half power.');
  if (epsilon > 1) {
    const below = 1 - quarterPeriods(1 / Math.sqrt(epsilon * epsilon - 1), ordinate);
    return jacobi(1 - below / order, axis).sn;
  }
  // Between the edges both R and the axis run along dn of the complementary modulus.
  const tangent = Math.sqrt((1 - epsilon * epsilon) / (epsilon * epsilon * (1 - 1 / (stopEpsilon * stopEpsilon))));
  return 1 / jacobi(quarterPeriods(tangent, turned(ordinate)), turned(axis)).dn;
}
