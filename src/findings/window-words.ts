/** Windows of rates in messages: "37.5 MHz to 43.3 MHz (zone 4, inverted)", rounded so that what is printed still holds. */
import type { RateWindow } from '../analysis/rate-windows';
import { formatFrequency } from '../units/format';

/** A window with its zones; one without an upper end is "150 MHz or more (zone 1)". */
export function windowWords({ low, high, zones }: RateWindow): string {
  const place = `(${zoneWords(zones)})`;
  const step = stepFor(low, high);
  const lowest = formatFrequency(Math.ceil(low / step - rounding) * step, step);
  if (high === Infinity) return `${lowest} or more ${place}`;
  const highest = formatFrequency(Math.floor(high / step + rounding) * step, step);
  return lowest === highest ? `${lowest} alone ${place}` : `${lowest} to ${highest} ${place}`;
}

/** "zone 9, not inverted", "zone 4, inverted"; several bands have "zones 1 and 2". */
export function zoneWords(zones: readonly number[]): string {
  const [zone] = zones;
  if (zone === undefined) return 'no zone';
  if (zones.every((other) => other === zone)) return `zone ${zone}, ${zone % 2 === 0 ? 'inverted' : 'not inverted'}`;
  return `zones ${zones.slice(0, -1).join(', ')} and ${String(zones.at(-1))}`;
}

/** A bound this close to a printed digit is that digit. */
const rounding = 1e-6;

/** The digit that bounds are printed to: a hundredth of the window or finer, four figures where it has no end. */
function stepFor(low: number, high: number): number {
  const width = high === Infinity || high - low < 1e-7 * high ? low / (high === Infinity ? 10 : 1e4) : high - low;
  return 10 ** Math.floor(Math.log10(width / 100));
}
