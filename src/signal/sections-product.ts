/** |H|² of a rational filter as a product of section ratios, each zero over the pole nearest to it: values, ranges and slopes in u = f². */
import { ratioTable, tableLogAt } from './ratio-table';
import type { Enclosure } from './response';
import {
  hasNull,
  ratioAt,
  ratioBends,
  ratioRange,
  ratioSlopeAt,
  ratioSlopes,
  sectionRatio,
  type SectionRatio,
} from './section-ratio';
import { doubleSection, pairSection, singleSection, type PairSection, type Root, type Section } from './sections';

/** The product. */
export class SectionsProduct {
  private readonly ratios: readonly SectionRatio[];
  private readonly table: Float64Array;

  /** There may be no more zeros than poles; of a conjugate pair both are listed. */
  constructor(poles: readonly Root[], zeros: readonly Root[]) {
    this.ratios = matched(poles, zeros);
    this.table = ratioTable(this.ratios);
  }

  /** ln of the product at a frequency in Hz; −Infinity at a null. */
  logAt(frequencyHz: number): number {
    const quick = tableLogAt(this.table, frequencyHz);
    if (quick !== null) return quick;
    return this.ratios.reduce((sum, ratio) => sum + Math.log(ratioAt(ratio, frequencyHz)), 0);
  }

  /** An enclosure of the logarithm, ratio by ratio; `highHz` may be Infinity. */
  logRange(lowHz: number, highHz: number): Enclosure {
    let low = 0;
    let high = 0;
    for (const ratio of this.ratios) {
      const range = ratioRange(ratio, lowHz, highHz);
      low += Math.log(range.low);
      high += Math.log(range.high);
    }
    return { low, high };
  }

  /**
   * An enclosure of the logarithm's derivative in u over a finite interval, null where a null lies in it: the sum of each ratio's range,
   * met with the mean-value form, which is the tighter one where factors cancel, as they do in a ripple.
   */
  slopeRange(lowHz: number, highHz: number): Enclosure | null {
    const [low, high] = [lowHz * lowHz, highHz * highHz];
    let least = 0;
    let most = 0;
    let atMiddle = 0;
    let leastBend = 0;
    let mostBend = 0;
    for (const ratio of this.ratios) {
      if (hasNull(ratio, lowHz, highHz)) return null;
      const slopes = ratioSlopes(ratio, lowHz, highHz);
      const bends = ratioBends(ratio, low, high);
      least += slopes.low;
      most += slopes.high;
      leastBend += bends.low;
      mostBend += bends.high;
      atMiddle += ratioSlopeAt(ratio, 0.5 * (low + high));
    }
    const reach = 0.5 * (high - low) * Math.max(Math.abs(leastBend), Math.abs(mostBend));
    const enclosure = { low: Math.max(least, atMiddle - reach), high: Math.min(most, atMiddle + reach) };
    return Number.isFinite(enclosure.low) && Number.isFinite(enclosure.high) ? enclosure : null;
  }
}

/** Pairs go to the nearest pairs, single roots to single roots, and what is left by twos to what is left. */
function matched(poles: readonly Root[], zeros: readonly Root[]): readonly SectionRatio[] {
  const polePairs: Section[] = pairsOf(poles);
  const zeroPairs: Section[] = pairsOf(zeros);
  const singlePoles = singlesOf(poles);
  const singleZeros = singlesOf(zeros);
  // Too few pole pairs for the zero pairs: the farthest real poles stand in for them.
  while (polePairs.length < zeroPairs.length) polePairs.push(doubleSection(taken(singlePoles), taken(singlePoles)));
  const ratios = nearestPairs(zeroPairs, polePairs);
  while (singleZeros.length > 0 && singlePoles.length > 0) {
    ratios.push(sectionRatio(singleSection(taken(singleZeros)), singleSection(taken(singlePoles))));
  }
  for (const pole of polePairs) {
    const [one, other] = [singleZeros.pop(), singleZeros.pop()];
    const zero = one === undefined ? null : other === undefined ? singleSection(one) : doubleSection(one, other);
    ratios.push(sectionRatio(zero, pole));
  }
  return [...ratios, ...singlePoles.map((pole) => sectionRatio(null, singleSection(pole)))];
}

function pairsOf(roots: readonly Root[]): PairSection[] {
  return roots.filter((root) => root.im > 0).map(pairSection);
}

/** Real roots, the smallest first. */
function singlesOf(roots: readonly Root[]): number[] {
  return roots
    .filter((root) => root.im === 0)
    .map((root) => root.re)
    .sort((one, other) => Math.abs(one) - Math.abs(other));
}

function taken(singles: number[]): number {
  const last = singles.pop();
  if (last === undefined) throw new RangeError('A filter must not have more zeros than poles.');
  return last;
}

/** Takes the nearest zero and pole out of both lists until no zero is left. */
function nearestPairs(zeros: Section[], poles: Section[]): SectionRatio[] {
  const ratios: SectionRatio[] = [];
  while (zeros.length > 0) {
    const found = zeros.flatMap((zero, z) =>
      poles.map((pole, p) => ({ z, p, apart: Math.abs(Math.log(sizeOf(zero) / sizeOf(pole))) })),
    );
    const { z, p } = found.reduce((best, one) => (one.apart < best.apart ? one : best));
    const [zero] = zeros.splice(z, 1);
    const [pole] = poles.splice(p, 1);
    if (zero !== undefined && pole !== undefined) ratios.push(sectionRatio(zero, pole));
  }
  return ratios;
}

/** The square of a root's size, the geometric mean of two. */
function sizeOf(section: Section): number {
  switch (section.kind) {
    case 'single':
      return section.square;
    case 'double':
      return Math.sqrt(section.near * section.far);
    case 'pair':
      return section.re * section.re + section.im * section.im;
  }
}
