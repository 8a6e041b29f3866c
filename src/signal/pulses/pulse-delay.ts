/** How much a pulse delays what passes it. */
import type { Enclosure } from '../response';
import { exponentialDelay, exponentialDelayRange } from './exponential-delay';
import { checkedPulse, type PulseShape } from './pulse-shape';

/**
 * The group delay of a pulse that begins at its sample: half the width for the symmetric shapes and `split`, one period for `linear`
 * (which must wait for the next sample), the derivative of the phase for `exponential`.
 *
 * @param shape lengths above 0 s.
 * @param frequencyHz ≥ 0.
 * @returns s.
 * Source: symmetry; for `exponential` see exponentialDelay.
 * @example pulseDelay({ shape: 'exponential', widthSeconds: 1, decaySeconds: 0.2 }, 0) // 0.19321634
 */
export function pulseDelay(shape: PulseShape, frequencyHz: number): number {
  checkedPulse(shape);
  if (shape.shape === 'exponential') return exponentialDelay(shape.widthSeconds, shape.decaySeconds, frequencyHz);
  return shape.shape === 'linear' ? shape.periodSeconds : 0.5 * shape.widthSeconds;
}

/**
 * An enclosure of a pulse's group delay over an interval, which closes as the interval does.
 *
 * @param shape lengths above 0 s.
 * @param lowHz ≥ 0.
 * @param highHz finite.
 * @returns s.
 * Source: as for pulseDelay.
 * @example pulseDelayRange({ shape: 'split', widthSeconds: 1 }, 0, 100).high // 0.5
 */
export function pulseDelayRange(shape: PulseShape, lowHz: number, highHz: number): Enclosure {
  checkedPulse(shape);
  if (shape.shape === 'exponential')
    return exponentialDelayRange(shape.widthSeconds, shape.decaySeconds, { low: lowHz, high: highHz });
  const delay = pulseDelay(shape, lowHz);
  return { low: delay, high: delay };
}
