/** Applies the comments that accept findings: what is accepted, what has lapsed, and which comment speaks for nothing. */
import { spanOf } from '../spec';
import type { Acceptance, Reading } from '../spec/reading';
import type { Span } from '../spec/place';
import { formatAmount } from '../units/format';
import type { Finding } from './finding';
import { spanOfFinding } from './span';
import { staleFinding, type Staleness } from './stale-acceptance';

/** How the list of codes answers for an acceptance's code. */
export type Acceptable = (code: string) => 'acceptable' | Exclude<Staleness, 'no-finding'>;

/** The findings with acceptances applied, and a warning for each acceptance that matches none. */
export function applyAcceptances(reading: Reading, findings: readonly Finding[], acceptable: Acceptable): readonly Finding[] {
  if (reading.acceptances.length === 0) return findings;
  const used = new Set<Acceptance>();
  const judged = findings.map((finding) => {
    const acceptance = acceptanceOf(reading, finding, acceptable);
    if (acceptance === undefined) return finding;
    used.add(acceptance);
    return accepted(finding, acceptance);
  });
  const unused = reading.acceptances.filter((acceptance) => !used.has(acceptance));
  return [...judged, ...unused.flatMap((acceptance) => stale(reading, acceptance, acceptable))];
}

function acceptanceOf(reading: Reading, finding: Finding, acceptable: Acceptable): Acceptance | undefined {
  const candidates = reading.acceptances.filter(({ code }) => code === finding.code && acceptable(code) === 'acceptable');
  if (candidates.length === 0) return undefined;
  const { start } = spanOfFinding(reading, finding);
  return candidates.find(({ line }) => start >= line.start && start <= line.end);
}

/** The finding as accepted, or, where its margin has fallen below the bound or is in no unit of it, as it was with a word on that. */
function accepted(finding: Finding, { reason, downTo, downToUnit, span }: Acceptance): Finding {
  const margin = finding.figures?.margin ?? null;
  const unit = finding.limit === 'delay' || finding.limit === 'delay-spread' ? 's' : 'dB';
  if (downTo === null || margin === null || (downToUnit === unit && margin >= downTo)) {
    return { ...finding, accepted: { reason, downTo, span } };
  }
  const bound = `It was accepted down to a margin of ${formatAmount(downTo, downToUnit ?? unit, 3)} (${reason})`;
  const words = downToUnit === unit ? 'which it no longer keeps' : `but its margin is ${unit === 's' ? 'a time' : 'in dB'}`;
  return { ...finding, message: `${finding.message} ${bound}, ${words}.` };
}

function stale(reading: Reading, acceptance: Acceptance, acceptable: Acceptable): readonly Finding[] {
  const answer = acceptable(acceptance.code);
  if (answer !== 'acceptable') return [staleFinding(acceptance, answer)];
  return mayYetMatch(reading, acceptance.line) ? [] : [staleFinding(acceptance, 'no-finding')];
}

/** Whether a channel that could not be judged may hold the finding: it is on the line, or the line belongs to no channel alone. */
function mayYetMatch(reading: Reading, line: Span): boolean {
  const broken = reading.entries.filter((entry) => entry.channel === null);
  if (broken.length === 0) return false;
  const holder = reading.entries.find(({ name }) => {
    const span = spanOf(reading, { channel: name, path: [], part: 'pair' });
    return line.start < span.end && line.end > span.start;
  });
  return holder === undefined || holder.channel === null;
}
