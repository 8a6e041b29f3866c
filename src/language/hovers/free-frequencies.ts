/** Where a tone may stand without landing in a protected range. */

/** Where a tone is against the stretches that land in a protected range. */
export interface Freedom {
  /** Whether it lands in one. */
  readonly inside: boolean;
  /** The edge below and above: of the stretch it is in, or of the free stretch it is in; null where there is none. */
  readonly below: number | null;
  readonly above: number | null;
}

interface Stretch {
  readonly low: number;
  readonly high: number;
}

/** The edges around a tone at a sampling rate: a range [a, b] is landed in from k·fs + [a, b] and k·fs − [a, b]. */
export function freedomOf(frequencyHz: number, rateHz: number, ranges: readonly Stretch[]): Freedom {
  const near = Math.round(frequencyHz / rateHz);
  const folds = [near - 1, near, near + 1].filter((fold) => fold >= 0);
  const stretches = merged(
    folds.flatMap((fold) =>
      ranges.flatMap(({ low, high }) => [
        { low: fold * rateHz + low, high: fold * rateHz + high },
        { low: fold * rateHz - high, high: fold * rateHz - low },
      ]),
    ),
  );
  const around = stretches.find(({ low, high }) => low <= frequencyHz && frequencyHz <= high);
  if (around !== undefined) return { inside: true, below: around.low > 0 ? around.low : null, above: around.high };
  const below = stretches.filter(({ high }) => high < frequencyHz).at(-1)?.high ?? null;
  const above = stretches.find(({ low }) => low > frequencyHz)?.low ?? null;
  return { inside: false, below, above };
}

/** Sorted, with those that touch joined, above 0 Hz. */
function merged(stretches: readonly Stretch[]): Stretch[] {
  const sorted = stretches.filter(({ high }) => high >= 0).sort((a, b) => a.low - b.low);
  const joined: Stretch[] = [];
  for (const stretch of sorted) {
    const last = joined.at(-1);
    if (last !== undefined && stretch.low <= last.high)
      joined[joined.length - 1] = { low: last.low, high: Math.max(last.high, stretch.high) };
    else joined.push(stretch);
  }
  return joined;
}
