/** Where an exchange starts: places near those at which the error of the answer will alternate. */
import type { Enclosure } from '../response';
import { clusteredShare } from './clustered-shares';

/**
 * So many places, shared out among bands by their width, and never on an edge.
 *
 * @param bands ascending and apart within shares 0 … 0.5 of the rate.
 * Source: common practice, no source.
 * @example firstNodes([{ low: 0, high: 0.5 }], 1)[0] // 0.25
 */
export function firstNodes(bands: readonly Enclosure[], wanted: number): readonly number[] {
  const counts = sharedOut(
    bands.map(({ low, high }) => high - low),
    wanted,
  );
  return bands.flatMap((band, index) => {
    const here = counts[index] ?? 0;
    return Array.from({ length: here }, (_, i) => clusteredShare(band, (i + 0.5) / here));
  });
}

/**
 * More places that are spread over each band as fewer are: straight between neighbours, the first and the last of a band kept.
 *
 * @param groups the fewer places of each band, ascending.
 * @param wanted how many there shall be in all.
 * Source: S.-I. Filip, A robust and scalable implementation of the Parks–McClellan algorithm (2016): reference scaling.
 * @example stretchedNodes([[0, 0.25, 0.5]], 5)[1] // 0.125
 */
export function stretchedNodes(groups: readonly (readonly number[])[], wanted: number): readonly number[] {
  const counts = sharedOut(
    groups.map((group) => group.length),
    wanted,
  );
  return groups.flatMap((group, index) => {
    const here = counts[index] ?? 0;
    return Array.from({ length: here }, (_, i) => between(group, here === 1 ? 0.5 : i / (here - 1)));
  });
}

/** A whole number in proportion to parts, their sum exact. */
function sharedOut(parts: readonly number[], whole: number): readonly number[] {
  const total = parts.reduce((sum, part) => sum + part, 0);
  let passed = 0;
  return parts.map((part) => {
    const from = Math.round((whole * passed) / total);
    passed += part;
    return Math.round((whole * passed) / total) - from;
  });
}

/** The value at a part of the way along a list. */
function between(list: readonly number[], part: number): number {
  const place = part * (list.length - 1);
  const before = Math.min(Math.floor(place), Math.max(0, list.length - 2));
  const low = list[before] ?? 0;
  return low + (place - before) * ((list[before + 1] ?? low) - low);
}
