/** A pulse of the spec as the signal layer takes it, at one rate. */
import type { PulseShape } from '../signal/pulses/pulse-shape';
import type { Pulse, PulseWidth } from '../spec/channel';

/** The shape with its lengths in seconds; null for `instant`, which has none. */
export function pulseShape(pulse: Pulse, rateHz: number): PulseShape | null {
  const seconds = (width: PulseWidth): number => widthSeconds(width, rateHz);
  switch (pulse.shape) {
    case 'instant':
      return null;
    case 'linear':
      return { shape: 'linear', periodSeconds: 1 / rateHz };
    case 'rectangle':
    case 'triangle':
    case 'half-sine':
    case 'split':
      return { shape: pulse.shape, widthSeconds: seconds(pulse.width) };
    case 'raised-cosine':
    case 'trapezoid': {
      const width = seconds(pulse.width);
      // Where a width in periods shrinks with the clock, edges that just fitted still just fit.
      return { shape: pulse.shape, widthSeconds: width, edgeSeconds: Math.min(seconds(pulse.edge), width / 2) };
    }
    case 'exponential':
      return { shape: 'exponential', widthSeconds: seconds(pulse.width), decaySeconds: seconds(pulse.decay) };
  }
}

/** A width in seconds at a rate. */
export function widthSeconds(width: PulseWidth, rateHz: number): number {
  return 'seconds' in width ? width.seconds : width.share / rateHz;
}
