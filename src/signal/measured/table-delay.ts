/** Phase and group delay of a measured table. */
import { countUpTo, type GainTable } from './gain-table';

/** A stretch of frequencies over which the delay is the same. */
export interface DelayPiece {
  readonly lowHz: number;
  readonly highHz: number;
  readonly seconds: number;
}

/**
 * The phase of a table in radians, straight between its points and straight on outside them; null where the table has none.
 *
 * @param frequencyHz ≥ 0, finite.
 * Source: elementary.
 * @example tablePhase({ frequenciesHz: [0, 100], gainsDb: [0, 0], phasesRad: [0, -1], beyondDbPerDecade: 0 }, 150) // -1.5
 */
export function tablePhase({ frequenciesHz, phasesRad }: GainTable, frequencyHz: number): number | null {
  if (phasesRad === null) return null;
  const piece = pieceAt(frequenciesHz, frequencyHz, 'at most');
  const slope = -2 * Math.PI * pieceDelay(frequenciesHz, phasesRad, piece);
  return (phasesRad[piece] ?? 0) + slope * (frequencyHz - (frequenciesHz[piece] ?? 0));
}

/**
 * The group delay of a table in seconds: −dφ/dω of the piece that a frequency lies on, at a point between two the mean of both; outside
 * the table that of its first or last piece. Null where the table has no phase.
 *
 * @param frequencyHz ≥ 0.
 * Source: the slope of the phase, elementary.
 * @example tableDelay({ frequenciesHz: [0, 100], gainsDb: [0, 0], phasesRad: [0, -2 * Math.PI], beyondDbPerDecade: 0 }, 50) // 0.01
 */
export function tableDelay({ frequenciesHz, phasesRad }: GainTable, frequencyHz: number): number | null {
  if (phasesRad === null) return null;
  const above = pieceDelay(frequenciesHz, phasesRad, pieceAt(frequenciesHz, frequencyHz, 'at most'));
  const below = pieceDelay(frequenciesHz, phasesRad, pieceAt(frequenciesHz, frequencyHz, 'below'));
  return 0.5 * (above + below);
}

/**
 * The stretches of a band over which a table's delay is the same, ascending; null where the table has no phase.
 *
 * @param lowHz ≥ 0.
 * @param highHz ≥ low, finite.
 * Source: elementary.
 * @example tableDelayPieces({ frequenciesHz: [0, 100, 200], gainsDb: [0, 0, 0], phasesRad: [0, -1, -3], beyondDbPerDecade: 0 }, 50, 150).length // 2
 */
export function tableDelayPieces(
  { frequenciesHz, phasesRad }: GainTable,
  lowHz: number,
  highHz: number,
): readonly DelayPiece[] | null {
  if (phasesRad === null) return null;
  const first = pieceAt(frequenciesHz, lowHz, 'at most');
  const last = Math.max(first, pieceAt(frequenciesHz, highHz, 'below'));
  return Array.from({ length: last - first + 1 }, (_, offset) => {
    const piece = first + offset;
    return {
      lowHz: piece === first ? lowHz : (frequenciesHz[piece] ?? lowHz),
      highHz: piece === last ? highHz : (frequenciesHz[piece + 1] ?? highHz),
      seconds: pieceDelay(frequenciesHz, phasesRad, piece),
    };
  });
}

/** The piece that a frequency lies on; at a point the one above it, or the one `below`. */
function pieceAt(frequenciesHz: readonly number[], frequencyHz: number, which: 'below' | 'at most'): number {
  const index = countUpTo(frequenciesHz, frequencyHz, which) - 1;
  return Math.min(Math.max(index, 0), frequenciesHz.length - 2);
}

function pieceDelay(frequenciesHz: readonly number[], phasesRad: readonly number[], piece: number): number {
  const turn = (phasesRad[piece + 1] ?? 0) - (phasesRad[piece] ?? 0);
  return 0 - turn / (2 * Math.PI * ((frequenciesHz[piece + 1] ?? 0) - (frequenciesHz[piece] ?? 0)));
}
