/** Where a pulse passes nothing. */
import { pulseFactors, type PulseFactor } from '../signal/pulses/pulse-response';
import type { PulseShape } from '../signal/pulses/pulse-shape';

/** The first nulls of a pulse above 0 Hz, in Hz, ascending; fewer, or none, where its spectrum has no more. */
export function shapeNulls(shape: PulseShape, count: number): readonly number[] {
  const orders = Array.from({ length: count }, (_, index) => index + 1);
  const nulls = pulseFactors(shape).flatMap((factor) => orders.flatMap((order) => nullOf(factor, order)));
  const rising = nulls.sort((a, b) => a - b);
  // Two factors of one length share their nulls, which then are one.
  return rising.filter((hz, index) => index === 0 || hz - (rising[index - 1] ?? 0) > 1e-9 * hz).slice(0, count);
}

/** The null of an order; a decaying pulse has minima only. */
function nullOf({ kind, widthSeconds }: PulseFactor, order: number): readonly number[] {
  switch (kind) {
    case 'rectangle':
      return [order / widthSeconds];
    case 'half-sine':
      return [(order + 0.5) / widthSeconds];
    case 'split':
      return [(2 * order) / widthSeconds];
    case 'exponential':
      return [];
  }
}
