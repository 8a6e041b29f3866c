/** The group delay of an exponential pulse, the one shape whose delay depends on frequency. */
import type { Enclosure } from '../response';
import { halfDecays } from './exponential';
import { hyperbolicCotangent, langevin } from './langevin';
import { hullOf } from './turning';

/** Ranges are widened by this, relative to half the width, in place of directed rounding. */
const slack = 1e-12;

/**
 * −dφ/dω of P = (1 − e^{−(1/τ + jω)w})/((1 + jωτ)(1 − e^{−w/τ})): (w/2)·(1 − Re(coth c − 1/c)), c = w/2τ + jωw/2.
 *
 * @param widthSeconds w > 0 in s.
 * @param decaySeconds τ > 0 in s.
 * @param frequencyHz ≥ 0, finite.
 * @returns s; τ − w/(e^{w/τ} − 1) at 0 Hz.
 * Source: P = e^{−c}·(sinh c/c)·const, differentiated.
 * @example exponentialDelay(1, 0.2, 0) // 0.19321634
 */
export function exponentialDelay(widthSeconds: number, decaySeconds: number, frequencyHz: number): number {
  const a = halfDecays(widthSeconds, decaySeconds);
  return 0.5 * widthSeconds * (1 - langevin(a, frequencyHz * widthSeconds).re);
}

/**
 * An enclosure of it over an interval. Up to y = π − a/√3 it only falls; beyond, coth's part turns at every half turn and the pole's falls.
 *
 * @param range in Hz, finite.
 * @returns s.
 * Source: Re(coth c − 1/c) = Σ a/((y − nπ)² + a²) over n ≠ 0, in pairs ± n.
 * @example exponentialDelayRange(1, 0.2, { low: 0, high: 0.3 }).high // 0.19321634
 */
export function exponentialDelayRange(widthSeconds: number, decaySeconds: number, range: Enclosure): Enclosure {
  const a = halfDecays(widthSeconds, decaySeconds);
  const lead = leadRange(a, range.low * widthSeconds, range.high * widthSeconds);
  const half = 0.5 * widthSeconds;
  const rounding = slack * (1 + Math.abs(lead.low) + Math.abs(lead.high));
  return { low: half * (1 - lead.high - rounding), high: half * (1 - lead.low + rounding) };
}

/** The range of Re(coth c − 1/c) over x = y/π. */
function leadRange(a: number, low: number, high: number): Enclosure {
  const risesTo = Math.max(0, 1 - a / (Math.PI * Math.sqrt(3)));
  const rising = (x: number): number => langevin(a, x).re;
  if (low >= risesTo) return turningRange(a, low, high);
  const rise = { low: rising(low), high: rising(Math.min(high, risesTo)) };
  return high <= risesTo ? rise : hullOf(rise, turningRange(a, risesTo, high));
}

function turningRange(a: number, low: number, high: number): Enclosure {
  const pole = (x: number): number => a / (a * a + (Math.PI * x) ** 2);
  const ends = [hyperbolicCotangent(a, low).re, hyperbolicCotangent(a, high).re] as const;
  const most = Math.floor(high) >= Math.ceil(low) ? 1 / Math.tanh(a) : Math.max(...ends);
  const least = Math.floor(high - 0.5) >= Math.ceil(low - 0.5) ? Math.tanh(a) : Math.min(...ends);
  return { low: least - pole(low), high: most - pole(high) };
}
