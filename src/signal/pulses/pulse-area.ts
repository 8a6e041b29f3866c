/** What a pulse of height 1 holds: its area, which is its gain at 0 Hz, and its energy, which is what it lets through of white noise. */
import { checkedPulse, type PulseShape } from './pulse-shape';

/**
 * ∫ |p| dt at height 1, in s. Over the sampling period it is a hold's gain at 0 Hz and a gate's c₀ (but for `split`, where both are 0).
 *
 * @param shape lengths above 0 s.
 * Source: elementary integrals.
 * @example pulseArea({ shape: 'half-sine', widthSeconds: 1 }) // 0.636619772
 */
export function pulseArea(shape: PulseShape): number {
  checkedPulse(shape);
  switch (shape.shape) {
    case 'rectangle':
    case 'split':
      return shape.widthSeconds;
    case 'triangle':
      return 0.5 * shape.widthSeconds;
    case 'half-sine':
      return (2 / Math.PI) * shape.widthSeconds;
    case 'raised-cosine':
    case 'trapezoid':
      return shape.widthSeconds - shape.edgeSeconds;
    case 'exponential':
      return -shape.decaySeconds * Math.expm1(-shape.widthSeconds / shape.decaySeconds);
    case 'linear':
      return shape.periodSeconds;
  }
}

/**
 * ∫ p² dt at height 1, in s. Over the sampling period it is Σ|c_k|² of a gate no longer than the period (Parseval).
 *
 * @param shape lengths above 0 s.
 * Source: elementary integrals.
 * @example pulseEnergy({ shape: 'raised-cosine', widthSeconds: 1, edgeSeconds: 0.5 }) // 0.375
 */
export function pulseEnergy(shape: PulseShape): number {
  checkedPulse(shape);
  switch (shape.shape) {
    case 'rectangle':
    case 'split':
      return shape.widthSeconds;
    case 'triangle':
      return shape.widthSeconds / 3;
    case 'half-sine':
      return 0.5 * shape.widthSeconds;
    case 'raised-cosine':
      return shape.widthSeconds - 1.25 * shape.edgeSeconds;
    case 'trapezoid':
      return shape.widthSeconds - (4 / 3) * shape.edgeSeconds;
    case 'exponential':
      return -0.5 * shape.decaySeconds * Math.expm1((-2 * shape.widthSeconds) / shape.decaySeconds);
    case 'linear':
      return (2 / 3) * shape.periodSeconds;
  }
}
