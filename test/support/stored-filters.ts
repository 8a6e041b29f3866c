/** Holds filters to stored roots, magnitudes and delays of 50-digit arithmetic. */
import assert from 'node:assert/strict';
import { filterResponse, groupDelay, type Filter, type Root } from '../../src/signal/filter';
import type { StoredFilter, StoredRoot } from '../reference/filter-vectors';
import { assertClose, filterRelative } from './tolerance';

/** Fails unless the filter has these roots, each to 1e−9 of itself, real part by itself too, and their mirror images, and no others. */
export function assertRoots(roots: readonly Root[], stored: readonly StoredRoot[], what: string): void {
  const whole = stored.flatMap(([re, im]): StoredRoot[] =>
    im === 0
      ? [[re, im]]
      : [
          [re, im],
          [re, -im],
        ],
  );
  assert.equal(roots.length, whole.length, what);
  const left = [...roots];
  for (const [re, im] of whole) {
    const distances = left.map((root) => Math.hypot(root.re - re, root.im - im));
    const nearest = distances.indexOf(Math.min(...distances));
    const [root] = left.splice(nearest, 1);
    const off = Math.hypot(root!.re - re, root!.im - im) / Math.hypot(re, im);
    assert.ok(
      (re === 0 && im === 0 && root!.re === 0) || off <= filterRelative,
      `${what}: ${root!.re} + ${root!.im}j is not ${re} + ${im}j`,
    );
    assertClose(root!.re, re, filterRelative, `${what}, real part:`);
  }
}

/**
 * Fails unless gain and delay at every point of a grid are within 1e−9, or, where that is more, within what a last digit of the frequency
 * moves them: on the edge of a filter that turns within a millionth of it no double of the frequency tells more.
 */
export function assertGainAndDelay(
  filter: Filter,
  stored: StoredFilter,
  { grid, edgeHz, perSecond }: { readonly grid: readonly number[]; readonly edgeHz: number; readonly perSecond: number },
  what: string,
): void {
  const response = filterResponse(filter);
  grid.forEach((point, index) => {
    const delay = groupDelay(filter, point * edgeHz);
    const tolerance = Math.max(filterRelative, 8 * Number.EPSILON * (2 * Math.PI * point * edgeHz * delay));
    assertClose(Math.exp(response.logGain(point * edgeHz)), stored.gain[index]!, tolerance, `${what} at ${point}:`);
    assertClose(delay * perSecond, stored.delay[index]!, tolerance, `delay, ${what} at ${point}:`);
  });
}
