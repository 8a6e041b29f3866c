/** What the wanted path passes where it is sampled: the aperture, the hold, or of a relay's gate the part that is no copy. */
import { trackAndHoldDelay, trackAndHoldDelayRange, trackAndHoldWeight } from '../signal/pulses/track-and-hold';
import type { Enclosure, Response } from '../signal/response';
import type { Channel } from '../spec/channel';
import { pulseDelayEnclosure, pulseDelaySeconds, pulsePhaseRad, pulseResponse } from './pulse';
import { relayWeights, trackAndHoldOf, weightResponse } from './relay/weights';

/** A channel as far as its sampling goes. */
export type Sampled = Pick<Channel, 'direction' | 'pulse' | 'gate'>;

/** Whether the wanted path passes anything at all there. */
export function hasPulse({ pulse, gate }: Pick<Channel, 'pulse' | 'gate'>): boolean {
  return pulse.shape !== 'instant' || gate !== null;
}

/** The gain of the wanted path there: that of the pulse, c₀ of a gate, copy 0 of a track and hold. */
export function wantedPulse(channel: Sampled, rateHz: number): Response {
  if (channel.gate === null) return pulseResponse(channel, rateHz);
  return weightResponse(relayWeights(channel, rateHz).copy(0));
}

/** How much it delays a frequency, in seconds: nothing where a gate lets the signal itself through. */
export function wantedDelaySeconds({ pulse, gate }: Sampled, rateHz: number, frequencyHz: number): number {
  if (gate === null) return pulseDelaySeconds(pulse, rateHz, frequencyHz);
  return gate.kind === 'pulse' ? 0 : trackAndHoldDelay(trackAndHoldOf(gate.track, rateHz), frequencyHz);
}

/** An enclosure of that delay over an interval. */
export function wantedDelayEnclosure({ pulse, gate }: Sampled, rateHz: number, range: Enclosure): Enclosure {
  if (gate === null) return pulseDelayEnclosure(pulse, rateHz, range);
  if (gate.kind === 'pulse') return { low: 0, high: 0 };
  return trackAndHoldDelayRange(trackAndHoldOf(gate.track, rateHz), range.low, range.high);
}

/** Its phase in radians without the half turns at nulls: nothing where a gate lets the signal itself through. */
export function wantedPhaseRad({ pulse, gate }: Sampled, rateHz: number, frequencyHz: number): number {
  if (gate === null) return pulsePhaseRad(pulse, rateHz, frequencyHz);
  if (gate.kind === 'pulse') return 0;
  // The imaginary part never rises above 0, so the angle needs no unwrapping.
  const { re, im } = trackAndHoldWeight(trackAndHoldOf(gate.track, rateHz), 0, frequencyHz);
  return Math.atan2(im, re);
}
