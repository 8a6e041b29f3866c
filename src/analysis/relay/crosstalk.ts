/** What is left of one time slot when the next begins, on a link that settles as one pole. */
import type { Channel } from '../../spec/channel';
import { decibelsPerNeper } from '../decibels';

/**
 * −20·log10(e)·2π·B·t_g dB: what a pulse leaves behind at the first instant of the next slot, the worst of it, against its own height; null
 * without slots. B is the link's corner, t_g the time from the end of one pulse to the start of the next.
 */
export function crosstalkDb({ slots }: Channel): number | null {
  return slots === null ? null : -decibelsPerNeper * 2 * Math.PI * slots.linkHz * slots.guardSeconds + 0;
}
