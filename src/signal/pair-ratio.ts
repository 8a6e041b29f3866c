/** A part seen at two frequencies at once, whatever its tolerances make of it: what all such ratios offer, and what is made of them. */
import { negated } from './interval-arithmetic';
import type { RatioSlopes } from './factor-ratio';
import type { Enclosure, Response } from './response';
import type { Sense } from './stretched';

/** The largest H(f)/H(r) over all that the part may be. */
export interface PairRatio<At extends { readonly logGain: number }> {
  /** At two frequencies, with what makes it. */
  at(frequencyHz: number, referenceHz: number): At;
  /** A proved upper bound over boxes of both frequencies. */
  upper(frequencies: Enclosure, references: Enclosure): number;
  /** A lower bound over them. */
  lower(frequencies: Enclosure, references: Enclosure): number;
  /** Enclosures of the slopes in f and r over finite boxes, or null where none is known. */
  slopes(frequencies: Enclosure, references: Enclosure): RatioSlopes | null;
}

/**
 * The largest of several ratios at each pair of frequencies.
 *
 * @param members at least one.
 * @returns slopes that hold those of all that may be the largest somewhere in the boxes.
 * Source: elementary.
 * @example largestRatio([new FactorRatio(filterResponse(realPole(1000)), { low: 1, high: 1 })]).at(1000, 1000).logGain // 0
 */
export function largestRatio<At extends { readonly logGain: number }>(members: readonly PairRatio<At>[]): PairRatio<At> {
  const [first] = members;
  if (first === undefined) throw new RangeError('The largest of no ratios does not exist.');
  if (members.length === 1) return first;
  const least = (f: Enclosure, r: Enclosure): number => Math.max(...members.map((one) => one.lower(f, r)));
  return {
    at: (frequencyHz, referenceHz) =>
      members.map((one) => one.at(frequencyHz, referenceHz)).reduce((best, one) => (one.logGain > best.logGain ? one : best)),
    upper: (f, r) => Math.max(...members.map((one) => one.upper(f, r))),
    lower: least,
    slopes: (f, r) => joined(members.filter((one) => one.upper(f, r) >= least(f, r)).map((one) => one.slopes(f, r))),
  };
}

/**
 * A ratio measured from one frequency as a response: f ↦ H(f)/H(r) at its largest, or at its smallest, which is one over the largest
 * H(r)/H(f).
 *
 * @param referenceHz ≥ 0.
 * Source: elementary.
 * @example measuredFrom(new FactorRatio(filterResponse(realPole(1000)), { low: 0.5, high: 2 }), 0, 'smallest').logGain(1000) // -0.80471896
 */
export function measuredFrom<At extends { readonly logGain: number }>(
  ratio: PairRatio<At>,
  referenceHz: number,
  sense: Sense,
): Response & { at(frequencyHz: number): At } {
  const reference: Enclosure = { low: referenceHz, high: referenceHz };
  if (sense === 'largest') {
    return {
      at: (frequencyHz) => ratio.at(frequencyHz, referenceHz),
      logGain: (frequencyHz) => ratio.at(frequencyHz, referenceHz).logGain,
      bounds: (low, high) => ({ low: ratio.lower({ low, high }, reference), high: ratio.upper({ low, high }, reference) }),
      slope: (low, high) => ratio.slopes({ low, high }, reference)?.frequency ?? null,
    };
  }
  return {
    at: (frequencyHz) => ratio.at(referenceHz, frequencyHz),
    logGain: (frequencyHz) => -ratio.at(referenceHz, frequencyHz).logGain,
    bounds: (low, high) => negated({ low: ratio.lower(reference, { low, high }), high: ratio.upper(reference, { low, high }) }),
    slope: (low, high) => {
      const slopes = ratio.slopes(reference, { low, high });
      return slopes === null ? null : negated(slopes.reference);
    },
  };
}

function joined(slopes: readonly (RatioSlopes | null)[]): RatioSlopes | null {
  const known = slopes.flatMap((one) => one ?? []);
  if (known.length < slopes.length || known.length === 0) return null;
  const hull = (parts: readonly Enclosure[]): Enclosure => ({
    low: Math.min(...parts.map(({ low }) => low)),
    high: Math.max(...parts.map(({ high }) => high)),
  });
  return { frequency: hull(known.map(({ frequency }) => frequency)), reference: hull(known.map(({ reference }) => reference)) };
}
