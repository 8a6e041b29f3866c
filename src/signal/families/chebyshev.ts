/** Chebyshev (type I) low-pass filters: equal ripple in the passband, poles on an ellipse. */
import type { Filter } from '../filter';

/** What the corner frequency names: the half-power point, or the end of the ripple. */
export type ChebyshevCorner = 'half-power' | 'ripple';

export function chebyshev(order: number, cornerHz: number, rippleDb: number, cornerAt: ChebyshevCorner): Filter {
  throw new RangeError(`not yet ${String(order)} ${String(cornerHz)} ${String(rippleDb)} ${cornerAt}`);
}
