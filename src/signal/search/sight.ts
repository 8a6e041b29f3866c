/** What is maximised where F and x both count: the outer gain at F, the inner at x, and parts seen at both with one corner factor. */
import { FactorRatio } from '../factor-ratio';
import { negated, plus, unlessNaN } from '../interval-arithmetic';
import type { Enclosure, Response } from '../response';
import type { Coupled } from './extreme';
import type { Curve } from './interval';
import { foldOf, isLower } from './ladder';

/** Where x stands for a frequency on a rung: x = offset + direction·F. */
export interface InnerAxis {
  readonly offset: number;
  readonly direction: 1 | -1;
}

/** The axis of one rung. */
export function innerAxis(rung: number, rateHz: number): InnerAxis {
  const multiple = foldOf(rung) * rateHz;
  return isLower(rung) ? { offset: multiple, direction: -1 } : { offset: -multiple, direction: 1 };
}

/** The sum of logarithms over F and x. */
export class Sight {
  private readonly ratios: readonly FactorRatio[];

  constructor(
    private readonly outer: Response,
    private readonly inner: Response | null,
    coupled: readonly Coupled[],
  ) {
    this.ratios = coupled.map(({ response, factors }) => new FactorRatio(response, factors));
  }

  logGain(frequencyHz: number, x: number): number {
    let sum = this.outer.logGain(frequencyHz) + (this.inner?.logGain(x) ?? 0);
    for (const ratio of this.ratios) sum += ratio.at(frequencyHz, x).logGain;
    return unlessNaN(sum, -Infinity);
  }

  /** An upper bound over boxes of both. */
  upper(frequencies: Enclosure, xs: Enclosure): number {
    let sum = this.outer.bounds(frequencies.low, frequencies.high).high + (this.inner?.bounds(xs.low, xs.high).high ?? 0);
    for (const ratio of this.ratios) sum += ratio.upper(frequencies, xs);
    return unlessNaN(sum, Infinity);
  }

  /** An enclosure of d/dF along x = offset + direction·F. */
  slope(frequencies: Enclosure, xs: Enclosure, direction: 1 | -1): Enclosure | null {
    const alongX = (slope: Enclosure | null): Enclosure | null => (slope === null || direction === 1 ? slope : negated(slope));
    let sum = this.outer.slope(frequencies.low, frequencies.high);
    if (sum !== null && this.inner !== null) sum = plus(sum, alongX(this.inner.slope(xs.low, xs.high)));
    for (const ratio of this.ratios) {
      if (sum === null) return null;
      const slopes = ratio.slopes(frequencies, xs);
      sum = slopes === null ? null : plus(plus(sum, slopes.frequency), alongX(slopes.reference));
    }
    return sum;
  }
}

/** One rung of it. */
export class SightCurve implements Curve {
  constructor(
    readonly tag: number,
    private readonly sight: Sight,
    private readonly axis: InnerAxis,
    private readonly band: Enclosure,
  ) {}

  logGain(frequencyHz: number): number {
    return this.sight.logGain(frequencyHz, this.innerHz(frequencyHz));
  }

  upper(lowHz: number, highHz: number): number {
    return this.sight.upper({ low: lowHz, high: highHz }, this.innerInterval(lowHz, highHz));
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    return this.sight.slope({ low: lowHz, high: highHz }, this.innerInterval(lowHz, highHz), this.axis.direction);
  }

  /** Held inside the band against rounding. */
  private innerHz(frequencyHz: number): number {
    return Math.min(Math.max(this.axis.offset + this.axis.direction * frequencyHz, this.band.low), this.band.high);
  }

  private innerInterval(lowHz: number, highHz: number): Enclosure {
    const atLow = this.innerHz(lowHz);
    const atHigh = this.innerHz(highHz);
    return this.axis.direction === 1 ? { low: atLow, high: atHigh } : { low: atHigh, high: atLow };
  }
}
