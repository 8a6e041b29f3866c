/** The gain of a filter with finitely many taps, with exact bounds. */
import type { Enclosure, Response } from '../response';
import { firAmplitude, firPower, tapSymmetry } from './fir-amplitude';
import { repeating, type HalfPeriod } from './repeating';
import type { TrigonometricSum } from './trigonometric-sum';
import { TurningRange } from './turning-range';

/** Bounds are widened by this, relatively, in place of directed rounding of the logarithm. */
const logSlack = 1e-12;

/**
 * The gain |Σ h_k·e^{−j2πkf}| of taps h, f as a share of the rate.
 *
 * Symmetric taps (even or odd) have a real amplitude, and every place where it turns is found and proved once; from these the range
 * over any interval is exact to rounding, and its slope likewise. Other taps are taken by the square of their gain, whose bounds
 * are blunt below 1e−7 of the largest gain.
 *
 * @param taps at least one finite number; their sum is the gain at 0 Hz, a negative one by its size.
 * @param rateHz of the grid that they run on, above 0.
 * @returns ln|H|.
 * @throws RangeError without taps or where one is not finite.
 * Source: any text on linear phase.
 * @example Math.exp(firResponse([0.25, 0.5, 0.25], 48000).logGain(12000)) // 0.5
 */
export function firResponse(taps: readonly number[], rateHz: number): Response {
  if (taps.length === 0 || !taps.every(Number.isFinite)) throw new RangeError('A filter must have taps, each a finite number.');
  const symmetric = tapSymmetry(taps) !== 'none';
  if (symmetric) return repeating(new SumGain(firAmplitude(taps), 1), rateHz);
  const half = new SumGain(firPower(taps), 0.5);
  return repeating(
    withValue(half, (share) => logMagnitude(taps, share)),
    rateHz,
  );
}

/** exponent·ln|T| of a trigonometric sum T. */
class SumGain implements HalfPeriod {
  private readonly range: TurningRange;
  private readonly steepness: TurningRange;

  constructor(
    private readonly sum: TrigonometricSum,
    private readonly exponent: number,
  ) {
    this.range = new TurningRange(sum);
    this.steepness = new TurningRange(sum.derivative());
  }

  logGain(share: number): number {
    return this.exponent * Math.log(Math.abs(this.sum.at(share)));
  }

  bounds(low: number, high: number): Enclosure {
    const range = this.range.over(low, high);
    const size = sizeRange(range);
    return {
      low: this.exponent * Math.log(size.low) - logSlack,
      high: this.exponent * Math.log(size.high) + logSlack,
    };
  }

  slope(low: number, high: number): Enclosure | null {
    const value = this.range.over(low, high);
    if (value.low <= 0 && value.high >= 0) return null;
    const slope = this.steepness.over(low, high);
    const ratios = [value.low, value.high].flatMap((divisor) => [slope.low / divisor, slope.high / divisor]);
    return { low: this.exponent * Math.min(...ratios), high: this.exponent * Math.max(...ratios) };
  }
}

function sizeRange({ low, high }: Enclosure): Enclosure {
  const size = { low: Math.min(Math.abs(low), Math.abs(high)), high: Math.max(Math.abs(low), Math.abs(high)) };
  return low <= 0 && high >= 0 ? { low: 0, high: size.high } : size;
}

/** The same with values from elsewhere, which its bounds hold too. */
function withValue(half: HalfPeriod, logGain: (share: number) => number): HalfPeriod {
  return {
    logGain,
    bounds: (low, high) => half.bounds(low, high),
    slope: (low, high) => half.slope(low, high),
  };
}

/** ln|Σ h_k·e^{−j2πkx}|, without the loss of squaring. */
function logMagnitude(taps: readonly number[], share: number): number {
  let re = 0;
  let im = 0;
  taps.forEach((tap, k) => {
    const angle = 2 * Math.PI * (k * share - Math.round(k * share));
    re += tap * Math.cos(angle);
    im += tap * Math.sin(angle);
  });
  return Math.log(Math.hypot(re, im));
}
