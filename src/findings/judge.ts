/** The judgement of a reading: every finding of the text, of each channel's figures and of what is left out, acceptances applied. */
import type { Figures } from '../analysis/figures';
import type { Channel } from '../spec/channel';
import type { ChannelEntry, Problem, Reading } from '../spec/reading';
import { applyAcceptances } from './acceptance';
import type { Finding } from './finding';
import { acceptability, kinds } from './kinds';
import { spanOfFinding } from './span';
import type { Store } from './store';

/** One channel as judged. */
export interface ChannelJudgement {
  readonly entry: ChannelEntry;
  /** Null where the channel is not whole. */
  readonly figures: Figures | null;
  /** Whether no error stands in it that is not accepted; null where the channel is not whole. */
  readonly passes: boolean | null;
}

/** All that was found in one reading, in the order of the text. */
export interface Judgement {
  readonly reading: Reading;
  readonly findings: readonly Finding[];
  readonly channels: readonly ChannelJudgement[];
}

/** Judges a reading at once. */
export function judge(reading: Reading, store: Store): Judgement {
  const steps = judging(reading, store);
  let step = steps.next();
  while (step.done !== true) step = steps.next();
  return step.value;
}

/** Judges a reading in steps, one for each channel that has to be analysed afresh. */
export function* judging(reading: Reading, store: Store): Generator<void, Judgement> {
  const found: Finding[] = [...reading.problems.map(fromProblem), ...fileFindings(reading)];
  for (const { channel } of reading.entries) {
    if (channel === null) continue;
    const before = store.analysed;
    found.push(...channelFindings(channel, store));
    if (store.analysed !== before) yield;
  }
  const findings = inTextOrder(reading, applyAcceptances(reading, found, acceptability));
  const failing = new Set(findings.filter(counts).map((finding) => finding.channel));
  const channels = reading.entries.map((entry) => judged(entry, failing, store));
  return { reading, findings, channels };
}

/** Whether a finding fails the check. */
export function counts(finding: Finding): boolean {
  return finding.severity === 'error' && finding.accepted === null;
}

function fromProblem({ code, severity, channel, span, message }: Problem): Finding {
  return {
    code,
    severity,
    channel,
    ref: null,
    message,
    at: { span },
    related: [],
    figures: null,
    limit: null,
    accepted: null,
  };
}

function fileFindings(reading: Reading): readonly Finding[] {
  return kinds.flatMap((kind) => kind.checkFile?.(reading) ?? []);
}

function channelFindings(channel: Channel, store: Store): readonly Finding[] {
  const find = (): readonly Finding[] => {
    const subject = { channel, figures: store.figuresOf(channel) };
    return kinds.flatMap((kind) => kind.check?.(subject) ?? []);
  };
  return store.findingsOf?.(channel, find) ?? find();
}

function judged(entry: ChannelEntry, failing: ReadonlySet<string | null>, store: Store): ChannelJudgement {
  if (entry.channel === null) return { entry, figures: null, passes: null };
  return { entry, figures: store.figuresOf(entry.channel), passes: !failing.has(entry.name) };
}

function inTextOrder(reading: Reading, findings: readonly Finding[]): readonly Finding[] {
  const placed = findings.map((finding) => ({ finding, ...spanOfFinding(reading, finding) }));
  placed.sort((a, b) => a.start - b.start || a.end - b.end);
  return placed.map(({ finding }) => finding);
}
