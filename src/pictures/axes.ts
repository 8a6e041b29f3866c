/** Chooses what an axis shows: from where to where, and on which scale. */
import type { FrequencyAxis, LevelAxis } from '../protocol/picture';

/** A frequency axis over what matters; logarithmic where the ends lie far apart. */
export function frequencyAxis(title: string, lowestHz: number, highestHz: number): FrequencyAxis {
  const highHz = highestHz > 0 && Number.isFinite(highestHz) ? highestHz : 1;
  const logLowHz = lowestHz > 0 && lowestHz < highHz ? Math.max(lowestHz, highHz / 1e8) : highHz / 1e4;
  const scale = highHz / logLowHz > 25 ? 'log' : 'linear';
  const lowHz = scale === 'log' || lowestHz < highHz / 3 ? 0 : lowestHz;
  return { title, lowHz, highHz, logLowHz, scale };
}

/** A level axis in steps of 20 dB from well below what matters up to the highest level. */
export function levelAxis(highestDb: number, matters: readonly (number | null)[]): LevelAxis {
  const lowest = Math.min(
    -60,
    ...matters.filter((level) => level !== null && Number.isFinite(level)).map((level) => Number(level) - 30),
  );
  const high = highestDb <= -1.5 ? 0 : 20 * Math.ceil((highestDb + 1.5) / 20);
  return { title: 'dBFS', unit: 'dBFS', low: Math.max(-260, 20 * Math.floor(lowest / 20)), high };
}
