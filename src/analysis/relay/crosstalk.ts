/** What is left of one time slot when the next begins, on a link that settles as one pole. */
import type { Channel } from '../../spec/channel';
import { decibelsPerNeper } from '../decibels';
import type { WorstAt } from '../figures';
import { pulseSeconds } from '../pulse';
import { rateRange, varies } from '../tolerances';
import { rateDeviation } from './views';

/** Crosstalk in dB, nominally and where the clock leaves least time. */
export interface Crosstalk {
  readonly valueDb: number;
  readonly nominalDb: number;
  readonly worstAt: WorstAt | null;
}

/** A guard that is the rest of its slot to this, relatively, moves with the rate. */
const slack = 1e-9;

/**
 * −20·log10(e)·2π·B·t_g dB: what a pulse leaves behind at the first instant of the next slot, the worst of it, against its own height; null
 * without slots. B is the link's corner, t_g the time from the end of one pulse to the start of the next: as it was stated, or where that is
 * all that the pulse leaves of its slot, what is left at the fastest rate.
 */
export function crosstalkOf(channel: Channel): Crosstalk | null {
  const { slots, rate } = channel;
  if (slots === null) return null;
  const settledDb = (seconds: number): number => -decibelsPerNeper * 2 * Math.PI * slots.linkHz * Math.max(0, seconds) + 0;
  const nominalDb = settledDb(slots.guardSeconds);
  const rest = restOfSlot(channel, rate.hz, slots.count);
  const follows = Math.abs(slots.guardSeconds - rest) <= slack / rate.hz;
  if (!varies(rate.tolerance) || !follows) return { valueDb: nominalDb, nominalDb, worstAt: null };
  // Every share of the period is shortest at the fastest rate; only a pulse of fixed length takes more of it then, which is the same end.
  const { high } = rateRange(rate);
  const valueDb = settledDb(restOfSlot(channel, high, slots.count));
  return { valueDb: Math.max(valueDb, nominalDb), nominalDb, worstAt: rateDeviation(channel, high) };
}

/** What a pulse leaves of its slot; a track and hold leaves nothing. */
function restOfSlot({ pulse, gate }: Channel, rateHz: number, count: number): number {
  const lasts =
    gate === null ? pulseSeconds(pulse, rateHz) : gate.kind === 'pulse' ? pulseSeconds(gate.pulse, rateHz) : 1 / rateHz;
  return Math.max(0, 1 / (rateHz * count) - lasts);
}
