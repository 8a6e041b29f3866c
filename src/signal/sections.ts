/** First- and second-order pole factors over u = f², which stay exact beside a sharp resonance, and the ranges they take over an interval. */
import type { Enclosure } from './response';

/** A pole or zero in Hz: s = 2π·(re + j·im); of a conjugate pair both are listed. */
export interface Root {
  readonly re: number;
  readonly im: number;
}

/**
 * The squared magnitude of one factor, (u − centre)² + width for a conjugate pair with centre = im² − re² and width = (2·re·im)²,
 * or u + width for a real root with width = re²; divided by its value at u = 0, so that products neither over- nor underflow.
 */
interface Section {
  readonly pair: boolean;
  readonly centre: number;
  readonly width: number;
  readonly scale: number;
}

/** The denominator of |H|² as a product of sections, 1 at 0 Hz. */
export class Sections {
  private readonly sections: readonly Section[];

  constructor(poles: readonly Root[]) {
    this.sections = poles.filter((pole) => pole.im >= 0).map(sectionOf);
  }

  /** ln of the product at u. */
  logAt(u: number): number {
    let logarithm = 0;
    let product = 1;
    for (const section of this.sections) {
      product *= valueAt(section, u);
      if (product > 1e150 || product < 1e-150) {
        logarithm += Math.log(product);
        product = 1;
      }
    }
    return logarithm + Math.log(product);
  }

  /** An enclosure of the logarithm over [low, high], factor by factor; high may be Infinity. */
  logRange(low: number, high: number): Enclosure {
    let least = 0;
    let most = 0;
    for (const section of this.sections) {
      const atLow = valueAt(section, low);
      const atHigh = valueAt(section, high);
      const inside = section.pair && low < section.centre && section.centre < high;
      least += Math.log(inside ? section.width / section.scale : Math.min(atLow, atHigh));
      most += Math.log(Math.max(atLow, atHigh));
    }
    return { low: least, high: most };
  }

  /**
   * An enclosure of the logarithm's derivative in u over a finite interval: the sum of each factor's exact range, met with the mean-value
   * form, which is the tighter one where factors cancel, as they do in a ripple.
   */
  slopeRange(low: number, high: number): Enclosure {
    const middle = 0.5 * (low + high);
    let least = 0;
    let most = 0;
    let atMiddle = 0;
    let leastBend = 0;
    let mostBend = 0;
    for (const section of this.sections) {
      const slopes = section.pair ? pairSlopes(section, low, high) : realSlopes(section, low, high);
      const bends = section.pair ? pairBends(section, low, high) : realBends(section, low, high);
      least += slopes.low;
      most += slopes.high;
      leastBend += bends.low;
      mostBend += bends.high;
      atMiddle += section.pair ? pairSlope(middle - section.centre, section.width) : 1 / (middle + section.width);
    }
    const reach = 0.5 * (high - low) * Math.max(Math.abs(leastBend), Math.abs(mostBend));
    return { low: Math.max(least, atMiddle - reach), high: Math.min(most, atMiddle + reach) };
  }
}

function sectionOf({ re, im }: Root): Section {
  if (im === 0) return { pair: false, centre: 0, width: re * re, scale: re * re };
  const centre = (im - re) * (im + re);
  const width = 4 * re * re * im * im;
  const squared = re * re + im * im;
  return { pair: true, centre, width, scale: squared * squared };
}

function valueAt(section: Section, u: number): number {
  if (!section.pair) return (u + section.width) / section.scale;
  const offset = u - section.centre;
  return (offset * offset + section.width) / section.scale;
}

/** d/du of ln((u − centre)² + width). */
function pairSlope(offset: number, width: number): number {
  return (2 * offset) / (offset * offset + width);
}

/** Its range: extremes ±1/√width stand at u − centre = ±√width. */
function pairSlopes({ centre, width }: Section, low: number, high: number): Enclosure {
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

function realSlopes({ width }: Section, low: number, high: number): Enclosure {
  return { low: 1 / (high + width), high: 1 / (low + width) };
}

/** d²/du² of ln((u − centre)² + width). */
function pairBend(offset: number, width: number): number {
  const sum = offset * offset + width;
  return (2 * (width - offset * offset)) / (sum * sum);
}

/** Its range: 2/width at the centre, −1/(4·width) at u − centre = ±√(3·width). */
function pairBends({ centre, width }: Section, low: number, high: number): Enclosure {
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

function realBends({ width }: Section, low: number, high: number): Enclosure {
  return { low: -1 / (low + width) ** 2, high: -1 / (high + width) ** 2 };
}
