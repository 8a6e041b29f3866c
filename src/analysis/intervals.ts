/** Sets of frequencies as lists of closed intervals in Hz. */
import type { Enclosure } from '../signal/response';

/** What two sets have in common; intervals that only touch give a single point. */
export function intersection(one: readonly Enclosure[], other: readonly Enclosure[]): readonly Enclosure[] {
  return one.flatMap((a) =>
    other.flatMap((b) => {
      const low = Math.max(a.low, b.low);
      const high = Math.min(a.high, b.high);
      return low <= high ? [{ low, high }] : [];
    }),
  );
}

/** What is left of a set without some holes; single points at the holes' edges are not kept, a point outside them is. */
export function without(set: readonly Enclosure[], holes: readonly Enclosure[]): readonly Enclosure[] {
  return holes.reduce<readonly Enclosure[]>((rest, hole) => rest.flatMap((piece) => cut(piece, hole)), set);
}

/** Whether a frequency lies in a set, edges included. */
export function contains(set: readonly Enclosure[], frequencyHz: number): boolean {
  return set.some((piece) => piece.low <= frequencyHz && frequencyHz <= piece.high);
}

/** How wide a set is, in Hz, its intervals not overlapping. */
export function widthOf(set: readonly Enclosure[]): number {
  return set.reduce((sum, piece) => sum + piece.high - piece.low, 0);
}

function cut(piece: Enclosure, hole: Enclosure): readonly Enclosure[] {
  if (hole.high < piece.low || hole.low > piece.high) return [piece];
  const below = piece.low < hole.low ? [{ low: piece.low, high: hole.low }] : [];
  const above = hole.high < piece.high ? [{ low: hole.high, high: piece.high }] : [];
  return [...below, ...above];
}
