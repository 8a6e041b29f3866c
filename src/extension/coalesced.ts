/** Work that is asked for more often than it need be done: while one run is under way, any number of further asks become one more run. */

/** A function that runs `task`, never twice at a time; its promise settles once a run that began after the call has ended. */
export function coalesced(task: () => Promise<void>): () => Promise<void> {
  let running: Promise<void> | null = null;
  let waiting: Promise<void> | null = null;
  const begin = (): Promise<void> => {
    waiting = null;
    running = task().finally(() => {
      running = null;
    });
    return running;
  };
  return () => {
    if (running === null) return begin();
    // The run under way may have read its input already; whether it failed is its own asker's business.
    waiting ??= running.then(begin, begin);
    return waiting;
  };
}
