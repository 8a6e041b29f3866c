/** A pulse with nulls on every multiple of the rate as two parts, so that a search over folds need not meet each null. */
import { frequencyWeight } from '../signal/frequency-weight';
import { factorResponse, pulseFactors, type PulseFactor } from '../signal/pulses/pulse-response';
import { rectangleResponse } from '../signal/pulses/rectangle';
import { constantResponse, inverse, product } from '../signal/response-algebra';
import type { Response } from '../signal/response';
import { pulseAreaLog, type PulseOwner } from './pulse';
import { pulseShape } from './pulse-shape';

/**
 * The two parts at F = k·rate ± x, k ≥ 1. A rectangle of m whole periods has |sin(πwF)|/(πwF) = |sin(πwx)|/(πwF) there; a pulse that is
 * the convolution of such a rectangle with others (a zero-order hold that slews, straight lines) has the others' spectra at F besides.
 */
export interface WholePulse {
  /** What depends on F: area/T, 1/(πwF) of each whole rectangle, and every other factor as it is. */
  readonly envelope: Response;
  /** |sin(πwx)| of each whole rectangle. */
  readonly ripple: Response;
}

/** The two parts of a pulse; null for one whose nulls do not stand on every multiple of the rate. */
export function wholePulse(channel: PulseOwner, rateHz: number): WholePulse | null {
  const shape = pulseShape(channel.pulse, rateHz);
  if (shape === null) return null;
  const factors = pulseFactors(shape);
  const whole = factors.filter((factor) => isWhole(factor, rateHz));
  if (whole.length === 0) return null;
  const others = factors.filter((factor) => !isWhole(factor, rateHz)).map(factorResponse);
  const turns = whole.map((factor) => Math.log(Math.PI * factor.widthSeconds));
  const area = pulseAreaLog(channel, rateHz) - turns.reduce((sum, turn) => sum + turn, 0);
  return {
    envelope: product([constantResponse(area), ...whole.map(() => inverse(frequencyWeight())), ...others]),
    ripple: product(
      whole.flatMap((factor, index) => [
        constantResponse(turns[index] ?? 0),
        frequencyWeight(),
        rectangleResponse(factor.widthSeconds),
      ]),
    ),
  };
}

function isWhole({ kind, widthSeconds }: PulseFactor, rateHz: number): boolean {
  const periods = widthSeconds * rateHz;
  const whole = Math.round(periods);
  return kind === 'rectangle' && whole >= 1 && Math.abs(periods - whole) <= 1e-12 * whole;
}
