/** The pulse of an aperture or a hold as a response: its width, its gain and its nulls. */
import { frequencyWeight } from '../signal/frequency-weight';
import { rectangleResponse } from '../signal/pulses/rectangle';
import { constantResponse, inverse, product } from '../signal/response-algebra';
import type { Response } from '../signal/response';
import type { Channel, Pulse } from '../spec/channel';

/** How long the pulse lasts at a rate, in seconds; 0 for `instant`. */
export function pulseSeconds(pulse: Pulse, rateHz: number): number {
  if (pulse.shape === 'instant') return 0;
  if (pulse.shape === 'linear') return 2 / rateHz;
  return 'seconds' in pulse.width ? pulse.width.seconds : pulse.width.share / rateHz;
}

/** Whether the width is a share of the period, so that the pulse follows the rate. */
export function followsRate(pulse: Pulse): boolean {
  if (pulse.shape === 'instant') return false;
  return pulse.shape === 'linear' || 'share' in pulse.width;
}

/** The pulse's response at a rate: an aperture has gain 1 at 0 Hz, a hold of height 1 its area over the period. */
export function pulseResponse(channel: Pick<Channel, 'direction' | 'pulse'>, rateHz: number): Response {
  const width = pulseSeconds(channel.pulse, rateHz);
  if (width === 0) return constantResponse(0);
  const shape = rectangleResponse(width);
  const area = channel.direction === 'capture' ? 0 : Math.log(width * rateHz);
  return Math.abs(area) < 1e-12 ? shape : product([constantResponse(area), shape]);
}

/** A pulse that lasts m whole periods, at F = k·rate ± x, k ≥ 1: |sin(πwF)|/(πwF) = |sin(πwx)|/(πwF), a part in F and a part in x. */
export interface WholePulse {
  /** area/T over πwF: no nulls, only falling. */
  readonly envelope: Response;
  /** |sin(πwx)|. */
  readonly ripple: Response;
}

/**
 * The two parts of a pulse whose nulls stand on every multiple of the rate, so that a search over folds need not meet each null; null
 * for any other pulse.
 */
export function wholePulse(channel: Pick<Channel, 'direction' | 'pulse'>, rateHz: number): WholePulse | null {
  const width = pulseSeconds(channel.pulse, rateHz);
  const periods = width * rateHz;
  const whole = Math.round(periods);
  if (whole < 1 || Math.abs(periods - whole) > 1e-12 * whole) return null;
  const turns = Math.log(Math.PI * width);
  const area = channel.direction === 'capture' ? 0 : Math.log(periods);
  return {
    envelope: product([constantResponse(area - turns), inverse(frequencyWeight())]),
    ripple: product([constantResponse(turns), frequencyWeight(), rectangleResponse(width)]),
  };
}

/** The first frequencies in Hz at which nothing passes the pulse; empty for `instant`. */
export function pulseNulls(pulse: Pulse, rateHz: number, count: number): readonly number[] {
  const width = pulseSeconds(pulse, rateHz);
  return width === 0 ? [] : Array.from({ length: count }, (_, index) => (index + 1) / width);
}
