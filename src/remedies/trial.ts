/** What a changed text comes to: read whole, judged whole, and held against the judgement before the change. */
import type { Figures } from '../analysis';
import { counts, judging, type Finding, type Judgement, type Store } from '../findings';
import { read } from '../spec';
import type { Change } from './change';

/** One set of changes, tried on the whole file. */
export interface Trial {
  readonly changes: readonly Change[];
  /** The channel's figures after the changes; null where it is no longer whole. */
  readonly figures: Figures | null;
  /** Findings of the code that the changes should have cleared. */
  readonly remaining: readonly Finding[];
  /** Errors anywhere in the file that were not there before. */
  readonly newErrors: readonly Finding[];
  /** Warnings anywhere in the file that were not there before. */
  readonly newWarnings: readonly Finding[];
  /** Errors that were there before, with a margin that has become smaller. */
  readonly worsened: readonly Finding[];
  /** Whether the channel of the finding has no error left, whatever its code. */
  readonly passes: boolean;
}

/** Whether the changes clear the finding's code in its channel and add no error anywhere. */
export function works(trial: Trial): boolean {
  return trial.figures !== null && trial.remaining.length === 0 && trial.newErrors.length === 0;
}

/** Whether they do so and leave nothing behind that was not there before. */
export function worksCleanly(trial: Trial): boolean {
  return works(trial) && trial.newWarnings.length === 0 && trial.worsened.length === 0;
}

/** Reads and judges the changed text, with the same store, so that only changed channels are analysed. */
export function* trying(
  before: Judgement,
  finding: Finding,
  changed: { readonly changes: readonly Change[]; readonly text: string },
  store: Store,
): Generator<void, Trial> {
  const after = yield* judging(read(changed.text, before.reading), store);
  const known = worstOfEach(before.findings);
  const fresh = after.findings.filter((found) => found.accepted === null && !known.has(identity(found)));
  return {
    changes: changed.changes,
    figures: after.channels.find((channel) => channel.entry.name === finding.channel)?.figures ?? null,
    remaining: after.findings.filter((found) => targetOf(found) === targetOf(finding)),
    newErrors: fresh.filter((found) => found.severity === 'error'),
    newWarnings: fresh.filter((found) => found.severity === 'warning'),
    passes: after.channels.some(({ entry, passes }) => entry.name === finding.channel && passes === true),
    worsened: after.findings.filter((found) => counts(found) && isWorse(found, known.get(identity(found)))),
  };
}

/** Findings by identity; of several at one place, such as the copies that break an image limit, the one with the least margin. */
function worstOfEach(findings: readonly Finding[]): ReadonlyMap<string, Finding> {
  const known = new Map<string, Finding>();
  for (const finding of findings) {
    const name = identity(finding);
    const other = known.get(name)?.figures?.margin ?? Infinity;
    if (!known.has(name) || (finding.figures?.margin ?? Infinity) < other) known.set(name, finding);
  }
  return known;
}

/** What makes a finding of the changed text the same as one before. Spans move, so a finding that has only a span is known by its words. */
function identity(finding: Finding): string {
  const where = 'place' in finding.at ? [finding.at.place.path, finding.figures?.source] : finding.message;
  return JSON.stringify([finding.code, finding.channel, finding.limit, where]);
}

/**
 * All that a search for fixes asks of a finding, as a key: a fix clears every finding of its code in the channel (a thin margin is thin
 * for one limit), so those with the same key share one search.
 */
export function targetOf({ code, channel, limit }: Finding): string {
  return JSON.stringify([code, channel, limit]);
}

/** Differences below this are rounding, or a proof's own gap. */
const noticeableDb = 0.01;

/** The same of a time, as a share of its limit. */
const noticeableShare = 0.002;

function isWorse(found: Finding, old: Finding | undefined): boolean {
  const was = old?.figures?.margin ?? null;
  const is = found.figures?.margin ?? null;
  if (was === null || is === null) return false;
  const timed = found.limit === 'delay' || found.limit === 'delay-spread';
  return is < was - (timed ? noticeableShare * Math.abs(found.figures?.limit ?? 0) : noticeableDb);
}
