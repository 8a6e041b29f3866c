/** The change of a rate into the best window that keeps the wanted bands whole: for each window near by the allowed rate nearest its middle. */
import { rateWindowsOf, type RateWindow } from '../analysis';
import { rateChange, settles } from './rate';
import { rateOptions, type RateOption } from './rate-options';
import { roundedMiddle } from './rounded-middle';
import { ownMargin, type Session } from './session';
import type { Channel } from '../spec';
import { works, type Trial } from './trial';

/** A window further away than this factor asks for another converter. */
const farthest = 2;

/** How many windows are tried, those with the most room first. */
const tried = 10;

/**
 * The proved change into the window that leaves the finding's limit the largest margin, or, for a finding without a limit, that has the
 * most room relative to its rate; one that leaves no warning goes first. Null where no window with two ends is near.
 */
export function* windowTrial(session: Session): Generator<void, Trial | null> {
  const best: { trial: Trial; score: number }[] = [];
  for (const { option, room } of windowOptions(session.channel).slice(0, tried)) {
    const trial = yield* session.attempt([rateChange(session, option)]);
    if (trial === null || !works(trial)) continue;
    const score = session.finding.limit === null ? room : (ownMargin(session.finding, trial.figures) ?? -Infinity);
    best.push({ trial, score });
  }
  const good = settles(session);
  best.sort((a, b) => Number(good(b.trial)) - Number(good(a.trial)) || b.score - a.score);
  return best[0]?.trial ?? null;
}

/** A rate in a window, and how far it is from the window's nearer end, relative to the rate. */
export interface WindowOption {
  readonly option: RateOption;
  readonly room: number;
}

/** One rate for each window near the present rate, those with the most room first. */
export function windowOptions(channel: Channel): readonly WindowOption[] {
  const { hz } = channel.rate;
  const near = rateWindowsOf(channel).windows.filter(
    ({ low, high }) => high < Infinity && high * farthest >= hz && low <= hz * farthest,
  );
  if (near.length === 0) return [];
  const any = channel.rateChoices === null && channel.rate.clock === null;
  const options = any ? [] : rateOptions(channel).flatMap(({ above, below }) => [...above, ...below]);
  const found = near.flatMap((window) => {
    const option = any ? middleOf(window) : nearestMiddle(window, options);
    return option === null ? [] : [{ option, room: roomOf(window, option.hz) }];
  });
  return found.sort((a, b) => b.room - a.room);
}

function middleOf(window: RateWindow): RateOption | null {
  const hz = roundedMiddle(window);
  return hz === null ? null : { hz, clock: null };
}

function nearestMiddle(window: RateWindow, options: readonly RateOption[]): RateOption | null {
  const middle = (window.low + window.high) / 2;
  return options
    .filter(({ hz }) => window.low <= hz && hz <= window.high)
    .reduce<RateOption | null>(
      (best, one) => (best !== null && Math.abs(best.hz - middle) <= Math.abs(one.hz - middle) ? best : one),
      null,
    );
}

function roomOf({ low, high }: RateWindow, hz: number): number {
  return Math.min(hz - low, high - hz) / hz;
}
