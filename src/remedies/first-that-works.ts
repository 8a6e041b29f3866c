/** Finds, in a row of candidates of rising size, the first that works, looking at few of them. */
import type { Trial } from './trial';

/** Tries the candidate at an index; null where it cannot be tried. */
export type AttemptAt = (index: number) => Generator<void, Trial | null>;

/** How many candidates are tried one by one before the stride grows. */
const oneByOne = 6;

/**
 * The first index from `from` on whose trial is `good`: one by one at first, then in growing strides with a bisection of the
 * last one. What it finds is proved; that nothing smaller works is certain only where once good means good from there on.
 */
export function* firstThatWorks(
  count: number,
  attemptAt: AttemptAt,
  good: (trial: Trial) => boolean,
  from = 0,
): Generator<void, { readonly index: number; readonly trial: Trial } | null> {
  let failing = from - 1;
  for (let index = from; index < count; index = nextIndex(index, from, count)) {
    const trial = yield* attemptAt(index);
    if (trial !== null && good(trial)) return yield* narrowed(failing, { index, trial }, attemptAt, good);
    failing = index;
  }
  return null;
}

/** The stride doubles behind the first few; the last candidate is always looked at. */
function nextIndex(index: number, from: number, count: number): number {
  if (index === count - 1) return count;
  const done = index - from + 1;
  return Math.min(count - 1, done < oneByOne ? index + 1 : index + Math.ceil(done / 2));
}

function* narrowed(
  failing: number,
  found: { readonly index: number; readonly trial: Trial },
  attemptAt: AttemptAt,
  good: (trial: Trial) => boolean,
): Generator<void, { readonly index: number; readonly trial: Trial }> {
  let low = failing;
  let best = found;
  while (best.index - low > 1) {
    const index = Math.floor((low + best.index) / 2);
    const trial = yield* attemptAt(index);
    if (trial !== null && good(trial)) best = { index, trial };
    else low = index;
  }
  return best;
}
