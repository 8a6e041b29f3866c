/** The change of a value that has neighbours, such as an order or a standard part: the nearest step that works, in the direction that helps. */
import type { Change } from './change';
import { ownMargin, type Session } from './session';
import { works, worksCleanly, type Trial } from './trial';

/** A value with neighbours. */
export interface Steps {
  /** The change by so many steps, up or down; null beyond the last one. */
  change(step: number): Change | null;
  /** How many steps are tried at most. */
  readonly most: number;
}

/** The proved change by the fewest steps that leaves no new warning, else by the fewest that works; null for none. */
export function* stepwiseTrial(session: Session, steps: Steps): Generator<void, Trial | null> {
  const present = ownMargin(session.finding, session.figures);
  for (const direction of [1, -1] as const) {
    const at = (step: number): Change | null => steps.change(direction * step);
    const found = yield* inDirection(session, at, steps.most, present);
    if (found.helped) return found.trial;
  }
  return null;
}

interface Found {
  readonly trial: Trial | null;
  /** Whether the first step went the right way. */
  readonly helped: boolean;
}

function* inDirection(
  session: Session,
  change: (step: number) => Change | null,
  most: number,
  present: number | null,
): Generator<void, Found> {
  let fallback: Trial | null = null;
  let margin = present;
  for (let step = 1; step <= most; step += 1) {
    const trial: Trial | null = yield* session.attempt([change(step)]);
    if (trial === null) return { trial: fallback, helped: step > 1 };
    if (worksCleanly(trial)) return { trial, helped: true };
    if (works(trial)) fallback ??= trial;
    const gained: number | null = ownMargin(session.finding, trial.figures);
    // Going on is pointless once a step has not helped.
    if (!isMore(gained, margin)) return { trial: fallback, helped: step > 1 || fallback !== null };
    margin = gained;
  }
  return { trial: fallback, helped: true };
}

function isMore(gained: number | null, before: number | null): boolean {
  return gained !== null && before !== null && gained > before + 1e-6;
}
