/** A function of frequency as few points: dense at corners, nulls and steps, sparse where it runs straight, right on a linear and on a logarithmic axis. */
import type { Points } from '../protocol/picture';

/** How a curve is sampled. */
export interface Sampling {
  readonly lowHz: number;
  readonly highHz: number;
  /** Frequencies that must be among the points: nulls, edges, worst cases. */
  readonly through: readonly number[];
  /** What lies below need not be told apart, in the curve's unit. */
  readonly floor: number;
  /** How far a straight line between two points may miss the curve, in the curve's unit. */
  readonly tolerance: number;
}

/** The most points that a curve may have. */
export const mostPoints = 2000;

/** What is written where a curve has no finite value: a null is drawn as far below anything that is ever shown. */
export const bottom = -1000;

/** How many points are taken before any is added where the curve bends. */
const evenPoints = 24;

/** How often a stretch may be halved. */
const deepest = 18;

/** Samples a curve. */
export function sampleCurve(curve: (frequencyHz: number) => number, sampling: Sampling): Points {
  const { lowHz, highHz } = sampling;
  if (!(lowHz < highHz)) return { x: [lowHz], y: [valueOf(curve, lowHz)] };
  const x: number[] = [];
  const y: number[] = [];
  const starts = startPoints(sampling);
  const budget = { left: mostPoints - starts.length };
  let from = { x: lowHz, y: valueOf(curve, lowHz) };
  x.push(from.x);
  y.push(from.y);
  for (const start of starts.slice(1)) {
    const to = { x: start, y: valueOf(curve, start) };
    refine(curve, from, to, sampling, 0, budget, (point) => {
      x.push(point.x);
      y.push(point.y);
    });
    x.push(to.x);
    y.push(to.y);
    from = to;
  }
  return { x, y };
}

interface Point {
  readonly x: number;
  readonly y: number;
}

/** Even points on both kinds of axis, and those that must be there. */
function startPoints({ lowHz, highHz, through }: Sampling): number[] {
  const shares = Array.from({ length: evenPoints + 1 }, (_, index) => index / evenPoints);
  const linear = shares.map((share) => lowHz + share * (highHz - lowHz));
  const ratio = highHz / lowHz;
  const logarithmic = lowHz > 0 && ratio > 2 ? shares.map((share) => lowHz * ratio ** share) : [];
  const inside = [...linear, ...logarithmic, ...through].filter((f) => f > lowHz && f < highHz);
  return [...new Set([lowHz, ...inside, highHz])].sort((a, b) => a - b);
}

function refine(
  curve: (frequencyHz: number) => number,
  from: Point,
  to: Point,
  sampling: Sampling,
  depth: number,
  budget: { left: number },
  add: (point: Point) => void,
): void {
  const middles = middlesOf(from.x, to.x).map((x) => ({ x, y: valueOf(curve, x) }));
  const bent = middles.some((middle) => missOf(from, middle, to, sampling) > sampling.tolerance);
  const [middle] = middles;
  if (middle === undefined || !bent || depth >= deepest || budget.left <= 0) return;
  budget.left -= 1;
  refine(curve, from, middle, sampling, depth + 1, budget, add);
  add(middle);
  refine(curve, middle, to, sampling, depth + 1, budget, add);
}

/** The arithmetic middle, where a linear axis bends most, and the geometric one for a logarithmic axis. */
function middlesOf(low: number, high: number): number[] {
  const arithmetic = (low + high) / 2;
  if (!(arithmetic > low && arithmetic < high)) return [];
  return low > 0 && high / low > 1.2 ? [Math.sqrt(low * high), arithmetic] : [arithmetic];
}

/** The larger miss of the two straight lines that the two kinds of axis draw. */
function missOf(from: Point, middle: Point, to: Point, { floor }: Sampling): number {
  const [y0, y, y1] = [from.y, middle.y, to.y].map((value) => Math.max(floor, value)) as [number, number, number];
  const linear = (middle.x - from.x) / (to.x - from.x);
  const logarithmic = from.x > 0 ? Math.log(middle.x / from.x) / Math.log(to.x / from.x) : linear;
  return Math.max(Math.abs(y0 + linear * (y1 - y0) - y), Math.abs(y0 + logarithmic * (y1 - y0) - y));
}

function valueOf(curve: (frequencyHz: number) => number, frequencyHz: number): number {
  const value = curve(frequencyHz);
  if (Number.isFinite(value)) return value;
  return value === Infinity ? -bottom : bottom;
}
