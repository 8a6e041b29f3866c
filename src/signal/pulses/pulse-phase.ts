/** The phase of a pulse's spectrum, for sums of complex weights; the delay has its own closed forms. */
import { halfDecays } from './exponential';
import { pulseFactors, type PulseFactor } from './pulse-response';
import type { PulseShape } from './pulse-shape';
import { cosineOfTurns, sineOfTurns } from './sinc';

/**
 * The phase of P(f) = ∫ p(t)·e^{−j2πft} dt, the pulse beginning at t = 0.
 *
 * @param shape lengths above 0 s.
 * @param frequencyHz any sign, finite.
 * @returns rad, −π … π; at a null that of the lobe it begins.
 * Source: symmetry about the middle, the sign changes at the nulls, and the closed form of `exponential`.
 * @example pulsePhase({ shape: 'rectangle', widthSeconds: 1 }, 0.5) // -1.570796327
 */
export function pulsePhase(shape: PulseShape, frequencyHz: number): number {
  const turns = pulseFactors(shape).reduce((sum, factor) => sum + factorTurns(factor, Math.abs(frequencyHz)), 0);
  const size = Math.PI * (turns - 2 * Math.round(0.5 * turns));
  return frequencyHz < 0 ? -size : size;
}

/** The phase of one factor over π. */
function factorTurns(factor: PulseFactor, frequencyHz: number): number {
  const x = frequencyHz * factor.widthSeconds;
  switch (factor.kind) {
    case 'rectangle':
      return (Math.floor(x) - x) % 2;
    case 'half-sine':
      return (Math.max(0, Math.floor(x - 0.5)) - x) % 2;
    case 'split':
      return 0.5 - (x % 2);
    case 'exponential':
      return exponentialTurns(x, halfDecays(factor.widthSeconds, factor.decaySeconds));
  }
}

/** That of e^{−c}·sinh(c)/c, c = a + jπx. */
function exponentialTurns(x: number, a: number): number {
  const hyperbolic = Math.atan2(sineOfTurns(x), Math.tanh(a) * cosineOfTurns(x));
  return (hyperbolic - Math.atan2(Math.PI * x, a)) / Math.PI - (x % 2);
}
