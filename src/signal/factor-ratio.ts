/** max over a corner factor c of H(f/c)/H(r/c), at points and over boxes of f and r: one part seen at two frequencies at once. */
import { dividedBy, negated, plus, times, unlessNaN } from './interval-arithmetic';
import type { Enclosure, Response } from './response';
import { Frontier, nestedEvaluationLimit } from './search/frontier';
import { toNepers } from './search/gap';
import { openInterval, type Curve } from './search/interval';

/** Slopes of the extreme in f and in r. */
export interface RatioSlopes {
  readonly frequency: Enclosure;
  readonly reference: Enclosure;
}

/** The gap of the search over factors, in nepers: far below that of the search it serves. */
const nestedGap = toNepers(1e-5);

/** How much of a box's own spread the search over factors may leave open. */
const looseness = 0.1;

/** The ratio of one response to itself over a range of corner factors. */
export class FactorRatio {
  constructor(
    private readonly response: Response,
    private readonly factors: Enclosure,
  ) {}

  /** The largest ratio at two frequencies, and the factor that makes it. */
  at(frequencyHz: number, referenceHz: number): { readonly logGain: number; readonly factor: number } {
    const frontier = new Frontier(nestedGap, nestedEvaluationLimit);
    openInterval(frontier, this.curveAt(frequencyHz, referenceHz), this.factors.low, this.factors.high);
    frontier.prove();
    return { logGain: frontier.best, factor: frontier.bestHz };
  }

  /** A proved upper bound over boxes of both frequencies; it tightens as the boxes shrink. */
  upper(frequencies: Enclosure, references: Enclosure): number {
    const frontier = new Frontier(Math.max(nestedGap, looseness * this.spread(frequencies, references)), nestedEvaluationLimit);
    openInterval(frontier, this.curveOver(frequencies, references), this.factors.low, this.factors.high);
    return frontier.prove();
  }

  /** A lower bound over boxes: what the factor nearest 1 gives. */
  lower(frequencies: Enclosure, references: Enclosure): number {
    const factor = this.nominal();
    return unlessNaN(this.boundsAt(frequencies, factor).low - this.boundsAt(references, factor).high, -Infinity);
  }

  /** Enclosures of the slopes in f and r over finite boxes, or null where a null lies inside. */
  slopes(frequencies: Enclosure, references: Enclosure): RatioSlopes | null {
    const sign = this.slopeInFactor(frequencies, references, this.factors);
    const { low, high } = this.factors;
    const factors =
      sign === null ? this.factors : sign.low >= 0 ? { low: high, high } : sign.high <= 0 ? { low, high: low } : this.factors;
    const frequency = this.slopeOver(frequencies, factors);
    const reference = this.slopeOver(references, factors);
    if (frequency === null || reference === null) return null;
    return { frequency, reference: negated(reference) };
  }

  private curveAt(frequencyHz: number, referenceHz: number): Curve {
    const { response } = this;
    const frequencies = { low: frequencyHz, high: frequencyHz };
    const references = { low: referenceHz, high: referenceHz };
    return {
      ...this.curveOver(frequencies, references),
      logGain: (factor) => unlessNaN(response.logGain(frequencyHz / factor) - response.logGain(referenceHz / factor), -Infinity),
    };
  }

  /** Over the factor: where it rises for every pair of frequencies, so does the largest of them. */
  private curveOver(frequencies: Enclosure, references: Enclosure): Curve {
    return {
      tag: 0,
      logGain: (factor) => unlessNaN(this.boundsAt(frequencies, factor).high - this.boundsAt(references, factor).low, Infinity),
      upper: (low, high) => this.boundOver(frequencies, references, { low, high }),
      slope: (low, high) => this.slopeInFactor(frequencies, references, { low, high }),
    };
  }

  private boundsAt(frequencies: Enclosure, factor: number): Enclosure {
    return this.response.bounds(frequencies.low / factor, frequencies.high / factor);
  }

  private boundOver(frequencies: Enclosure, references: Enclosure, factors: Enclosure): number {
    const most = this.response.bounds(frequencies.low / factors.high, frequencies.high / factors.low).high;
    const least = this.response.bounds(references.low / factors.high, references.high / factors.low).low;
    return unlessNaN(most - least, Infinity);
  }

  /** d/dc = (φ(r/c) − φ(f/c))/c, φ(v) = v·d ln|H|/dv. */
  private slopeInFactor(frequencies: Enclosure, references: Enclosure, factors: Enclosure): Enclosure | null {
    const frequency = this.bend(frequencies, factors);
    const reference = this.bend(references, factors);
    if (frequency === null || reference === null) return null;
    const sum = plus(reference, negated(frequency));
    return sum === null ? null : dividedBy(sum, factors);
  }

  /** φ over an interval and factors. */
  private bend(frequencies: Enclosure, factors: Enclosure): Enclosure | null {
    if (frequencies.high === Infinity) return null;
    const low = frequencies.low / factors.high;
    const high = frequencies.high / factors.low;
    const slope = this.response.slope(low, high);
    if (slope === null) return null;
    return times(slope, { low, high });
  }

  private slopeOver(frequencies: Enclosure, factors: Enclosure): Enclosure | null {
    const slope = this.response.slope(frequencies.low / factors.high, frequencies.high / factors.low);
    return slope === null ? null : dividedBy(slope, factors);
  }

  private spread(frequencies: Enclosure, references: Enclosure): number {
    const factor = this.nominal();
    const one = this.boundsAt(frequencies, factor);
    const other = this.boundsAt(references, factor);
    return unlessNaN(one.high - one.low + other.high - other.low, Infinity);
  }

  private nominal(): number {
    return Math.min(Math.max(1, this.factors.low), this.factors.high);
  }
}
