/** Chebyshev (type I) low-pass filters: equal ripple in the passband, poles on an ellipse. */
import type { Filter } from '../filter';
import { checkDb, checkFamily, epsilonOf, mirrored } from './low-pass';

/** What the corner frequency names: the half-power point, or the last frequency at which the loss equals the ripple. */
export type ChebyshevCorner = 'half-power' | 'ripple';

/**
 * A Chebyshev low-pass filter: |H|² = 1 / (1 + ε²·T²(f/f_r)), T the Chebyshev polynomial of the order, ε² = 10^(ripple/10) − 1 and
 * f_r the end of the ripple. The poles are −f_r·sinh(a)·sin θ ± j·f_r·cosh(a)·cos θ with a = asinh(1/ε)/order.
 *
 * @param order whole, ≥ 1; exact to 1e−9 up to 20.
 * @param cornerHz > 0, in Hz.
 * @param rippleDb > 0, in dB. Above 3.0103 dB the half-power point is the last one, inside the ripple.
 * @param cornerAt what `cornerHz` names.
 * @returns the passband's maximum is 1, so an even order starts `rippleDb` below it at 0 Hz; it turns at f_r·cos(kπ/(2·order)).
 * Source: A. I. Zverev, Handbook of Filter Synthesis (1967), ch. 3, from memory; checked against mpmath at 50 digits.
 * @example Math.exp(filterResponse(chebyshev(2, 1000, 1, 'ripple')).logGain(0)) // 0.891250938
 */
export function chebyshev(order: number, cornerHz: number, rippleDb: number, cornerAt: ChebyshevCorner): Filter {
  checkFamily(order, cornerHz);
  checkDb('ripple', rippleDb);
  const epsilon = epsilonOf(rippleDb);
  const edgeHz = cornerAt === 'ripple' ? cornerHz : cornerHz / halfPowerRatio(order, epsilon);
  const a = Math.asinh(1 / epsilon) / order;
  const across = edgeHz * Math.sinh(a);
  const along = edgeHz * Math.cosh(a);
  return {
    poles: mirrored(order, (angle) => ({ re: -across * Math.sin(angle), im: along * Math.cos(angle) })),
    zeros: [],
    gainAt: { frequencyHz: 0, gain: order % 2 === 1 ? 1 : 10 ** (-rippleDb / 20) },
    turnsHz: turns(order, edgeHz),
  };
}

/** The last frequency at which ε·|T| = 1, over the end of the ripple. */
function halfPowerRatio(order: number, epsilon: number): number {
  return epsilon <= 1 ? Math.cosh(Math.acosh(1 / epsilon) / order) : Math.cos(Math.acos(1 / epsilon) / order);
}

/** Where T is 0 (a maximum) or ±1 (a minimum), without 0 Hz and without the end of the ripple, where it only passes through. */
function turns(order: number, edgeHz: number): readonly number[] {
  const found: number[] = [];
  for (let k = order - 1; k >= 1; k -= 1) found.push(edgeHz * Math.cos((Math.PI * k) / (2 * order)));
  return found;
}
