/** The exponential pulse, which decays from its start and is cut off at its width, as the magnitude of its spectrum. */
import type { Enclosure, Response } from '../response';
import { hyperbolicCotangent, langevin } from './langevin';
import { sineOfTurns } from './sinc';
import { hullOf, humpRange, sineRange } from './turning';

/** Bounds are widened by this, in place of directed rounding. */
const slack = 1e-9;

/**
 * The magnitude of an exponential pulse's spectrum, normalised to unit area. With a = w/2τ and y = πfw,
 * |P(f)|² = (1 + (sin y/sinh a)²)/(1 + (y/a)²), a form that loses nothing from τ ≪ w (one real pole) to τ ≫ w (a rectangle).
 *
 * Its nulls are at y = nπ + ja, n ≠ 0: while y ≤ π − a none has been met and the gain and its slope only fall; beyond that the bounds
 * are those of numerator and denominator.
 *
 * @param widthSeconds w > 0 in s, where it is cut off.
 * @param decaySeconds τ > 0 in s.
 * @returns ln|P|: 0 at 0 Hz, −Infinity at Infinity only.
 * Source: the transform of e^{−t/τ} on [0, w]; the other form by cosh 2a − cos 2y = 2(sinh² a + sin² y).
 * @example Math.exp(exponentialResponse(1, 0.2).logGain(1)) // 0.622676992
 */
export function exponentialResponse(widthSeconds: number, decaySeconds: number): Response {
  return new ExponentialResponse(widthSeconds, halfDecays(widthSeconds, decaySeconds));
}

/**
 * a = w/2τ; below 1e−100 the pulse is a rectangle in every digit, and squares stay above 0.
 *
 * @example halfDecays(1, 0.2) // 2.5
 */
export function halfDecays(widthSeconds: number, decaySeconds: number): number {
  return Math.max(1e-100, widthSeconds / (2 * decaySeconds));
}

class ExponentialResponse implements Response {
  /** Up to here, in f·w, gain and slope only fall. */
  private readonly fallsTo: number;

  constructor(
    private readonly width: number,
    private readonly a: number,
  ) {
    this.fallsTo = Math.max(0, 1 - a / Math.PI);
  }

  logGain(frequencyHz: number): number {
    return this.at(frequencyHz * this.width);
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const { low, high } = this.piecewise(
      lowHz,
      highHz,
      (x) => this.at(x),
      (range) => this.rippleBounds(range),
    );
    return { low: low - slack, high: high + slack };
  }

  slope(lowHz: number, highHz: number): Enclosure {
    const falling = (x: number): number => -langevin(this.a, x).im;
    const { low, high } = this.piecewise(lowHz, highHz, falling, (range) => this.rippleSlope(range));
    const scale = Math.PI * this.width;
    return { low: scale * (low - slack * Math.abs(low)), high: scale * (high + slack * Math.abs(high)) };
  }

  private at(x: number): number {
    if (x === Infinity) return -Infinity;
    return logHypotenuse(sineOfTurns(x) / Math.sinh(this.a)) - logHypotenuse((Math.PI * x) / this.a);
  }

  /** Ends where something falls, bounds beyond that. */
  private piecewise(
    lowHz: number,
    highHz: number,
    falling: (x: number) => number,
    beyond: (range: Enclosure) => Enclosure,
  ): Enclosure {
    const low = lowHz * this.width;
    const high = highHz * this.width;
    if (low >= this.fallsTo) return beyond({ low, high });
    const fall = { low: falling(Math.min(high, this.fallsTo)), high: falling(low) };
    return high <= this.fallsTo ? fall : hullOf(fall, beyond({ low: this.fallsTo, high }));
  }

  private rippleBounds({ low, high }: Enclosure): Enclosure {
    const sines = sineRange(low, high);
    const denominator = (x: number): number => logHypotenuse((Math.PI * x) / this.a);
    return {
      low: high === Infinity ? -Infinity : logHypotenuse(sines.low / Math.sinh(this.a)) - denominator(high),
      high: logHypotenuse(sines.high / Math.sinh(this.a)) - denominator(low),
    };
  }

  /** The range of sin y·cos y/(sinh² a + sin² y) less that of y/(a² + y²). */
  private rippleSlope({ low, high }: Enclosure): Enclosure {
    const { a } = this;
    const ripple = (x: number): number => -hyperbolicCotangent(a, x).im;
    const crest = Math.atan(Math.sinh(2 * a)) / (2 * Math.PI);
    const ends = [ripple(low), ripple(high)] as const;
    const peak = 1 / Math.sinh(2 * a);
    const most = hasMultiple(low - crest, high - crest) ? peak : Math.max(...ends);
    const least = hasMultiple(low + crest, high + crest) ? -peak : Math.min(...ends);
    const pole = humpRange((y) => y / (a * a + y * y), a, { low: Math.PI * low, high: Math.PI * high });
    const rounding = 1e-12 * (Math.abs(most) + Math.abs(least) + pole.high);
    return { low: least - pole.high - rounding, high: most - pole.low + rounding };
  }
}

/** ln √(1 + t²), from the smallest t to the largest. */
function logHypotenuse(t: number): number {
  const size = Math.abs(t);
  return size > 1e100 ? Math.log(size) : 0.5 * Math.log1p(size * size);
}

/** Whether a whole number lies in an interval. */
function hasMultiple(low: number, high: number): boolean {
  return Math.floor(high) >= Math.ceil(low);
}
