/** The proved largest minus the smallest group delay of a path over bands. */
import type { Filter } from '../signal/filter';
import { delayOffset, groupDelayResponse } from '../signal/group-delay-response';
import { tableDelayPieces } from '../signal/measured/table-delay';
import type { DelayPiece } from '../signal/measured/table-delay';
import type { Enclosure, Response } from '../signal/response';
import { inverse } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import { sumOfGains } from '../signal/sum-of-gains';
import type { StagePath } from './stage-path';

/** A delay as searches take it. */
export interface DelayCurve {
  /** ln of the delay and the offset together, in seconds. */
  readonly response: Response;
  /** What is added so that the logarithm exists. */
  readonly offsetSeconds: number;
}

/** A spread in seconds. */
export interface DelaySpread {
  /** No two frequencies differ by more. */
  readonly seconds: number;
  /** Two frequencies differ by this much. */
  readonly reachedSeconds: number;
  /** Where the delay is largest. */
  readonly atHz: number;
  readonly evaluations: number;
}

/** What the spread is of, and how exactly it is wanted. */
export interface SpreadQuestion {
  readonly stages: readonly StagePath[];
  /** The pulse's own delay where that depends on frequency; null where it does not. */
  readonly pulse: DelayCurve | null;
  readonly bands: readonly Enclosure[];
  /** How far the proved bounds may stand off, in seconds; null for a thousandth of the delay. */
  readonly withinSeconds: number | null;
}

/** As a share of the delay; half of it is left to either bound, the largest delay and the smallest one. */
const usualShare = 1e-3;

/** Below this share of the delay bounds are rounding. */
const finestShare = 1e-7;

/**
 * The spread of a path's delay over bands; null where a measured stage has no phase. The delay of a table is the same over each piece
 * between two of its points, so that each piece adds a constant to what the poles, the zeros and the pulse make of it.
 */
export function delaySpread(question: SpreadQuestion): DelaySpread | null {
  const pieces = piecesOf(question.stages, question.bands);
  const [first] = pieces ?? [];
  if (pieces === null || first === undefined) return null;
  const curve = curveOf(question);
  if (curve === null) return spreadOfPieces(pieces, first);
  const gapDb = gapFor(question.withinSeconds, Math.exp(curve.response.logGain(first.lowHz)));
  const most = extreme(curve, pieces, 'largest', gapDb);
  const least = extreme(curve, pieces, 'smallest', gapDb);
  return {
    seconds: Math.max(0, most.provedSeconds - least.provedSeconds),
    reachedSeconds: Math.max(0, most.seconds - least.seconds),
    atHz: most.atHz,
    evaluations: most.evaluations + least.evaluations,
  };
}

function gapFor(withinSeconds: number | null, delaySeconds: number): number {
  const share = withinSeconds === null ? usualShare : Math.min(usualShare, withinSeconds / delaySeconds);
  return 20 * Math.log10(1 + Math.max(finestShare, share / 2));
}

/** Poles and zeros, and the pulse: what changes along a piece; null where nothing does. */
function curveOf({ stages, pulse }: SpreadQuestion): DelayCurve | null {
  const filters = stages.flatMap(({ filter }): readonly Filter[] => (filter === null ? [] : [filter]));
  const roots = filters.some(({ poles, zeros }) => poles.length + zeros.length > 0);
  const curves = [
    ...(roots ? [{ response: groupDelayResponse(filters), offsetSeconds: delayOffset(filters) }] : []),
    ...(pulse === null ? [] : [pulse]),
  ];
  if (curves.length === 0) return null;
  return {
    response: sumOfGains(curves.map(({ response }) => response)),
    offsetSeconds: curves.reduce((sum, { offsetSeconds }) => sum + offsetSeconds, 0),
  };
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

function spreadOfPieces(pieces: readonly DelayPiece[], first: DelayPiece): DelaySpread {
  const most = pieces.reduce((best, piece) => (piece.seconds > best.seconds ? piece : best), first);
  const least = pieces.reduce((best, piece) => (piece.seconds < best.seconds ? piece : best), first);
  const seconds = most.seconds - least.seconds;
  return { seconds, reachedSeconds: seconds, atHz: most.lowHz, evaluations: 0 };
}

/** A largest or smallest delay. */
interface DelayExtreme {
  readonly seconds: number;
  readonly provedSeconds: number;
  readonly atHz: number;
  readonly evaluations: number;
}

/** The largest or smallest of the curve plus what its piece adds; pieces whose bounds cannot win are not searched. */
function extreme(curve: DelayCurve, pieces: readonly DelayPiece[], which: 'largest' | 'smallest', gapDb: number): DelayExtreme {
  const { response, offsetSeconds } = curve;
  const sign = which === 'largest' ? 1 : -1;
  const searched = which === 'largest' ? response : inverse(response);
  let best: DelayExtreme = { seconds: -sign * Infinity, provedSeconds: -sign * Infinity, atHz: NaN, evaluations: 0 };
  let evaluations = 0;
  for (const { lowHz, highHz, seconds } of pieces) {
    const bounds = response.bounds(lowHz, highHz);
    const bound = Math.exp(which === 'largest' ? bounds.high : bounds.low) - offsetSeconds + seconds;
    if (sign * bound <= sign * best.provedSeconds) continue;
    const found = largestOverBands(searched, [{ low: lowHz, high: highHz }], { gapDb });
    if (found === null) continue;
    evaluations += found.evaluations;
    const reached = Math.exp(response.logGain(found.frequencyHz)) - offsetSeconds + seconds;
    const proved = Math.exp(sign * found.logGain) - offsetSeconds + seconds;
    best = {
      seconds: sign * Math.max(sign * reached, sign * best.seconds),
      provedSeconds: sign * Math.max(sign * proved, sign * best.provedSeconds),
      atHz: sign * reached > sign * best.seconds ? found.frequencyHz : best.atHz,
      evaluations,
    };
  }
  return { ...best, evaluations };
}
