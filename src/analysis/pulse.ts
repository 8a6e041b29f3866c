/** The pulse of an aperture or a hold as a response: its length, its gain, its delay and its nulls. */
import { pulseArea } from '../signal/pulses/pulse-area';
import { pulseDelay, pulseDelayRange } from '../signal/pulses/pulse-delay';
import { pulsePhase } from '../signal/pulses/pulse-phase';
import { pulseResponse as shapeResponse } from '../signal/pulses/pulse-response';
import { constantResponse, product } from '../signal/response-algebra';
import type { Enclosure, Response } from '../signal/response';
import type { Channel, Pulse, PulseWidth } from '../spec/channel';
import { shapeNulls } from './pulse-nulls';
import { pulseShape, widthSeconds } from './pulse-shape';

/** A channel as far as its pulse goes. */
export type PulseOwner = Pick<Channel, 'direction' | 'pulse'>;

/** How long the pulse lasts at a rate, in seconds; 0 for `instant`. */
export function pulseSeconds(pulse: Pulse, rateHz: number): number {
  if (pulse.shape === 'instant') return 0;
  return pulse.shape === 'linear' ? 2 / rateHz : widthSeconds(pulse.width, rateHz);
}

/**
 * What the pulse does when the rate moves: `follows` it, all its lengths being shares of the period, `stays` as it is, all of them being
 * times, or is `mixed`, such as a hold of one period whose edges take 3 ns.
 */
export function pulseMoves(pulse: Pulse): 'follows' | 'stays' | 'mixed' {
  if (pulse.shape === 'linear') return 'follows';
  const shares = lengthsOf(pulse).map((length) => 'share' in length);
  if (!shares.includes(true)) return 'stays';
  return shares.includes(false) ? 'mixed' : 'follows';
}

/** Whether every length of the pulse is a share of the period, so that the pulse follows the rate. */
export function followsRate(pulse: Pulse): boolean {
  return pulseMoves(pulse) === 'follows';
}

/** The pulse's response at a rate: an aperture has gain 1 at 0 Hz, a hold of height 1 its area over the period. */
export function pulseResponse(channel: PulseOwner, rateHz: number): Response {
  const shape = pulseShape(channel.pulse, rateHz);
  if (shape === null) return constantResponse(0);
  const response = shapeResponse(shape);
  const area = pulseAreaLog(channel, rateHz);
  return Math.abs(area) < 1e-12 ? response : product([constantResponse(area), response]);
}

/** ln of what a pulse of height 1 is weighed by before its unit-area spectrum: area over period for a hold, 0 for an aperture. */
export function pulseAreaLog(channel: PulseOwner, rateHz: number): number {
  const shape = pulseShape(channel.pulse, rateHz);
  return shape === null || channel.direction === 'capture' ? 0 : Math.log(pulseArea(shape) * rateHz);
}

/** How much the pulse delays a frequency, in seconds: half its length for all but `exponential`. */
export function pulseDelaySeconds(pulse: Pulse, rateHz: number, frequencyHz: number): number {
  const shape = pulseShape(pulse, rateHz);
  return shape === null ? 0 : pulseDelay(shape, frequencyHz);
}

/** An enclosure of that delay over an interval. */
export function pulseDelayEnclosure(pulse: Pulse, rateHz: number, { low, high }: Enclosure): Enclosure {
  const shape = pulseShape(pulse, rateHz);
  return shape === null ? { low: 0, high: 0 } : pulseDelayRange(shape, low, high);
}

/** The pulse's phase in radians without the half turns at its nulls: −2πf times its delay, where that is the same everywhere. */
export function pulsePhaseRad(pulse: Pulse, rateHz: number, frequencyHz: number): number {
  const shape = pulseShape(pulse, rateHz);
  if (shape === null) return 0;
  if (shape.shape === 'exponential') return pulsePhase(shape, frequencyHz);
  return -2 * Math.PI * frequencyHz * pulseDelay(shape, frequencyHz);
}

/** The first frequencies above 0 Hz at which nothing passes the pulse; empty where there are none, as for `instant` and `exponential`. */
export function pulseNulls(pulse: Pulse, rateHz: number, count: number): readonly number[] {
  const shape = pulseShape(pulse, rateHz);
  return shape === null ? [] : shapeNulls(shape, count);
}

function lengthsOf(pulse: Exclude<Pulse, { readonly shape: 'linear' }>): readonly PulseWidth[] {
  switch (pulse.shape) {
    case 'instant':
      return [];
    case 'raised-cosine':
    case 'trapezoid':
      return [pulse.width, pulse.edge];
    case 'exponential':
      return [pulse.width, pulse.decay];
    default:
      return [pulse.width];
  }
}
