/** A response whose frequency axis may be stretched by any factor of a range, taken at its worst: a corner with a tolerance. */
import { FactorRatio } from './factor-ratio';
import { dividedBy } from './interval-arithmetic';
import { inverse } from './response-algebra';
import type { Enclosure, Response } from './response';
import type { SearchOptions } from './search/extreme';
import { nestedEvaluationLimit } from './search/frontier';
import { largestOverBands } from './search/largest-over-bands';

/** Which extreme is wanted. */
export type Sense = 'largest' | 'smallest';

/** The worst of a stretched response at each frequency, and the factor that makes it. */
export interface StretchedResponse extends Response {
  /** The factor on the corner at which the extreme is reached at this frequency. */
  factorAt(frequencyHz: number): number;
}

/**
 * The extreme of H(f/c) over every corner factor c in a range, at each frequency by itself.
 *
 * f/c runs over [f/high, f/low]; the extreme over it comes from the ends and the turning points inside where those are known, else from
 * a proved search. So a ripple that is worst between the ends of the tolerance is found. Several stages that vary on their own: take
 * each stage's extreme and multiply.
 *
 * @param response the stage at its nominal corner.
 * @param factors range of c, 0 < low ≤ high; 0.96 … 1.04 for ± 4 %.
 * @returns a response; its bounds and slope are those of the extreme.
 * Source: interval arithmetic; the slope by the envelope theorem (the extreme moves as the member that makes it).
 * @example Math.exp(stretched(filterResponse(realPole(1000)), { low: 0.5, high: 2 }, 'largest').logGain(2000)) // 0.70710678
 */
export function stretched(response: Response, factors: Enclosure, sense: Sense): StretchedResponse {
  checkFactors(factors);
  return sense === 'largest' ? new Stretched(response, factors, 0) : turnedOver(new Stretched(inverse(response), factors, 0));
}

/**
 * The extreme of H(f/c)/H(reference/c) over every corner factor c in a range: a gain against the same parts' gain at a reference.
 *
 * d/dc of the logarithm is (φ(reference/c) − φ(f/c))/c with φ(v) = v·d ln|H|/dv: where its sign is known the factor is at an end,
 * else the range of c is searched with proof, to 1e−5 dB.
 *
 * @param response the stage at its nominal corner.
 * @param referenceHz ≥ 0; at 0 Hz the reference does not move.
 * @param factors range of c, 0 < low ≤ high.
 * Source: interval branch and bound, common practice.
 * @example Math.exp(stretchedRatio(filterResponse(realPole(1000)), 1000, { low: 0.5, high: 2 }, 'largest').logGain(2000)) // 0.790569415
 */
export function stretchedRatio(response: Response, referenceHz: number, factors: Enclosure, sense: Sense): StretchedResponse {
  checkFactors(factors);
  const signed = sense === 'largest' ? response : inverse(response);
  const ratio =
    referenceHz === 0 ? new Stretched(signed, factors, signed.logGain(0)) : new StretchedRatio(signed, factors, referenceHz);
  return sense === 'largest' ? ratio : turnedOver(ratio);
}

/** A nested search: its gap in dB lies far below that of the search it serves. */
const nested: SearchOptions = { gapDb: 1e-5, evaluationLimit: nestedEvaluationLimit };

function checkFactors({ low, high }: Enclosure): void {
  if (!(low > 0 && low <= high && high < Infinity))
    throw new RangeError(`Corner factors must lie above 0, not ${low} .. ${high}.`);
}

/** max over c of H(f/c), less a constant. */
class Stretched implements StretchedResponse {
  constructor(
    private readonly response: Response,
    private readonly factors: Enclosure,
    private readonly offset: number,
  ) {}

  logGain(frequencyHz: number): number {
    return this.response.logGain(this.worstHz(frequencyHz)) - this.offset;
  }

  factorAt(frequencyHz: number): number {
    const { low, high } = this.factors;
    const worstHz = this.worstHz(frequencyHz);
    if (frequencyHz === 0 || frequencyHz === Infinity) return Math.min(Math.max(1, low), high);
    if (worstHz === frequencyHz / high) return high;
    return worstHz === frequencyHz / low ? low : frequencyHz / worstHz;
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const { low, high } = this.factors;
    const most = this.most(lowHz / high, highHz / low);
    const atLow = this.response.bounds(lowHz / low, highHz / low).low;
    const atHigh = this.response.bounds(lowHz / high, highHz / high).low;
    return { low: Math.max(atLow, atHigh) - this.offset, high: most - this.offset };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    const { low, high } = this.factors;
    const whole = this.response.slope(lowHz / high, highHz / low);
    if (whole === null) return null;
    if (whole.high <= 0) return scaled(this.response.slope(lowHz / high, highHz / high), { low: high, high });
    if (whole.low >= 0) return scaled(this.response.slope(lowHz / low, highHz / low), { low, high: low });
    return scaled(whole, this.factors);
  }

  /** An upper bound over an interval of the nominal axis, tight even where the interval is wide. */
  private most(lowHz: number, highHz: number): number {
    const { response } = this;
    if (response.turnsHz !== undefined) return response.bounds(lowHz, highHz).high;
    return largestOverBands(response, [{ low: lowHz, high: highHz }], nested)?.logGain ?? -Infinity;
  }

  private worstHz(frequencyHz: number): number {
    const lowHz = frequencyHz / this.factors.high;
    const highHz = frequencyHz / this.factors.low;
    // Without a turning point in between the worst is at an end, which needs no search.
    if (this.response.turnsHz?.length === 0) return this.response.logGain(highHz) > this.response.logGain(lowHz) ? highHz : lowHz;
    return largestOverBands(this.response, [{ low: lowHz, high: highHz }], nested)?.frequencyHz ?? frequencyHz;
  }
}

/** max over c of H(f/c)/H(reference/c). */
class StretchedRatio implements StretchedResponse {
  private readonly ratio: FactorRatio;

  constructor(
    response: Response,
    factors: Enclosure,
    private readonly referenceHz: number,
  ) {
    this.ratio = new FactorRatio(response, factors);
  }

  logGain(frequencyHz: number): number {
    return this.ratio.at(frequencyHz, this.referenceHz).logGain;
  }

  factorAt(frequencyHz: number): number {
    return this.ratio.at(frequencyHz, this.referenceHz).factor;
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const frequencies = { low: lowHz, high: highHz };
    const references = { low: this.referenceHz, high: this.referenceHz };
    return { low: this.ratio.lower(frequencies, references), high: this.ratio.upper(frequencies, references) };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    const frequencies = { low: lowHz, high: highHz };
    const references = { low: this.referenceHz, high: this.referenceHz };
    return this.ratio.slopes(frequencies, references)?.frequency ?? null;
  }
}

/** A largest of the inverse is a smallest turned over. */
function turnedOver(largest: StretchedResponse): StretchedResponse {
  const smallest = inverse(largest);
  return {
    logGain: (frequencyHz) => smallest.logGain(frequencyHz),
    bounds: (lowHz, highHz) => smallest.bounds(lowHz, highHz),
    slope: (lowHz, highHz) => smallest.slope(lowHz, highHz),
    factorAt: (frequencyHz) => largest.factorAt(frequencyHz),
  };
}

function scaled(slope: Enclosure | null, factors: Enclosure): Enclosure | null {
  return slope === null ? null : dividedBy(slope, factors);
}
