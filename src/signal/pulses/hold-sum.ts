/** A constant beside a held stretch of the period, C + t·e·E(e·u): what a track-and-hold output weighs a copy by, with discs that enclose it. */
import { complexProduct, complexQuotient, complexScaled, complexSum, type Complex } from '../complex';
import type { Enclosure } from '../response';
import { cosineOfTurns, sineOfTurns } from './sinc';

/** The sum over u = frequency·period. */
export interface HoldSum {
  /** C. */
  readonly constant: number;
  /** e, the share of the period that is held. */
  readonly share: number;
  /** t, on the unit circle. */
  readonly turn: Complex;
}

/** What rounding may do to a sum whose parts are at most 1; beside a null it is more than any relative slack. */
const rounding = 2e-15;

/** A value and its derivative. */
interface Jet {
  readonly value: Complex;
  readonly derivative: Complex;
}

/** A disc of the complex plane. */
export interface Disc {
  readonly centre: Complex;
  readonly radius: number;
}

/**
 * The sum and its derivative over u.
 *
 * @param u any real number.
 * Source: E(x) = sinc(x)·e^{−jπx}, the transform of a rectangle on [0, 1], and E′ = (e^{−j2πx} − E)/x.
 * @example holdSumAt({ constant: 0.5, share: 0.5, turn: { re: 1, im: 0 } }, 1).value.im // -0.318309886
 */
export function holdSumAt({ constant, share, turn }: HoldSum, u: number): Jet {
  const { value, derivative } = rectangleJet(share * u);
  return {
    value: complexSum({ re: constant, im: 0 }, complexScaled(complexProduct(turn, value), share)),
    derivative: complexScaled(complexProduct(turn, derivative), share * share),
  };
}

/**
 * An enclosure of the sum's magnitude over an interval of u.
 *
 * @param low, high: either sign; high may be Infinity.
 * Source: the triangle inequality, about the middle and about C.
 * @example holdSumSize({ constant: 0.5, share: 0.5, turn: { re: 1, im: 0 } }, 0, Infinity).high // 1
 */
export function holdSumSize(sum: HoldSum, low: number, high: number): Enclosure {
  const reach = Math.min(sum.share, 1 / (Math.PI * nearestTo0(low, high)));
  const size = Math.abs(sum.constant);
  const wide = { low: Math.max(0, size - reach), high: size + reach };
  if (high - low === Infinity) return wide;
  const { value } = holdSumAt(sum, 0.5 * (low + high));
  const middle = Math.hypot(value.re, value.im);
  const radius = steepest(sum, low, high) * 0.5 * (high - low) + rounding;
  return { low: Math.max(wide.low, middle - radius), high: Math.min(wide.high, middle + radius) };
}

/**
 * A disc that holds the sum's logarithmic derivative over an interval of u: its real part is the slope of the gain, its imaginary
 * part that of the phase.
 *
 * @param low, high: finite, either sign.
 * @returns null where a null may lie inside.
 * Source: |B′/B − b′/b| ≤ (|B′ − b′| + |b′/b|·|B − b|)/|B|, with mean values of both differences.
 * @example holdSumTurning({ constant: 0.5, share: 0.5, turn: { re: 1, im: 0 } }, 0, 0).centre.im // -0.785398163
 */
export function holdSumTurning(sum: HoldSum, low: number, high: number): Disc | null {
  const half = 0.5 * (high - low);
  const { value, derivative } = holdSumAt(sum, 0.5 * (low + high));
  const least = Math.hypot(value.re, value.im) - steepest(sum, low, high) * half - rounding;
  if (!(least > 0)) return null;
  const centre = complexQuotient(derivative, value);
  const spread = mostBent(sum, low, high) + Math.hypot(centre.re, centre.im) * steepest(sum, low, high);
  return { centre, radius: (spread * half) / least };
}

/** The largest |B′|: ∫ 2πt dt over the held stretch, and past it (1 + |E|)/x. */
function steepest({ share }: HoldSum, low: number, high: number): number {
  return share * share * mostSteep(share * nearestTo0(low, high));
}

function mostSteep(x: number): number {
  return Math.min(Math.PI, (1 + Math.min(1, 1 / (Math.PI * x))) / x);
}

/** The largest |B″|: ∫ (2πt)² dt, and past it (2π + 2|E′|)/x. */
function mostBent({ share }: HoldSum, low: number, high: number): number {
  const x = share * nearestTo0(low, high);
  return share ** 3 * Math.min((4 / 3) * Math.PI ** 2, (2 * Math.PI + 2 * mostSteep(x)) / x);
}

function nearestTo0(low: number, high: number): number {
  return low <= 0 && high >= 0 ? 0 : Math.min(Math.abs(low), Math.abs(high));
}

/** E and E′ at x; below the first tenth by their series, where E′ would lose digits. */
function rectangleJet(x: number): Jet {
  if (Math.abs(x) < 0.1) return seriesJet(x);
  const sine = sineOfTurns(x);
  const cosine = cosineOfTurns(x);
  const size = sine / (Math.PI * x);
  const value = { re: size * cosine, im: -size * sine };
  const end = { re: cosine * cosine - sine * sine, im: -2 * sine * cosine };
  return { value, derivative: { re: (end.re - value.re) / x, im: (end.im - value.im) / x } };
}

/** Σ (−j2πx)^n/(n + 1)!. */
function seriesJet(x: number): Jet {
  const step = { re: 0, im: -2 * Math.PI };
  let power: Complex = { re: 1, im: 0 };
  let value = power;
  let derivative: Complex = { re: 0, im: 0 };
  for (let n = 1; n <= 16; n += 1) {
    const next = complexScaled(complexProduct(power, step), 1 / (n + 1));
    derivative = complexSum(derivative, complexScaled(next, n));
    power = complexScaled(next, x);
    value = complexSum(value, power);
  }
  return { value, derivative };
}
