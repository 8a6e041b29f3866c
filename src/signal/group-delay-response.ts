/** Group delay over frequency in the form that the search for proved maxima takes: the logarithm of a positive function with bounds. */
import type { Filter } from './filter';
import type { Enclosure, Response } from './response';

/** Bounds are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/** One root's share of the delay: strength / (width² + (f − centre)²), in seconds; negative for a zero left of the axis. */
interface Hump {
  readonly strength: number;
  readonly width: number;
  readonly centre: number;
}

/**
 * The group delay of filters in series as a response: τ(f) = Σ w / (2π·(w² + (f − c)²)) over all poles −w + jc and zeros w + jc, less the
 * zeros −w + jc, given as ln((τ + offset) / 1 s) with the offset of `delayOffset`, so that differences of two values are those of τ.
 *
 * Bounds over an interval are the sum of the humps' exact ranges; the slope is (ln τ)′ = τ′/τ with τ′ bounded hump by hump, each
 * of which is steepest at c ± w/√3.
 *
 * @param filters at least one pole in all; poles in Hz with negative real parts.
 * @returns ln(τ + offset) at f ≥ 0; at Infinity ln(offset), −Infinity without one.
 * Source: the derivative of the phase, common practice; the ranges are elementary.
 * @example Math.exp(groupDelayResponse([{ poles: [{ re: -1000, im: 0 }], zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }]).logGain(0)) // 0.000159154943
 */
export function groupDelayResponse(filters: readonly Filter[]): Response {
  return new DelayResponse(filters.flatMap(humpsOf), delayOffset(filters));
}

/**
 * What `groupDelayResponse` adds to the delay in seconds, so that its logarithm exists where zeros left of the axis make it negative: the
 * sum of all that they can take away. 0 without such zeros.
 *
 * @example delayOffset([realPole(1000)]) // 0
 */
export function delayOffset(filters: readonly Filter[]): number {
  return filters.flatMap(humpsOf).reduce((sum, { strength, width }) => sum + Math.max(0, -strength) / (width * width), 0);
}

/** A zero on the axis only steps the phase, which is no delay. */
function humpsOf({ poles, zeros }: Filter): readonly Hump[] {
  const hump = (re: number, im: number): Hump => ({ strength: re / (2 * Math.PI), width: Math.abs(re), centre: im });
  return [...poles.map(({ re, im }) => hump(-re, im)), ...zeros.filter(({ re }) => re !== 0).map(({ re, im }) => hump(re, im))];
}

class DelayResponse implements Response {
  constructor(
    private readonly humps: readonly Hump[],
    private readonly offset: number,
  ) {}

  logGain(frequencyHz: number): number {
    let sum = this.offset;
    for (const hump of this.humps) sum += heightAt(hump, frequencyHz);
    return Math.log(sum);
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const { low, high } = this.range(lowHz, highHz);
    return { low: Math.log(low) - logSlack, high: Math.log(high) + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    const range = this.range(lowHz, highHz);
    if (!(range.low > 0) || highHz === Infinity) return null;
    const steepness = this.steepness(lowHz, highHz);
    const low = steepness.low / (steepness.low < 0 ? range.low : range.high);
    const high = steepness.high / (steepness.high > 0 ? range.low : range.high);
    return { low: low - logSlack * Math.abs(low), high: high + logSlack * Math.abs(high) };
  }

  /** An enclosure of τ′: the sum of the humps' own ranges, met with the mean-value form, which is the tighter one where humps cancel. */
  private steepness(lowHz: number, highHz: number): Enclosure {
    const middle = lowHz + 0.5 * (highHz - lowHz);
    let low = 0;
    let high = 0;
    let atMiddle = 0;
    let leastBend = 0;
    let mostBend = 0;
    for (const hump of this.humps) {
      const slopes = slopeRange(hump, lowHz, highHz);
      const bends = bendRange(hump, lowHz, highHz);
      low += slopes.low;
      high += slopes.high;
      atMiddle += slopeAt(hump, middle);
      leastBend += bends.low;
      mostBend += bends.high;
    }
    const reach = 0.5 * (highHz - lowHz) * Math.max(Math.abs(leastBend), Math.abs(mostBend));
    return { low: Math.max(low, atMiddle - reach), high: Math.min(high, atMiddle + reach) };
  }

  private range(lowHz: number, highHz: number): Enclosure {
    let low = this.offset;
    let high = this.offset;
    for (const hump of this.humps) {
      const range = rangeOf(heightAt, hump, [lowHz, highHz], [hump.centre]);
      low += range.low;
      high += range.high;
    }
    return { low, high };
  }
}

function heightAt({ strength, width, centre }: Hump, frequencyHz: number): number {
  const offset = frequencyHz - centre;
  return strength / (width * width + offset * offset);
}

function slopeAt({ strength, width, centre }: Hump, frequencyHz: number): number {
  const offset = frequencyHz - centre;
  const square = width * width + offset * offset;
  return (-2 * strength * offset) / (square * square);
}

/** A hump rises most at centre − width/√3 and falls most at centre + width/√3; between those and beyond its slope is monotonic. */
function slopeRange(hump: Hump, lowHz: number, highHz: number): Enclosure {
  const offset = hump.width * steepestOffset;
  return rangeOf(slopeAt, hump, [lowHz, highHz], [hump.centre - offset, hump.centre + offset]);
}

function bendAt({ strength, width, centre }: Hump, frequencyHz: number): number {
  const offset = (frequencyHz - centre) ** 2;
  const square = width * width + offset;
  return (2 * strength * (3 * offset - width * width)) / (square * square * square);
}

/** A hump's second derivative is lowest at its centre and highest at centre ± width. */
function bendRange(hump: Hump, lowHz: number, highHz: number): Enclosure {
  const { width, centre } = hump;
  return rangeOf(bendAt, hump, [lowHz, highHz], [centre - width, centre, centre + width]);
}

/** The range of something that is monotonic between its extremes. */
function rangeOf(
  at: (hump: Hump, frequencyHz: number) => number,
  hump: Hump,
  [lowHz, highHz]: readonly [number, number],
  extremesHz: readonly number[],
): Enclosure {
  const atLow = at(hump, lowHz);
  const atHigh = at(hump, highHz);
  let low = Math.min(atLow, atHigh);
  let high = Math.max(atLow, atHigh);
  for (const extremeHz of extremesHz) {
    if (!(lowHz < extremeHz && extremeHz < highHz)) continue;
    const value = at(hump, extremeHz);
    low = Math.min(low, value);
    high = Math.max(high, value);
  }
  return { low, high };
}

const steepestOffset = 1 / Math.sqrt(3);
