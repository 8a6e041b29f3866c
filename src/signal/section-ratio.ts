/** A zero section over a pole section: its exact range on any interval, an infinite one too, and enclosures of its slope and bend. */
import type { Enclosure } from './response';
import {
  sectionAt,
  sectionBends,
  sectionRange,
  sectionSlopeAt,
  sectionSlopes,
  type DoubleSection,
  type PairSection,
  type Section,
} from './sections';

/** One factor of |H|²: a zero section, or 1, over a pole section of no smaller degree, times `norm`, which keeps it near 1 below both. */
export interface SectionRatio {
  readonly zero: Section | null;
  readonly pole: Section;
  readonly norm: number;
}

/**
 * A zero section over a pole section, 1 at 0 Hz; a zero that stands there counts as if it had the size of the pole.
 *
 * @param zero of no higher degree than the pole.
 * @example sectionRatio(null, singleSection(-3)).norm // 9
 */
export function sectionRatio(zero: Section | null, pole: Section): SectionRatio {
  const atZero = sectionAt(pole, 0);
  const size = pole.kind === 'single' ? atZero : Math.sqrt(atZero);
  return { zero, pole, norm: zero === null ? atZero : atZero / sizeOf(zero, size) };
}

/**
 * Its value at a frequency; at Infinity its limit.
 *
 * @example ratioAt(sectionRatio(singleSection(-1), singleSection(-3)), Infinity) // 9
 */
export function ratioAt({ zero, pole, norm }: SectionRatio, frequencyHz: number): number {
  const below = sectionAt(pole, frequencyHz);
  const above = zero === null ? 1 : sectionAt(zero, frequencyHz);
  if (below !== Infinity) return (above / below) * norm;
  return zero !== null && (zero.kind === 'single') === (pole.kind === 'single') ? norm : 0;
}

/**
 * Its exact range, to rounding; `highHz` may be Infinity.
 *
 * @example ratioRange(sectionRatio(singleSection(-1), singleSection(-3)), 0, Infinity).high // 9
 */
