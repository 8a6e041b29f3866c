/** The proved largest gain over bands of frequencies. */
import type { Enclosure, Response } from '../response';
import type { Extreme, SearchOptions } from './extreme';
import { Frontier } from './frontier';
import { gapOf, toNepers } from './gap';
import { curveOf, openInterval, type Curve } from './interval';

/**
 * The largest gain of a response over bands, proved: no frequency in them gives more than `logGain`.
 *
 * Best-first branch and bound (interval bounds, sign of the slope, two lines through the ends); never a grid. Where all turning points
 * of the response are known, the ends and the turning points inside are the whole answer.
 *
 * @param response what is maximised; hand in its inverse for the smallest.
 * @param bands closed intervals in Hz, 0 ≤ low ≤ high ≤ Infinity.
 * @returns null for no bands; −Infinity where the gain is nothing but nulls.
 * Source: interval branch and bound, common practice; Piyavskii's two lines.
 * @example largestOverBands(rectangleResponse(1), [{ low: 0.25, high: 3 }]).frequencyHz // 0.25
 */
export function largestOverBands(response: Response, bands: readonly Enclosure[], options: SearchOptions = {}): Extreme | null {
  if (bands.length === 0) return null;
  const frontier = new Frontier(toNepers(options.gapDb), options.evaluationLimit);
  const curve = curveOf(response, 0);
  for (const band of bands) {
    if (!(band.low >= 0 && band.low <= band.high))
      throw new RangeError(`A band must run upwards from 0 Hz, not ${band.low} .. ${band.high}.`);
    if (response.turnsHz === undefined) openInterval(frontier, curve, band.low, band.high);
    else noteTurns(frontier, curve, response.turnsHz, band);
  }
  const logGain = frontier.prove();
  return { logGain, frequencyHz: frontier.bestHz, gapDb: gapOf(logGain, frontier.best), evaluations: frontier.evaluations };
}

function noteTurns(frontier: Frontier, curve: Curve, turnsHz: readonly number[], band: Enclosure): void {
  const inside = turnsHz.filter((turn) => band.low < turn && turn < band.high);
  for (const frequencyHz of [band.low, band.high, ...inside]) {
    frontier.evaluations += 1;
    frontier.note(curve.logGain(frequencyHz), frequencyHz, curve.tag);
  }
}
