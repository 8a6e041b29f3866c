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

/** A level axis from well below what matters up to the highest level, with so many dB of room above it for labels. */
export function levelAxis(highestDb: number, roomDb: number, matters: readonly (number | null)[]): LevelAxis {
  const lowest = matters.reduce<number>(
    (low, level) => (level !== null && Number.isFinite(level) ? Math.min(low, level - 30) : low),
    -60,
  );
  // The sum makes a 0 of −0, which JSON cannot carry.
  const high = 10 * Math.ceil((highestDb + roomDb) / 10) + 0;
  return { title: 'dBFS', unit: 'dBFS', low: Math.max(-260, 20 * Math.floor(lowest / 20)), high: Math.max(high, -20) };
}
