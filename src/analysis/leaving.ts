/** What leaves outside the wanted bands, as the searches of either direction hand it to the output mask. */
import type { Enclosure, Response } from '../signal/response';
import type { Channel } from '../spec/channel';
import type { MaskOrigin, WorstAt } from './figures';

/** A segment as a search takes it. */
export interface OutputSegment {
  /** Its band without the wanted bands, in Hz. */
  readonly leaves: readonly Enclosure[];
  /** One over its bound, at the largest that the clock's tolerance makes of it where frequencies are counted in periods. */
  overBound(channel: Channel, at: 'nominal' | 'worst'): Response;
}

/** What leaves strongest against a bound. */
export interface Leaving {
  /** Its level over the bound, dB: a proved upper bound. */
  readonly overDb: number;
  readonly frequencyHz: number;
  readonly from: MaskOrigin;
  readonly gapDb: number;
  readonly worstAt: WorstAt | null;
  readonly evaluations: number;
}

/** Nominal and worst of what leaves. */
export interface LeavingPair {
  readonly nominal: Leaving | null;
  readonly worst: Leaving | null;
}

/** The one that is furthest over the bound, with the work of all. */
export function strongest(all: readonly (Leaving | null)[]): Leaving | null {
  const found = all.filter((one) => one !== null);
  const [first, ...others] = found;
  if (first === undefined) return null;
  const best = others.reduce((most, one) => (one.overDb > most.overDb ? one : most), first);
  return { ...best, evaluations: found.reduce((sum, one) => sum + one.evaluations, 0) };
}
