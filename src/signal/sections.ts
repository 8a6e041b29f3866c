/** First- and second-order factors over u = f², which stay exact beside a sharp resonance, and how they slope and bend over an interval. */
import type { Enclosure } from './response';

/** A pole or zero in Hz: s = 2π·(re + j·im); of a conjugate pair both are listed. */
export interface Root {
  readonly re: number;
  readonly im: number;
}

/** The squared magnitude of one real root: u + square, square = re². */
export interface SingleSection {
  readonly kind: 'single';
  readonly square: number;
}

/** Of two real roots: (u + near)·(u + far), near ≤ far their squares. */
export interface DoubleSection {
  readonly kind: 'double';
  readonly near: number;
  readonly far: number;
}

/** Of a conjugate pair: (u − centre)² + width with centre = im² − re² and width = (2·re·im)². */
export interface PairSection {
  readonly kind: 'pair';
  readonly re: number;
  readonly im: number;
  readonly centre: number;
  readonly width: number;
}

/** One factor of a numerator or denominator of |H|². */
export type Section = SingleSection | DoubleSection | PairSection;

/**
 * The section of one real root.
 *
 * @example singleSection(-3).square // 9
 */
export function singleSection(re: number): SingleSection {
  return { kind: 'single', square: re * re };
}

/**
 * The section of two real roots.
 *
 * @example doubleSection(-3, 2).far // 9
 */
export function doubleSection(one: number, other: number): DoubleSection {
  return { kind: 'double', near: Math.min(one * one, other * other), far: Math.max(one * one, other * other) };
}

/**
 * The section of a conjugate pair.
 *
 * @param root either of the two.
 * @example pairSection({ re: -1, im: 3 }).centre // 8
 */
export function pairSection({ re, im }: Root): PairSection {
  return { kind: 'pair', re, im, centre: (im - re) * (im + re), width: 4 * re * re * im * im };
}

/**
 * The value at a frequency in Hz. f − im is taken before anything is squared, so nothing is lost beside a resonance.
 *
 * @example sectionAt(pairSection({ re: 0, im: 3 }), 5) // 256
 */
export function sectionAt(section: Section, frequencyHz: number): number {
  if (section.kind === 'pair') {
    const { re, im, width } = section;
    const offset = (frequencyHz - im) * (frequencyHz + im) + re * re;
    return offset * offset + width;
  }
  const u = frequencyHz * frequencyHz;
  return section.kind === 'single' ? u + section.square : (u + section.near) * (u + section.far);
}

/**
 * An enclosure of the values over [lowHz, highHz], finite.
 *
 * @example sectionRange(pairSection({ re: 0, im: 2 }), 0, 3).high // 25
 */
export function sectionRange(section: Section, lowHz: number, highHz: number): Enclosure {
  const atLow = sectionAt(section, lowHz);
  const atHigh = sectionAt(section, highHz);
  if (section.kind !== 'pair') return { low: atLow, high: atHigh };
  const inside = lowHz * lowHz < section.centre && section.centre < highHz * highHz;
  return { low: inside ? section.width : Math.min(atLow, atHigh), high: Math.max(atLow, atHigh) };
}

/**
 * The slope d ln(section)/du at one u.
 *
 * @example sectionSlopeAt(singleSection(1), 3) // 0.25
 */
export function sectionSlopeAt(section: Section, u: number): number {
  switch (section.kind) {
    case 'single':
      return 1 / (u + section.square);
    case 'double':
      return 1 / (u + section.near) + 1 / (u + section.far);
    case 'pair':
      return pairSlope(u - section.centre, section.width);
  }
}

/**
 * Its exact range over [low, high] in u, finite; NaN or infinite where a null lies in it.
 *
 * @example sectionSlopes(singleSection(1), 0, 3).low // 0.25
 */
export function sectionSlopes(section: Section, low: number, high: number): Enclosure {
  if (section.kind === 'pair') return pairSlopes(section, low, high);
  return { low: sectionSlopeAt(section, high), high: sectionSlopeAt(section, low) };
}

/**
 * The range of the second derivative d² ln(section)/du² over [low, high] in u, finite; NaN or infinite where a null lies in it.
 *
 * @example sectionBends(singleSection(1), 0, 3).low // -1
 */
export function sectionBends(section: Section, low: number, high: number): Enclosure {
  switch (section.kind) {
    case 'single':
      return { low: realBend(section.square, low), high: realBend(section.square, high) };
    case 'double':
      return {
        low: realBend(section.near, low) + realBend(section.far, low),
        high: realBend(section.near, high) + realBend(section.far, high),
      };
    case 'pair':
      return pairBends(section, low, high);
  }
}

function realBend(square: number, u: number): number {
  return -1 / (u + square) ** 2;
}

/** d/du of ln((u − centre)² + width). */
function pairSlope(offset: number, width: number): number {
  return (2 * offset) / (offset * offset + width);
}

/** Its range: extremes ±1/√width stand at u − centre = ±√width. */
function pairSlopes({ centre, width }: PairSection, low: number, high: number): Enclosure {
  const turn = Math.sqrt(width);
  const from = low - centre;
  const to = high - centre;
  const atLow = pairSlope(from, width);
  const atHigh = pairSlope(to, width);
  return {
    low: from < -turn && -turn < to ? -1 / turn : Math.min(atLow, atHigh),
    high: from < turn && turn < to ? 1 / turn : Math.max(atLow, atHigh),
  };
}

/** d²/du² of ln((u − centre)² + width). */
function pairBend(offset: number, width: number): number {
  const sum = offset * offset + width;
  return (2 * (width - offset * offset)) / (sum * sum);
}

/** Its range: 2/width at the centre, −1/(4·width) at u − centre = ±√(3·width). */
function pairBends({ centre, width }: PairSection, low: number, high: number): Enclosure {
  const turn = Math.sqrt(3 * width);
  const from = low - centre;
  const to = high - centre;
  const atLow = pairBend(from, width);
  const atHigh = pairBend(to, width);
  const turns = (from < turn && turn < to) || (from < -turn && -turn < to);
  return {
    low: turns ? -1 / (4 * width) : Math.min(atLow, atHigh),
    high: from < 0 && 0 < to ? 2 / width : Math.max(atLow, atHigh),
  };
}
