/** A rational analogue filter given by its poles, and what follows from them: magnitude with proved bounds, phase and group delay. */
import type { Enclosure, Response } from './response';
import { Sections, type Root } from './sections';

export type { Root } from './sections';

/** A low-pass filter by its poles and its gain at one frequency; never by polynomial coefficients. */
export interface Filter {
  /** In Hz, all in the left half plane; of a conjugate pair both are listed. */
  readonly poles: readonly Root[];
  /** |H| at one frequency in Hz; fixes the constant. */
  readonly gainAt: { readonly frequencyHz: number; readonly gain: number };
  /** Every frequency above 0 Hz where |H| turns between rising and falling, ascending, where the family knows them; null where it does not. */
  readonly turnsHz: readonly number[] | null;
}

/** Bounds of ln|H| are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/**
 * The magnitude of a filter, with proved bounds.
 *
 * ln|H| = ln g + ½·Σ ln(section(f_g²)/section(f²)) over first- and second-order sections in u = f². Where all turning points are
 * known, bounds over an interval come from its ends and the turning points inside and are exact to rounding; otherwise they are the
 * product of the sections' ranges. The slope is bounded term by term, and has the known sign between turning points.
 *
 * @param filter poles in Hz with negative real parts; `gainAt.gain` > 0.
 * @returns ln|H| at f ≥ 0; −Infinity at f = Infinity where there is any pole; NaN at NaN. No poles: constant.
 * Source: physics of rational transfer functions, common practice; the sections' ranges are elementary.
 * @example Math.exp(filterResponse({ poles: [{ re: -1000, im: 0 }], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }).logGain(1000)) // 0.70710678
 */
export function filterResponse(filter: Filter): Response {
  return new FilterResponse(filter);
}

/**
 * The phase of a filter in radians, continuous from 0 at 0 Hz: φ = −Σ atan2(f − im, −re).
 *
 * @param filter poles in Hz with negative real parts.
 * @param frequencyHz f ≥ 0; at Infinity the limit, −π/2 a pole.
 * Source: common practice.
 * @example phaseRad({ poles: [{ re: -1000, im: 0 }], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }, 1000) // -0.78539816
 */
export function phaseRad(filter: Filter, frequencyHz: number): number {
  return filter.poles.reduce((sum, pole) => sum - Math.atan2(frequencyHz - pole.im, -pole.re), 0);
}

/**
 * The group delay of a filter in seconds, in closed form: −dφ/dω = Σ −re / (2π·(re² + (f − im)²)).
 *
 * @param filter poles in Hz with negative real parts.
 * @param frequencyHz f ≥ 0; 0 at Infinity.
 * Source: the derivative of the phase, common practice.
 * @example groupDelay({ poles: [{ re: -1000, im: 0 }], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }, 0) // 0.000159154943
 */
export function groupDelay(filter: Filter, frequencyHz: number): number {
  return filter.poles.reduce((sum, { re, im }) => sum - re / (2 * Math.PI * (re * re + (frequencyHz - im) ** 2)), 0);
}

class FilterResponse implements Response {
  readonly turnsHz?: readonly number[];
  private readonly sections: Sections;
  private readonly constant: number;
  private readonly turnGains: readonly number[];

  constructor(filter: Filter) {
    checkFilter(filter);
    this.sections = new Sections(filter.poles);
    this.constant = Math.log(filter.gainAt.gain) + 0.5 * this.sections.logAt(filter.gainAt.frequencyHz ** 2);
    if (filter.turnsHz !== null) this.turnsHz = filter.turnsHz;
    this.turnGains = filter.turnsHz?.map((turn) => this.logGain(turn)) ?? [];
  }

  logGain(frequencyHz: number): number {
    return this.constant - 0.5 * this.sections.logAt(frequencyHz * frequencyHz);
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    if (this.turnsHz !== undefined) return this.boundsByTurns(this.turnsHz, lowHz, highHz);
    const range = this.sections.logRange(lowHz * lowHz, highHz * highHz);
    return { low: this.constant - 0.5 * range.high - logSlack, high: this.constant - 0.5 * range.low + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure {
    const range = this.sections.slopeRange(lowHz * lowHz, highHz * highHz);
    // d ln|H|/df = −½·2f·d ln(sections)/du
    const low = Math.min(-range.high * lowHz, -range.high * highHz);
    const high = Math.max(-range.low * lowHz, -range.low * highHz);
    const slack = logSlack * (Math.abs(low) + Math.abs(high));
    return this.withKnownSign(lowHz, highHz, { low: low - slack, high: high + slack });
  }

  private boundsByTurns(turnsHz: readonly number[], lowHz: number, highHz: number): Enclosure {
    const atLow = this.logGain(lowHz);
    const atHigh = this.logGain(highHz);
    let low = Math.min(atLow, atHigh);
    let high = Math.max(atLow, atHigh);
    for (let index = turnsUpTo(turnsHz, lowHz); index < turnsHz.length; index += 1) {
      if ((turnsHz[index] ?? Infinity) >= highHz) break;
      const gain = this.turnGains[index] ?? 0;
      low = Math.min(low, gain);
      high = Math.max(high, gain);
    }
    return { low: low - logSlack, high: high + logSlack };
  }

  /** Above the last turning point a low-pass falls, so counting turning points from the top tells the sign below. */
  private withKnownSign(lowHz: number, highHz: number, slope: Enclosure): Enclosure {
    if (this.turnsHz === undefined) return slope;
    const below = turnsUpTo(this.turnsHz, lowHz);
    if ((this.turnsHz[below] ?? Infinity) < highHz) return slope;
    const falling = (this.turnsHz.length - below) % 2 === 0;
    return falling
      ? { low: Math.min(slope.low, 0), high: Math.min(slope.high, 0) }
      : { low: Math.max(slope.low, 0), high: Math.max(slope.high, 0) };
  }
}

/** How many turning points lie at or below a frequency. */
function turnsUpTo(turnsHz: readonly number[], frequencyHz: number): number {
  let count = 0;
  while (count < turnsHz.length && (turnsHz[count] ?? Infinity) <= frequencyHz) count += 1;
  return count;
}

function checkFilter(filter: Filter): void {
  for (const { re, im } of filter.poles) {
    if (!(re < 0) || !Number.isFinite(re) || !Number.isFinite(im)) {
      throw new RangeError(`A pole at ${re} + ${im}j Hz is not in the left half plane.`);
    }
  }
  if (!(filter.gainAt.gain > 0)) throw new RangeError(`A filter's gain must be above 0, not ${filter.gainAt.gain}.`);
}
