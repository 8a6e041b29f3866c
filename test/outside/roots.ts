/** Compares a filter's roots with stored ones of the upper half plane, each with its nearest. */
import assert from 'node:assert/strict';
import type { Root } from '../../src/signal/filter';
import type { StoredRoot } from '../reference/filter-vectors';
import type { Tally } from './group';

/** Tallies the distance of each root over its size, and of its real part over itself; `scale` turns ours into the stored unit. */
export function tallyRoots(
  tally: Tally,
  roots: readonly Root[],
  { expected, scale, allowed, what }: { expected: readonly StoredRoot[]; scale: number; allowed: number; what: string },
): void {
  const left = roots.filter(({ im }) => im >= 0).map(({ re, im }): StoredRoot => [re * scale, im * scale]);
  assert.equal(left.length, expected.length, what);
  for (const [re, im] of expected) {
    const distances = left.map((root) => Math.hypot(root[0] - re, root[1] - im));
    const distance = Math.min(...distances);
    const [nearest] = left.splice(distances.indexOf(distance), 1);
    const size = Math.hypot(re, im);
    tally.relative(size === 0 ? distance : size + distance, size, allowed, `${what}, root ${re} + ${im}j`);
    tally.relative(nearest![0] === 0 ? 0 : nearest![0], re, allowed, `${what}, real part of ${re} + ${im}j`);
  }
}
