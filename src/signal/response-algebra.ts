/** Responses made of responses: in series, turned over, and constant. */
import { negated, plus, unlessNaN } from './interval-arithmetic';
import type { Enclosure, Response } from './response';

/**
 * Responses in series: the gains multiply, their logarithms, bounds and slopes add.
 *
 * @param responses any number; none gives the constant 1, one is handed back as it is.
 * @returns a slope of null where any part has none; bounds of (−∞, ∞) where a null meets a pole.
 * Source: interval arithmetic, common practice.
 * @example product([constantResponse(-1), constantResponse(0.25)]).logGain(100) // -0.75
 */
export function product(responses: readonly Response[]): Response {
  const [first] = responses;
  if (first === undefined) return constantResponse(0);
  return responses.length === 1 ? first : new Product(responses);
}

/**
 * One over a response: its smallest gain becomes the largest.
 *
 * @param response any; its exact nulls become +Infinity.
 * Source: elementary.
 * @example inverse(constantResponse(-2)).logGain(100) // 2
 */
export function inverse(response: Response): Response {
  return new Inverse(response);
}

/**
 * The same gain at every frequency, 0 Hz and infinity included.
 *
 * @param logGain natural logarithm of the gain.
 * Source: elementary.
 * @example constantResponse(-0.5).bounds(0, Infinity).high // -0.5
 */
export function constantResponse(logGain: number): Response {
  return {
    logGain: () => logGain,
    bounds: () => ({ low: logGain, high: logGain }),
    slope: () => ({ low: 0, high: 0 }),
    turnsHz: [],
  };
}

/**
 * The largest of several gains at each frequency.
 *
 * @param responses at least one.
 * @returns a slope that holds all of theirs, null where any has none.
 * Source: elementary.
 * @example largestOf([constantResponse(-1), constantResponse(0.25)]).logGain(100) // 0.25
 */
export function largestOf(responses: readonly Response[]): Response {
  const most = (values: readonly number[]): number => values.reduce((a, b) => Math.max(a, b), -Infinity);
  return {
    logGain: (frequencyHz) => most(responses.map((one) => one.logGain(frequencyHz))),
    bounds: (lowHz, highHz) => {
      const all = responses.map((one) => one.bounds(lowHz, highHz));
      return { low: most(all.map(({ low }) => low)), high: most(all.map(({ high }) => high)) };
    },
    slope: (lowHz, highHz) => {
      const all = responses.flatMap((one) => one.slope(lowHz, highHz) ?? []);
      if (all.length < responses.length) return null;
      return { low: -most(all.map(({ low }) => -low)), high: most(all.map(({ high }) => high)) };
    },
  };
}

class Product implements Response {
  constructor(private readonly parts: readonly Response[]) {}

  logGain(frequencyHz: number): number {
    let sum = 0;
    for (const part of this.parts) sum += part.logGain(frequencyHz);
    // A null in series with a pole of infinite gain has no value of its own; no gain at all is what a null leaves.
    return Number.isNaN(sum) && !Number.isNaN(frequencyHz) ? -Infinity : sum;
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    let low = 0;
    let high = 0;
    for (const part of this.parts) {
      const bounds = part.bounds(lowHz, highHz);
      low += bounds.low;
      high += bounds.high;
    }
    return { low: unlessNaN(low, -Infinity), high: unlessNaN(high, Infinity) };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    let sum: Enclosure | null = { low: 0, high: 0 };
    for (const part of this.parts) {
      sum = plus(sum, part.slope(lowHz, highHz));
      if (sum === null) return null;
    }
    return sum;
  }
}

class Inverse implements Response {
  readonly turnsHz?: readonly number[];

  constructor(private readonly inner: Response) {
    if (inner.turnsHz !== undefined) this.turnsHz = inner.turnsHz;
  }

  logGain(frequencyHz: number): number {
    return -this.inner.logGain(frequencyHz);
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    return negated(this.inner.bounds(lowHz, highHz));
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    const slope = this.inner.slope(lowHz, highHz);
    return slope === null ? null : negated(slope);
  }
}
