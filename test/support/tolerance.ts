/** The tolerances that tests hold numbers to, each named and explained once, and the assertions that use them. */
import assert from 'node:assert/strict';

/** Relative; what filters of order 20 are promised to keep against 50-digit arithmetic. */
export const filterRelative = 1e-9;

/** Relative; a handful of roundings in double precision. */
export const roundingRelative = 1e-12;

/** dB; two evaluations of one formula in double precision may differ by this where hundreds of dB are summed. */
export const roundingDb = 1e-10;

/** dB; what every proved maximum is promised to be tight to. */
export const provedGapDb = 0.001;

/** Fails unless two numbers agree relatively (and where one is 0 or infinite, exactly). */
export function assertClose(actual: number, expected: number, relative: number, what = ''): void {
  const close = actual === expected || Math.abs(actual - expected) <= relative * Math.abs(expected);
  assert.ok(close, `${what} ${actual} is not within ${relative} of ${expected}`);
}

/** Fails unless two numbers agree to an absolute difference. */
export function assertWithin(actual: number, expected: number, difference: number, what = ''): void {
  const close = actual === expected || Math.abs(actual - expected) <= difference;
  assert.ok(close, `${what} ${actual} is not within ± ${difference} of ${expected}`);
}
