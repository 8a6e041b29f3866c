/** Designed low-pass filters with finitely many taps: equal ripple, as few taps as will do, flat together with a droop beside them. */
import { equiripple, type WantedBand } from './equiripple';
import { withUnitGain } from './fir-gain';
import { kaiserOrder } from './kaiser-order';

/** What a low-pass has to do. */
export interface LowPassDemand {
  /** The end of the pass band, a share of the rate. */
  readonly passband: number;
  /** Where the stop band begins; it ends at half the rate. */
  readonly stopband: number;
  /** How far the gain in the pass band may depart from that at 0 Hz, either way, above 0. */
  readonly rippleDb: number;
  /** At least so far below the gain at 0 Hz in the stop band, above 0. */
  readonly attenuationDb: number;
  /** A gain in series, by share of the rate, above 0 in the pass band and 1 at 0 Hz, whose droop is undone there; none unless given. */
  readonly droop?: (share: number) => number;
}

/** A design with gain 1 at 0 Hz. */
export interface LowPassFir {
  readonly taps: readonly number[];
  /** The largest deviation in either band as a share of what is allowed: up to 1 the demand is met. */
  readonly used: number;
}

/** More taps than this are not tried. */
const countLimit = 1023;

/**
 * The low-pass of so many taps that uses the smallest share of what is allowed.
 *
 * The demand holds against the gain at 0 Hz wherever that stands within the ripple, so the deviations it allows are
 * (g − 1)/(g + 1) with 20·log10(g) = ripple, and (1 − that)·10^(−attenuation/20).
 *
 * @param count from 1.
 * @throws RangeError for a demand or a number of taps that makes no sense.
 * Source: as for equiripple; the deviations by elementary algebra.
 * @example lowPassFir(31, { passband: 0.1, stopband: 0.15, rippleDb: 0.41955946, attenuationDb: 32.13039155 }).used // 1
 */
export function lowPassFir(count: number, demand: LowPassDemand): LowPassFir {
  const { taps, deviation } = equiripple(count, bandsOf(demand));
  return { taps: withUnitGain(taps, 0), used: deviation };
}

/**
 * The low-pass with the fewest taps that meets a demand.
 *
 * With two more taps a design is never worse, so odd and even numbers are each searched by halving, from Kaiser's estimate.
 *
 * @throws RangeError for a demand that makes no sense or takes more than 1023 taps.
 * Source: as above.
 * @example fewestTaps({ passband: 0.1, stopband: 0.15, rippleDb: 0.42, attenuationDb: 32 }).taps.length // 30
 */
export function fewestTaps(demand: LowPassDemand): LowPassFir {
  const { pass, stop } = deviationsOf(demand);
  const estimate = Math.ceil(kaiserOrder(-10 * Math.log10(pass * stop), demand.stopband - demand.passband)) + 1;
  if (estimate > 2 * countLimit) throw tooLong();
  const odd = fewestFrom(Math.min(Math.max(3, 2 * Math.round(estimate / 2) - 1), countLimit), demand);
  const oneLess = lowPassFir(odd.taps.length - 1 || 1, demand);
  return oneLess.used > 1 || odd.taps.length === 1 ? odd : fewestFrom(oneLess.taps.length, demand);
}

/** The fewest among numbers of one parity: steps that double until the answer is between two of them, then halving. */
function fewestFrom(start: number, demand: LowPassDemand): LowPassFir {
  const least = 2 - (start % 2);
  const most = countLimit - 1 + (start % 2);
  const first = lowPassFir(start, demand);
  let fails = least - 2;
  let meets = first.used <= 1 ? first : null;
  let tried = start;
  for (let step = 2; meets === null; step *= 2) {
    fails = tried;
    if (tried >= most) throw tooLong();
    tried = Math.min(tried + step, most);
    const longer = lowPassFir(tried, demand);
    if (longer.used <= 1) meets = longer;
  }
  for (let step = 2; meets.taps.length - fails > 2; step *= 2) {
    // Downwards from the first in doubling steps, but never past the middle of what is left.
    const middle = 2 * Math.ceil((meets.taps.length - fails) / 4);
    const shorter = lowPassFir(meets.taps.length - Math.min(step, middle), demand);
    if (shorter.used <= 1) meets = shorter;
    else fails = shorter.taps.length;
  }
  return meets;
}

function bandsOf(demand: LowPassDemand): readonly WantedBand[] {
  const { pass, stop } = deviationsOf(demand);
  const droop = demand.droop ?? (() => 1);
  return [
    { low: 0, high: demand.passband, desired: (share) => 1 / droop(share), weight: (share) => droop(share) / pass },
    { low: demand.stopband, high: 0.5, desired: () => 0, weight: () => 1 / stop },
  ];
}

function deviationsOf({ passband, stopband, rippleDb, attenuationDb }: LowPassDemand): {
  readonly pass: number;
  readonly stop: number;
} {
  if (!(passband > 0 && passband < stopband && stopband < 0.5))
    throw new RangeError(
      `A pass band must end below the stop band, and that begin below half the rate, not ${passband} and ${stopband}.`,
    );
  if (!(rippleDb > 0 && rippleDb < Infinity && attenuationDb > 0 && attenuationDb < Infinity))
    throw new RangeError(`Ripple and attenuation must be above 0 dB, not ${rippleDb} dB and ${attenuationDb} dB.`);
  const pass = Math.tanh((rippleDb * Math.LN10) / 40);
  return { pass, stop: (1 - pass) * 10 ** (-attenuationDb / 20) };
}

function tooLong(): RangeError {
  return new RangeError(`The low-pass takes more than ${countLimit} taps: part its bands, or ask for less.`);
}
