/** Timing by ratio: two or more things run in turn within one process, medians compared, since absolute times mean little on a shared machine. */

/** One thing to time. It gets the round's number, so that it can vary its input. */
export type Contender = (round: number) => void;

/** Median times in milliseconds, by name. Runs all contenders in turn, `rounds` times, after one warm-up round that does not count. */
export function medians<Name extends string>(contenders: Readonly<Record<Name, Contender>>, rounds = 9): Record<Name, number> {
  const names = Object.keys(contenders) as Name[];
  const times = new Map<Name, number[]>(names.map((name) => [name, []]));
  for (let round = -1; round < rounds; round++) {
    for (const name of names) {
      const start = performance.now();
      contenders[name](round + 1);
      if (round >= 0) times.get(name)?.push(performance.now() - start);
    }
  }
  return Object.fromEntries(names.map((name) => [name, median(times.get(name) ?? [])])) as Record<Name, number>;
}

/** The middle value. */
export function median(values: readonly number[]): number {
  const sorted = [...values].sort((a, b) => a - b);
  return sorted[Math.floor(sorted.length / 2)] ?? NaN;
}

/** One line of the report: what was measured, against what, the ratio, and the goal; without a goal the ratio is only shown. */
export function report(what: string, ratio: number, goal: number | null, detail: string): void {
  const verdict = goal === null ? '' : ratio <= goal ? 'within' : 'OVER';
  const wanted = goal === null ? '' : `goal ${String(goal)}`;
  process.stdout.write(
    `${what.padEnd(58)} ${ratio.toFixed(4).padStart(9)}  ${wanted.padEnd(12)} ${verdict.padEnd(7)} ${detail}\n`,
  );
}
