/** What is maximised where F and x both count: the outer gain at F and the inner at x. */
import { negated, plus, unlessNaN } from '../interval-arithmetic';
import type { Enclosure, Response } from '../response';
import type { Curve } from './interval';
import { foldOf, isLower } from './ladder';

/** Where x stands for a frequency on a rung: x = offset + direction·F. */
export interface InnerAxis {
  readonly offset: number;
  readonly direction: 1 | -1;
}

/**
 * The axis of one rung.
 *
 * @example innerAxis(1, 48000).offset // 48000
 */
export function innerAxis(rung: number, rateHz: number): InnerAxis {
  const multiple = foldOf(rung) * rateHz;
  return isLower(rung) ? { offset: multiple, direction: -1 } : { offset: -multiple, direction: 1 };
}

/** The sum of logarithms over F and x. */
export class Sight {
  constructor(
    private readonly outer: Response,
    private readonly inner: Response,
  ) {}

  logGain(frequencyHz: number, x: number): number {
    return unlessNaN(this.outer.logGain(frequencyHz) + this.inner.logGain(x), -Infinity);
  }

  /** An upper bound over boxes of both. */
  upper(frequencies: Enclosure, xs: Enclosure): number {
    return unlessNaN(
      this.outer.bounds(frequencies.low, frequencies.high).high + this.inner.bounds(xs.low, xs.high).high,
      Infinity,
    );
  }

  /** An enclosure of d/dF along x = offset + direction·F. */
  slope(frequencies: Enclosure, xs: Enclosure, direction: 1 | -1): Enclosure | null {
    const outer = this.outer.slope(frequencies.low, frequencies.high);
    const inner = outer === null ? null : this.inner.slope(xs.low, xs.high);
    return plus(outer, inner === null || direction === 1 ? inner : negated(inner));
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
