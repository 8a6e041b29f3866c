/** Proved search over one interval: the sign of the slope settles it, else two lines through the end values bound it, else it is split. */
import type { Enclosure, Response } from '../response';
import type { Frontier, Node } from './frontier';

/** What is maximised over an interval of frequencies. */
export interface Curve {
  /** Handed back with the best point, to tell curves apart. */
  readonly tag: number;
  logGain(frequencyHz: number): number;
  /** An upper bound over an interval. */
  upper(lowHz: number, highHz: number): number;
  slope(lowHz: number, highHz: number): Enclosure | null;
}

/**
 * A response as a curve.
 *
 * @example curveOf(rectangleResponse(1), 3).tag // 3
 */
export function curveOf(response: Response, tag: number): Curve {
  return {
    tag,
    logGain: (frequencyHz) => response.logGain(frequencyHz),
    upper: (lowHz, highHz) => response.bounds(lowHz, highHz).high,
    slope: (lowHz, highHz) => response.slope(lowHz, highHz),
  };
}

/** Evaluates both ends and opens the interval. */
export function openInterval(frontier: Frontier, curve: Curve, lowHz: number, highHz: number): void {
  const atLow = pointAt(frontier, curve, lowHz);
  if (highHz > lowHz) openBetween(frontier, curve, { lowHz, highHz, atLow, atHigh: pointAt(frontier, curve, highHz) }, 'both');
}

/** An interval with the values at its ends. */
interface Ends {
  readonly lowHz: number;
  readonly highHz: number;
  readonly atLow: number;
  readonly atHigh: number;
}

/** Which bounds are worth evaluating: once two lines have beaten the range, they do so in every part. */
type Bounding = 'both' | 'lines';

function pointAt(frontier: Frontier, curve: Curve, frequencyHz: number): number {
  frontier.evaluations += 1;
  const logGain = curve.logGain(frequencyHz);
  frontier.note(logGain, frequencyHz, curve.tag);
  return logGain;
}

function openBetween(frontier: Frontier, curve: Curve, ends: Ends, bounding: Bounding): void {
  const { lowHz, highHz } = ends;
  let slope: Enclosure | null = null;
  if (highHz < Infinity) {
    frontier.evaluations += 1;
    slope = curve.slope(lowHz, highHz);
    // Where the slope keeps one sign the largest value is at an end, which is known.
    if (slope !== null && (slope.low >= 0 || slope.high <= 0)) return;
  }
  const lines = slope === null ? null : betweenLines(ends, slope);
  if (lines !== null && (bounding === 'lines' || !frontier.mayWin(lines.upper))) {
    frontier.open(new IntervalNode(curve, ends, lines.upper, lines.meetHz, 'lines'));
    return;
  }
  frontier.evaluations += 1;
  const range = curve.upper(lowHz, highHz);
  if (lines !== null && lines.upper <= range) frontier.open(new IntervalNode(curve, ends, lines.upper, lines.meetHz, 'lines'));
  else frontier.open(new IntervalNode(curve, ends, range, middle(lowHz, highHz), 'both'));
}

/** From each end the value can rise no faster than the slope's bound: the highest point of both lines, and where it is. */
function betweenLines(ends: Ends, slope: Enclosure): { readonly upper: number; readonly meetHz: number } | null {
  const width = ends.highHz - ends.lowHz;
  const offset = (ends.atHigh - ends.atLow - slope.low * width) / (slope.high - slope.low);
  const upper = ends.atLow + slope.high * offset;
  if (!Number.isFinite(upper)) return null;
  return { upper, meetHz: ends.lowHz + Math.min(Math.max(offset, 0.3 * width), 0.7 * width) };
}

/** Halfway; by the geometric mean over more than four octaves, with 1e−9 Hz and 1e15 Hz as the ends of every scale. */
function middle(lowHz: number, highHz: number): number {
  if (highHz < Infinity && highHz <= 16 * lowHz) return lowHz + 0.5 * (highHz - lowHz);
  if (highHz < Infinity && lowHz === 0) return 0.5 * highHz;
  return Math.sqrt(Math.max(lowHz, 1e-9)) * Math.sqrt(highHz === Infinity ? Math.max(1e15, 1e6 * lowHz) : highHz);
}

class IntervalNode implements Node {
  constructor(
    private readonly curve: Curve,
    private readonly ends: Ends,
    readonly upper: number,
    private readonly cutHz: number,
    private readonly bounding: Bounding,
  ) {}

  split(frontier: Frontier): void {
    const { lowHz, highHz, atLow, atHigh } = this.ends;
    const cutHz = this.cutHz;
    if (cutHz <= lowHz || cutHz >= highHz) {
      frontier.settle(this.upper);
      return;
    }
    const atCut = pointAt(frontier, this.curve, cutHz);
    openBetween(frontier, this.curve, { lowHz, highHz: cutHz, atLow, atHigh: atCut }, this.bounding);
    openBetween(frontier, this.curve, { lowHz: cutHz, highHz, atLow: atCut, atHigh }, this.bounding);
  }
}