export function ratioRange(ratio: SectionRatio, lowHz: number, highHz: number): Enclosure {
  const atLow = ratioAt(ratio, lowHz);
  const atHigh = ratioAt(ratio, highHz);
  let low = Math.min(atLow, atHigh);
  let high = Math.max(atLow, atHigh);
  for (const u of stationary(ratio.zero, ratio.pole)) {
    const frequencyHz = Math.sqrt(u);
    if (!(lowHz < frequencyHz && frequencyHz < highHz)) continue;
    const value = ratioAt(ratio, frequencyHz);
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return { low, high };
}

/**
 * Its logarithm's slope in u at one u.
 *
 * @example ratioSlopeAt(sectionRatio(singleSection(-1), singleSection(-3)), 1) // 0.4
 */
export function ratioSlopeAt({ zero, pole }: SectionRatio, u: number): number {
  return (zero === null ? 0 : sectionSlopeAt(zero, u)) - sectionSlopeAt(pole, u);
}

/**
 * An enclosure of that slope over an interval without a null: of two sections’ ranges, and of their difference on one denominator.
 *
 * @example ratioSlopes(sectionRatio(null, singleSection(-1)), 0, 1).low // -1
 */
export function ratioSlopes({ zero, pole }: SectionRatio, lowHz: number, highHz: number): Enclosure {
  const low = lowHz * lowHz;
  const high = highHz * highHz;
  const poleSlopes = sectionSlopes(pole, low, high);
  if (zero === null) return { low: -poleSlopes.high, high: -poleSlopes.low };
  const zeroSlopes = sectionSlopes(zero, low, high);
  const apart = { low: zeroSlopes.low - poleSlopes.high, high: zeroSlopes.high - poleSlopes.low };
  if (zero.kind !== 'pair' || pole.kind !== 'pair') return apart;
  const together = pairedSlopes(zero, pole, lowHz, highHz);
  return { low: Math.max(apart.low, together.low), high: Math.min(apart.high, together.high) };
}

/**
 * An enclosure of the second derivative of its logarithm in u over an interval without a null.
 *
 * @example ratioBends(sectionRatio(null, singleSection(-1)), 0, 1).high // 1
 */
export function ratioBends({ zero, pole }: SectionRatio, low: number, high: number): Enclosure {
  const poleBends = sectionBends(pole, low, high);
  const zeroBends = zero === null ? { low: 0, high: 0 } : sectionBends(zero, low, high);
  return { low: zeroBends.low - poleBends.high, high: zeroBends.high - poleBends.low };
}

/**
 * Whether a null of the ratio lies in an interval or at one of its ends.
 *
 * @example hasNull(sectionRatio(pairSection({ re: 0, im: 5 }), pairSection({ re: -1, im: 1 })), 5, 6) // true
 */
export function hasNull({ zero }: SectionRatio, lowHz: number, highHz: number): boolean {
  if (zero === null) return false;
  if (zero.kind === 'pair') return zero.re === 0 && lowHz <= Math.abs(zero.im) && Math.abs(zero.im) <= highHz;
  return lowHz === 0 && (zero.kind === 'single' ? zero.square : zero.near) === 0;
}

function sizeOf(zero: Section, size: number): number {
  switch (zero.kind) {
    case 'single':
      return zero.square || size;
    case 'double':
      return (zero.near || size) * (zero.far || size);
    case 'pair':
      return sectionAt(zero, 0);
  }
}

/**
 * Where the ratio may turn, in u; the ends of the interval are looked at anyway. With x = u − centre of the pole pair, a pair over a pair
 * turns where d·x² + (width_z − …)·x − d·width_p = 0, of which one root lies on either side of 0.
 */
function stationary(zero: Section | null, pole: Section): readonly number[] {
  if (pole.kind === 'single') return [];
  if (pole.kind === 'double') return zero === null || zero.kind !== 'pair' ? [] : turnsOverDouble(zero, pole);
  if (zero === null) return [pole.centre];
  if (zero.kind === 'single') return [turnOfSingle(pole.centre + zero.square, pole)];
  const { distance, tilt, width } = differenceOf(zero, pole);
  if (distance === 0) return [pole.centre];
  const q = -0.5 * (tilt + (tilt < 0 ? -1 : 1) * Math.sqrt(tilt * tilt + 4 * distance * distance * width));
  return [pole.centre + q / distance, pole.centre - (distance * width) / q].filter((u) => u > 0);
}

/** u + s over a pair, whose null at −s is e away from the pair's centre: x² + 2e·x − width = 0, and of its roots the one above the null. */
function turnOfSingle(e: number, { centre, width }: PairSection): number {
  const root = Math.sqrt(e * e + width);
  return Math.max(0, centre + (e > 0 ? width / (e + root) : root - e));
}

/** N′D − ND′ = 2·(d·x² + tilt·x − d·width) for a pair (or two real zeros) over a pair. */
function differenceOf(zero: PairSection | DoubleSection, pole: PairSection): { distance: number; tilt: number; width: number } {
  const centre = zero.kind === 'pair' ? zero.centre : -0.5 * (zero.near + zero.far);
  const zeroWidth = zero.kind === 'pair' ? zero.width : -((0.5 * (zero.far - zero.near)) ** 2);
  const distance = centre - pole.centre;
  return { distance, tilt: pole.width - zeroWidth - distance * distance, width: pole.width };
}

/** A pair over two real poles, in u itself: (t + 2c)·u² + 2·(p − n)·u − (2cp + t·n) = 0. */
function turnsOverDouble(zero: PairSection, pole: DoubleSection): readonly number[] {
  const t = pole.near + pole.far;
  const p = pole.near * pole.far;
  const n = sectionAt(zero, 0);
  const [a, b, c] = [t + 2 * zero.centre, p - n, -(2 * zero.centre * p + t * n)];
  const root = Math.sqrt(Math.max(0, b * b - a * c));
  const q = -(b + (b < 0 ? -1 : 1) * root);
  return [q / a, c / q].filter((u) => u > 0);
}

/** (N′D − ND′)/(N·D) with numerator and denominator bounded by themselves: tight where two sections nearly cancel. */
function pairedSlopes(zero: PairSection, pole: PairSection, lowHz: number, highHz: number): Enclosure {
  const { distance, tilt, width } = differenceOf(zero, pole);
  const difference = (x: number): number => 2 * (distance * x * x + tilt * x - distance * width);
  const from = lowHz * lowHz - pole.centre;
  const to = highHz * highHz - pole.centre;
  const turn = (-0.5 * tilt) / distance;
  const values = [difference(from), difference(to), ...(from < turn && turn < to ? [difference(turn)] : [])];
  const [least, most] = [Math.min(...values), Math.max(...values)];
  const above = sectionRange(zero, lowHz, highHz);
  const below = sectionRange(pole, lowHz, highHz);
  const [small, large] = [above.low * below.low, above.high * below.high];
  return { low: least / (least < 0 ? small : large), high: most / (most > 0 ? small : large) };
}
