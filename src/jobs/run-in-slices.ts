/** Runs long work in short slices, so that whoever shares the thread is answered between them. */

/** The longest time that work keeps the thread, in milliseconds, as far as its own steps allow. */
export const sliceMilliseconds = 10;

/** What the driver needs from its surroundings; all of it arrives as arguments, so that tests own time itself. */
export interface SliceHost {
  /** A clock in milliseconds that never runs backwards. */
  now(): number;
  /** Settles when everybody else who waits for the thread has had a turn. */
  yieldControl(): Promise<void>;
  /** Whether nobody wants the result any more, such as when the document has a newer version. */
  cancelled(): boolean;
}

/** The end of a run: its result, or nothing where it was dropped before it was done. */
export type Outcome<T> = { readonly kind: 'done'; readonly value: T } | { readonly kind: 'dropped' };

/**
 * Runs `work` until it is done or dropped. Its steps are never split, so a slice is over at the first pause after
 * `sliceMilliseconds`. `cancelled` is asked at the start and after every turn of the others, since it can only
 * change there; dropped work gets to run its `finally` blocks.
 */
export async function runInSlices<T>(work: Generator<void, T>, host: SliceHost): Promise<Outcome<T>> {
  while (!host.cancelled()) {
    const step = runSlice(work, host);
    if (step.done === true) return { kind: 'done', value: step.value };
    await host.yieldControl();
  }
  work.return(undefined as never);
  return { kind: 'dropped' };
}

function runSlice<T>(work: Generator<void, T>, host: SliceHost): IteratorResult<void, T> {
  const end = host.now() + sliceMilliseconds;
  let step = work.next();
  while (step.done !== true && host.now() < end) step = work.next();
  return step;
}
