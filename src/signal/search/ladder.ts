/** The frequencies k·rate ± x of one band as rungs numbered upwards: 0 is x itself, 2k − 1 lies below k·rate, 2k above it. */
import type { Enclosure } from '../response';
import type { FoldQuestion } from './extreme';

/** Two frequencies closer than this, relatively, meet: they come from decimal fractions that double precision cannot hold. */
const meetSlack = 1e-12;

/** Rungs of one band, cut to one allowed interval. */
export class Ladder {
  /** First and last rung that reach the allowed interval, or last < first for none; last may be Infinity. */
  readonly first: number;
  readonly last: number;
  /** 1 for both sides, 2 for one. */
  readonly stride: number;

  constructor(
    private readonly question: FoldQuestion,
    readonly band: Enclosure,
    private readonly within: Enclosure,
  ) {
    const upper = question.sides === 'lower' ? none : this.foldsAbove();
    const lower = question.sides === 'upper' ? none : this.foldsBelow();
    const hasUpper = upper.low <= upper.high;
    const hasLower = lower.low <= lower.high;
    this.first = Math.min(hasUpper ? 2 * upper.low : Infinity, hasLower ? 2 * lower.low - 1 : Infinity);
    this.last = Math.max(hasUpper ? 2 * upper.high : -Infinity, hasLower ? 2 * lower.high - 1 : -Infinity);
    this.stride = question.sides === 'both' ? 1 : 2;
  }

  /** The frequencies of one rung inside the allowed interval, or null. */
  interval(rung: number): Enclosure | null {
    const { low, high } = this.whole(rung);
    const from = Math.max(low, this.within.low, 0);
    const to = Math.min(high, this.within.high);
    const touches = to - from <= meetSlack * from;
    // Neighbours at fold 0 that only touch share no frequency: a band may end where another begins.
    if (rung === 0 && touches && high > low && this.within.high > this.within.low) return null;
    if (from <= to) return { low: from, high: to };
    if (!touches || from - to > meetSlack * from) return null;
    return this.within.low > high ? { low: this.within.low, high: this.within.low } : { low: to, high: to };
  }

  /** Everything from one rung to another, gaps included; `last` may be Infinity. */
  hull(first: number, last: number): Enclosure {
    const low = Math.min(this.whole(first).low, this.whole(first + 1).low);
    const high = last === Infinity ? Infinity : Math.max(this.whole(last).high, this.whole(last - 1).high);
    return { low: Math.max(low, this.within.low, 0), high: Math.min(high, this.within.high) };
  }

  /** The x that belongs to a frequency on a rung; with a rate interval that of the rate nearest its middle. */
  landing(rung: number, frequencyHz: number): number {
    const fold = foldOf(rung);
    const { rateHz } = this.question;
    const at = (rate: number): number => (isLower(rung) ? fold * rate - frequencyHz : frequencyHz - fold * rate);
    return Math.min(Math.max(at(0.5 * (rateHz.low + rateHz.high)), this.band.low), this.band.high);
  }

  private whole(rung: number): Enclosure {
    const fold = foldOf(rung);
    const { low, high } = this.question.rateHz;
    return isLower(rung)
      ? { low: fold * low - this.band.high, high: fold * high - this.band.low }
      : { low: fold * low + this.band.low, high: fold * high + this.band.high };
  }

  private foldsAbove(): Enclosure {
    return this.folds(this.within.low - this.band.high, this.within.high - this.band.low, 0);
  }

  private foldsBelow(): Enclosure {
    return this.folds(this.within.low + this.band.low, this.within.high + this.band.high, 1);
  }

  /** Folds whose multiples of the rate reach [low, high], with a slack that `interval` takes back. */
  private folds(low: number, high: number, least: number): Enclosure {
    const { rateHz, firstFold, lastFold } = this.question;
    const first = Math.ceil((low / rateHz.high) * (1 - meetSlack) - meetSlack);
    const last = Math.floor((high / rateHz.low) * (1 + meetSlack) + meetSlack);
    return { low: Math.max(first, firstFold, least), high: Math.min(last, lastFold) };
  }
}

const none: Enclosure = { low: 1, high: 0 };

/**
 * The multiple of the rate that a rung lies beside.
 *
 * @example foldOf(5) // 3
 */
export function foldOf(rung: number): number {
  return Math.ceil(rung / 2);
}

/**
 * Whether a rung lies below its multiple of the rate.
 *
 * @example isLower(5) // true
 */
export function isLower(rung: number): boolean {
  return rung % 2 === 1;
}
