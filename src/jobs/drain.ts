/** Runs long work to its end at once, for callers that nobody waits on: the command line and tests. */

/** The result of `work`, with every pause in it skipped. */
export function drain<T>(work: Generator<void, T>): T {
  let step = work.next();
  while (step.done !== true) step = work.next();
  return step.value;
}
