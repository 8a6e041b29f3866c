/** Which of many extremes of an error alternate in sign and are as large as can be. */

/** The error at a place. */
export interface ErrorPoint {
  readonly x: number;
  readonly error: number;
}

/**
 * So many extremes, alternating in sign, with the smallest of them as large as can be had by dropping neighbours.
 *
 * @param points ascending in x.
 * @param count how many are wanted.
 * @returns fewer only where the signs change less often.
 * Source: the exchange of E. Remez as in T. W. Parks, J. H. McClellan (1972).
 * @example alternating([{ x: 0, error: 1 }, { x: 1, error: 2 }, { x: 2, error: -1 }], 2)[0].x // 1
 */
export function alternating(points: readonly ErrorPoint[], count: number): readonly ErrorPoint[] {
  const kept = largestOfRuns(points);
  while (kept.length > count) {
    if (kept.length === count + 1) dropSmallerEnd(kept);
    else dropSmallest(kept);
  }
  return kept;
}

/** Of neighbours with the same sign the largest. */
function largestOfRuns(points: readonly ErrorPoint[]): ErrorPoint[] {
  const kept: ErrorPoint[] = [];
  for (const point of points) {
    const last = kept.at(-1);
    if (last === undefined || Math.sign(last.error) !== Math.sign(point.error)) kept.push(point);
    else if (sizeOf(point) > sizeOf(last)) kept[kept.length - 1] = point;
  }
  return kept;
}

function dropSmallerEnd(kept: ErrorPoint[]): void {
  if (sizeOf(kept[0]) < sizeOf(kept.at(-1))) kept.shift();
  else kept.pop();
}

/** An end goes alone; from the middle a pair goes, the smallest and the smaller of its neighbours, so that signs still alternate. */
function dropSmallest(kept: ErrorPoint[]): void {
  const sizes = kept.map(sizeOf);
  const smallest = sizes.indexOf(Math.min(...sizes));
  if (smallest === 0) kept.shift();
  else if (smallest === kept.length - 1) kept.pop();
  else kept.splice(sizeOf(kept[smallest - 1]) < sizeOf(kept[smallest + 1]) ? smallest - 1 : smallest, 2);
}

function sizeOf(point: ErrorPoint | undefined): number {
  return Math.abs(point?.error ?? 0);
}
