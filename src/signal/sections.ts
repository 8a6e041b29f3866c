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

  /** An enclosure of the logarithm's derivative in u over a finite interval: the sum of each factor's exact range. */
  slopeRange(low: number, high: number): Enclosure {
    let least = 0;
    let most = 0;
    for (const section of this.sections) {
      if (section.pair) {
        const sharpness = Math.sqrt(section.width);
        const fromLow = low - section.centre;
        const fromHigh = high - section.centre;
        const atLow = pairSlope(fromLow, section.width);
        const atHigh = pairSlope(fromHigh, section.width);
        most += fromLow < sharpness && sharpness < fromHigh ? 1 / sharpness : Math.max(atLow, atHigh);
        least += fromLow < -sharpness && -sharpness < fromHigh ? -1 / sharpness : Math.min(atLow, atHigh);
      } else {
        most += 1 / (low + section.width);
        least += 1 / (high + section.width);
      }
    }
    return { low: least, high: most };
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

/** d/du of ln((u − centre)² + width), with extremes ±1/√width at u − centre = ±√width. */
function pairSlope(offset: number, width: number): number {
  return (2 * offset) / (offset * offset + width);
}
