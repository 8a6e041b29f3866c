/** Between decibels at the edges and the natural logarithms that gains are handled as inside. */

/** Decibels in one neper: 20 / ln 10. */
export const decibelsPerNeper = 20 / Math.LN10;

/** ln of an amplitude ratio as dB; never −0, which would be printed with a sign. */
export function toDb(logGain: number): number {
  return logGain * decibelsPerNeper + 0;
}

/** The power ratio of a level in dB. */
export function powerOf(db: number): number {
  return 10 ** (db / 10);
}

/** A power ratio as dB; −Infinity for none. */
export function powerDb(power: number): number {
  return 10 * Math.log10(power);
}

/** Levels added as powers; null where there are none. Measured from the strongest, so that no power is too small to hold. */
export function sumOfLevels(levelsDb: readonly number[]): number | null {
  if (levelsDb.length === 0) return null;
  const most = levelsDb.reduce((top, level) => Math.max(top, level), -Infinity);
  return Number.isFinite(most) ? most + powerDb(levelsDb.reduce((sum, level) => sum + powerOf(level - most), 0)) : most;
}

/** Parts that exist, added as powers; null where none exists. */
export function sumOfParts(levelsDb: readonly (number | null)[]): number | null {
  return sumOfLevels(levelsDb.filter((level) => level !== null));
}
