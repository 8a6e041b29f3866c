/** Group delay over frequency in the form that the search for proved maxima takes: the logarithm of a positive function with bounds. */
import type { Filter } from './filter';
import type { Enclosure, Response } from './response';

/** Bounds are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/** One pole's share of the delay: strength / (width² + (f − centre)²), in seconds. */
interface Hump {
  readonly strength: number;
  readonly width: number;
  readonly centre: number;
}

/**
 * The group delay of filters in series as a response: τ(f) = Σ w / (2π·(w² + (f − c)²)) over all poles −w + jc, given as ln(τ / 1 s).
 *
 * Bounds over an interval are the sum of the humps' exact ranges; the slope is (ln τ)′ = τ′/τ with τ′ bounded hump by hump, each
 * of which is steepest at c ± w/√3.
 *
 * @param filters at least one pole in all; poles in Hz with negative real parts.
 * @returns ln τ at f ≥ 0; −Infinity at Infinity.
 * Source: the derivative of the phase, common practice; the ranges are elementary.
 * @example Math.exp(groupDelayResponse([{ poles: [{ re: -1000, im: 0 }], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }]).logGain(0)) // 0.000159154943
 */
export function groupDelayResponse(filters: readonly Filter[]): Response {
  const humps = filters.flatMap((filter) =>
    filter.poles.map(({ re, im }) => ({ strength: -re / (2 * Math.PI), width: -re, centre: im })),
  );
  return new DelayResponse(humps);
}

class DelayResponse implements Response {
  constructor(private readonly humps: readonly Hump[]) {}

  logGain(frequencyHz: number): number {
    return Math.log(this.humps.reduce((sum, hump) => sum + heightAt(hump, frequencyHz), 0));
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    const { low, high } = this.range(lowHz, highHz);
    return { low: Math.log(low) - logSlack, high: Math.log(high) + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    let steepestDown = 0;
    let steepestUp = 0;
    for (const hump of this.humps) {
      const slopes = slopeRange(hump, lowHz, highHz);
      steepestDown += slopes.low;
      steepestUp += slopes.high;
    }
    const range = this.range(lowHz, highHz);
    if (!(range.low > 0)) return null;
    const low = steepestDown / (steepestDown < 0 ? range.low : range.high);
    const high = steepestUp / (steepestUp > 0 ? range.low : range.high);
    return { low: low - logSlack * Math.abs(low), high: high + logSlack * Math.abs(high) };
  }

  private range(lowHz: number, highHz: number): Enclosure {
    let low = 0;
    let high = 0;
    for (const hump of this.humps) {
      const atLow = heightAt(hump, lowHz);
      const atHigh = heightAt(hump, highHz);
      low += Math.min(atLow, atHigh);
      high += lowHz < hump.centre && hump.centre < highHz ? heightAt(hump, hump.centre) : Math.max(atLow, atHigh);
    }
    return { low, high };
  }
}

function heightAt({ strength, width, centre }: Hump, frequencyHz: number): number {
  return strength / (width * width + (frequencyHz - centre) ** 2);
}

function slopeAt({ strength, width, centre }: Hump, frequencyHz: number): number {
  const offset = frequencyHz - centre;
  return (-2 * strength * offset) / (width * width + offset * offset) ** 2;
}

/** A hump rises most at centre − width/√3 and falls most at centre + width/√3; between those and beyond its slope is monotonic. */
function slopeRange(hump: Hump, lowHz: number, highHz: number): Enclosure {
  const offset = hump.width * steepestOffset;
  const atLow = slopeAt(hump, lowHz);
  const atHigh = slopeAt(hump, highHz);
  const rises = hump.centre - offset;
  const falls = hump.centre + offset;
  return {
    low: lowHz < falls && falls < highHz ? slopeAt(hump, falls) : Math.min(atLow, atHigh),
    high: lowHz < rises && rises < highHz ? slopeAt(hump, rises) : Math.max(atLow, atHigh),
  };
}

const steepestOffset = 1 / Math.sqrt(3);
