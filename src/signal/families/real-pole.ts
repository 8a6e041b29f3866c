/** One real pole: an RC section, an amplifier's bandwidth, a sensor. */
import type { Filter } from '../filter';

export function realPole(cornerHz: number): Filter {
  throw new RangeError(`not yet ${String(cornerHz)}`);
}
