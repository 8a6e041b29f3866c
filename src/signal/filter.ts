/** A rational analogue filter given by its poles and zeros, and what follows from them: magnitude with proved bounds, phase and group delay. */
import type { Enclosure, Response } from './response';
import { SectionsProduct } from './sections-product';
import type { Root } from './sections';

export type { Root } from './sections';

/** A filter by its poles, its zeros and its gain at one frequency; never by polynomial coefficients. */
export interface Filter {
  /** In Hz, all in the left half plane; of a conjugate pair both are listed. */
  readonly poles: readonly Root[];
  /** In Hz, anywhere, no more of them than poles; of a conjugate pair both are listed. */
  readonly zeros: readonly Root[];
  /** |H| at one frequency in Hz, where it is no null; fixes the constant. Infinity where there are as many zeros as poles. */
  readonly gainAt: { readonly frequencyHz: number; readonly gain: number };
  /** Every frequency above 0 Hz where |H| turns between rising and falling, ascending, where the family knows them; null where it does not. */
  readonly turnsHz: readonly number[] | null;
}

/** Bounds of ln|H| are widened by this, in place of directed rounding. */
const logSlack = 1e-9;

/**
 * The magnitude of a filter, with proved bounds.
 *
 * ln|H| = ln g + ½·Σ ln(ratio(f²)/ratio(f_g²)) over ratios of first- and second-order sections in u = f², each zero over its nearest
 * pole. Where all turning points are known, bounds over an interval come from its ends and the turning points inside and are exact to
 * rounding; otherwise they are the product of the ratios' ranges. The slope is bounded term by term, and has the known sign between
 * turning points.
 *
 * @param filter poles in Hz with negative real parts; `gainAt.gain` > 0.
 * @returns ln|H| at f ≥ 0; −Infinity at f = Infinity where there are more poles than zeros, and at a null; NaN at NaN. No poles: constant.
 * Source: physics of rational transfer functions, common practice; the ratios' ranges are elementary.
 * @example Math.exp(filterResponse({ poles: [{ re: -1000, im: 0 }], zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }).logGain(1000)) // 0.70710678
 */
export function filterResponse(filter: Filter): Response {
  return new FilterResponse(filter);
}

/**
 * The phase of a filter in radians: φ = Σ atan2(f − im, |re|) over the zeros, right of the axis with the other sign, less the poles'.
 *
 * It is 0 at 0 Hz and continuous, but for a step of +π at a zero on the imaginary axis (halfway up at the zero itself) and of +π/2 for
 * each zero at 0 Hz.
 *
 * @param filter poles in Hz with negative real parts.
 * @param frequencyHz f ≥ 0; at Infinity the limit.
 * Source: common practice.
 * @example phaseRad({ poles: [{ re: -1000, im: 0 }], zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }, 1000) // -0.78539816
 */
export function phaseRad(filter: Filter, frequencyHz: number): number {
  const lag = filter.poles.reduce((sum, pole) => sum - angleOf(pole, frequencyHz), 0);
  return filter.zeros.reduce((sum, zero) => sum + (zero.re > 0 ? -1 : 1) * angleOf(zero, frequencyHz), lag);
}

/** The angle from a root to jf, as if the root stood left of the axis. */
function angleOf({ re, im }: Root, frequencyHz: number): number {
  return Math.atan2(frequencyHz - im, Math.abs(re));
}

/**
 * The group delay of a filter in seconds, in closed form: −dφ/dω = Σ |re| / (2π·(re² + (f − im)²)) over the poles and the zeros right of
 * the axis, less those left of it. A zero on the axis adds only a step of the phase, which is left out.
 *
 * @param filter poles in Hz with negative real parts.
 * @param frequencyHz f ≥ 0; 0 at Infinity.
 * Source: the derivative of the phase, common practice.
 * @example groupDelay({ poles: [{ re: -1000, im: 0 }], zeros: [], gainAt: { frequencyHz: 0, gain: 1 }, turnsHz: [] }, 0) // 0.000159154943
 */
export function groupDelay(filter: Filter, frequencyHz: number): number {
  const poles = filter.poles.reduce((sum, pole) => sum - delayOf(pole, frequencyHz), 0);
  return filter.zeros.reduce((sum, zero) => (zero.re === 0 ? sum : sum + delayOf(zero, frequencyHz)), poles);
}

function delayOf({ re, im }: Root, frequencyHz: number): number {
  return re / (2 * Math.PI * (re * re + (frequencyHz - im) ** 2));
}

class FilterResponse implements Response {
  readonly turnsHz?: readonly number[];
  private readonly product: SectionsProduct;
  private readonly constant: number;
  /** At 0 Hz, at each turning point and at Infinity. */
  private readonly turnGains: readonly number[];

  constructor(filter: Filter) {
    checkFilter(filter);
    this.product = new SectionsProduct(filter.poles, filter.zeros);
    const { frequencyHz, gain } = filter.gainAt;
    this.constant = Math.log(gain) - 0.5 * this.product.logAt(frequencyHz);
    if (!Number.isFinite(this.constant)) throw new RangeError(`A filter's gain cannot be given at its null, ${frequencyHz} Hz.`);
    if (filter.turnsHz !== null) this.turnsHz = filter.turnsHz;
    this.turnGains = [0, ...(filter.turnsHz ?? []), Infinity].map((turn) => this.logGain(turn));
  }

  logGain(frequencyHz: number): number {
    return this.constant + 0.5 * this.product.logAt(frequencyHz);
  }

  bounds(lowHz: number, highHz: number): Enclosure {
    if (this.turnsHz !== undefined) return this.boundsByTurns(this.turnsHz, lowHz, highHz);
    const range = this.product.logRange(lowHz, highHz);
    return { low: this.constant + 0.5 * range.low - logSlack, high: this.constant + 0.5 * range.high + logSlack };
  }

  slope(lowHz: number, highHz: number): Enclosure | null {
    const range = this.product.slopeRange(lowHz, highHz);
    if (range === null) return this.withKnownSign(lowHz, highHz, null);
    // d ln|H|/df = ½·2f·d ln(product)/du
    const low = Math.min(range.low * lowHz, range.low * highHz);
    const high = Math.max(range.high * lowHz, range.high * highHz);
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
      const gain = this.turnGains[index + 1] ?? 0;
      low = Math.min(low, gain);
      high = Math.max(high, gain);
    }
    return { low: low - logSlack, high: high + logSlack };
  }

  /** Between two turning points the gains at both tell whether it rises; beside a null nothing else is known. */
  private withKnownSign(lowHz: number, highHz: number, slope: Enclosure | null): Enclosure | null {
    if (this.turnsHz === undefined) return slope;
    const below = turnsUpTo(this.turnsHz, lowHz);
    if ((this.turnsHz[below] ?? Infinity) < highHz) return slope;
    const from = this.turnGains[below] ?? 0;
    const to = this.turnGains[below + 1] ?? 0;
    const { low, high } = slope ?? { low: -Infinity, high: Infinity };
    if (from === to) return slope;
    return from > to ? { low: Math.min(low, 0), high: Math.min(high, 0) } : { low: Math.max(low, 0), high: Math.max(high, 0) };
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
  if (filter.zeros.length > filter.poles.length) throw new RangeError('A filter must not have more zeros than poles.');
  if (!(filter.gainAt.gain > 0)) throw new RangeError(`A filter's gain must be above 0, not ${filter.gainAt.gain}.`);
}
