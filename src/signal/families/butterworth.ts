/** Butterworth low-pass filters: maximally flat magnitude, poles on a circle. */
import type { Filter } from '../filter';

export function butterworth(order: number, cornerHz: number): Filter {
  throw new RangeError(`not yet ${String(order)} ${String(cornerHz)}`);
}
