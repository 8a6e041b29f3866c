/** The proved largest minus the smallest group delay of stages in series over bands. */
import type { Filter } from '../signal/filter';
import { groupDelayResponse } from '../signal/group-delay-response';
import { tableDelayPieces } from '../signal/measured/table-delay';
import type { DelayPiece } from '../signal/measured/table-delay';
import type { Enclosure, Response } from '../signal/response';
import { inverse } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import type { StagePath } from './stage-path';

/** A spread in seconds. */
export interface DelaySpread {
  readonly seconds: number;
  readonly evaluations: number;
}

/**
 * The spread of the stages' delay over bands; null where a measured stage has no phase. The delay of a table is the same over each piece
 * between two of its points, so that each piece adds a constant to what the poles and zeros make of it.
 */
export function delaySpread(stages: readonly StagePath[], bands: readonly Enclosure[]): DelaySpread | null {
  const pieces = piecesOf(stages, bands);
  if (pieces === null) return null;
  const filters = stages.flatMap(({ filter }): readonly Filter[] => (filter === null ? [] : [filter]));
  if (filters.length === 0) return { seconds: spreadOf(pieces.map((piece) => piece.seconds)), evaluations: 0 };
  const delay = groupDelayResponse(filters);
  const most = extreme(delay, pieces, 'largest');
  const least = extreme(delay, pieces, 'smallest');
  return { seconds: Math.max(0, most.seconds - least.seconds), evaluations: most.evaluations + least.evaluations };
}

/** The bands cut where a table's delay steps. */
function piecesOf(stages: readonly StagePath[], bands: readonly Enclosure[]): readonly DelayPiece[] | null {
  let pieces: readonly DelayPiece[] = bands.map((band) => ({ lowHz: band.low, highHz: band.high, seconds: 0 }));
  for (const { table } of stages) {
    if (table === null) continue;
    if (table.phasesRad === null) return null;
    pieces = pieces.flatMap((piece) =>
      (tableDelayPieces(table, piece.lowHz, piece.highHz) ?? []).map((part) => ({
        ...part,
        seconds: part.seconds + piece.seconds,
      })),
    );
  }
  return pieces;
}

/** The largest or smallest of the delay in `logDelay` plus what its piece adds; pieces whose bounds cannot win are not searched. */
function extreme(logDelay: Response, pieces: readonly DelayPiece[], which: 'largest' | 'smallest'): DelaySpread {
  const sign = which === 'largest' ? 1 : -1;
  let best = -Infinity;
  let evaluations = 0;
  for (const { lowHz, highHz, seconds } of pieces) {
    const bounds = logDelay.bounds(lowHz, highHz);
    if (sign * (Math.exp(which === 'largest' ? bounds.high : bounds.low) + seconds) <= best) continue;
    const found = largestOverBands(which === 'largest' ? logDelay : inverse(logDelay), [{ low: lowHz, high: highHz }]);
    evaluations += found?.evaluations ?? 0;
    best = Math.max(best, sign * (Math.exp(sign * (found?.logGain ?? NaN)) + seconds));
  }
  return { seconds: sign * best, evaluations };
}

function spreadOf(values: readonly number[]): number {
  return values.reduce((a, b) => Math.max(a, b), -Infinity) - values.reduce((a, b) => Math.min(a, b), Infinity);
}
