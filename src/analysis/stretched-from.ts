/** A response whose frequency axis may be stretched, at its worst: as it is, or against its own value at the reference. */
import type { Enclosure, Response } from '../signal/response';
import { stretched, stretchedRatio } from '../signal/stretched';
import type { Sense } from '../signal/stretched';
import type { Axis } from './axis';
import { relativeTo } from './channel-path';

/** Which worst case is asked for. */
export interface WorstQuestion {
  readonly sense: Sense;
  /** The frequency that the gain is measured from, with the same parts; null for the gain itself, whose tolerance then counts. */
  readonly referenceHz: number | null;
  readonly axis: Axis;
}

/** A worst case, and the factor that makes it. */
export interface StretchedFrom {
  readonly response: Response;
  factorAt(frequencyHz: number): number;
}

/** The worst over all factors. */
export function stretchedFrom(response: Response, factors: Enclosure, { referenceHz, sense }: WorstQuestion): StretchedFrom {
  if (factors.low === factors.high) {
    return { response: referenceHz === null ? response : relativeTo(response, referenceHz), factorAt: () => 1 };
  }
  const moved =
    referenceHz === null ? stretched(response, factors, sense) : stretchedRatio(response, referenceHz, factors, sense);
  return { response: moved, factorAt: (frequencyHz) => moved.factorAt(frequencyHz) };
}
