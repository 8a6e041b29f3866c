/** The result of a check as text for a terminal or a log: one line a finding, its fixes below, one line a channel, and a sum. */
import type { LimitFigure } from '../analysis/figures';
import { spanOfFinding, type ChannelJudgement, type Finding } from '../findings';
import { lineIndexOf } from '../spec';
import { formatAmount } from '../units/format';
import type { CheckedFile } from './checked-file';
import { textProblem } from './finding-result';

import { plain, type Paint } from './paint';

/** How many findings of each kind a check gave; accepted ones are counted apart. */
export interface Tally {
  readonly errors: number;
  readonly warnings: number;
  readonly hints: number;
  readonly accepted: number;
}

/** The report, each line ended by a line feed. `paint` colours it; plain text by default. */
export function toText(files: readonly CheckedFile[], paint: Paint = plain): string {
  const blocks = files.map((file) => fileBlock(file, paint));
  return [...blocks, `${sumLine(files)}\n`].join('\n');
}

/** Counts what decides the exit code. */
export function tally(files: readonly CheckedFile[]): Tally {
  const findings = files.flatMap((file) => file.judgement.findings);
  const count = (severity: Finding['severity']) =>
    findings.filter((finding) => finding.severity === severity && finding.accepted === null).length;
  return {
    errors: count('error'),
    warnings: count('warning'),
    hints: count('hint'),
    accepted: findings.filter((finding) => finding.accepted !== null).length,
  };
}

function fileBlock(file: CheckedFile, paint: Paint): string {
  const findings = file.judgement.findings.flatMap((finding) => findingLines(file, finding, paint));
  const channels = file.judgement.channels.map((channel) => channelLine(channel, paint));
  return [paint('bold', file.path), ...findings, ...channels].map((line) => `${line}\n`).join('');
}

function findingLines(file: CheckedFile, finding: Finding, paint: Paint): string[] {
  const { reading } = file.judgement;
  const { line, character } = lineIndexOf(reading).positionAt(spanOfFinding(reading, finding).start);
  const word = finding.accepted ? 'accepted' : finding.severity;
  const code = paint('dim', `[${finding.code}]`);
  const head = `  ${String(line + 1)}:${String(character + 1)}  ${paint(word, word)}  ${finding.message}  ${code}`;
  return [head, ...adviceLines(file, finding).map((advice) => paint('dim', `      ${advice}`))];
}

function adviceLines(file: CheckedFile, finding: Finding): string[] {
  if (finding.accepted) return [`accepted: ${finding.accepted.reason}`];
  const cure = file.cures.get(finding);
  const titles = [...(cure?.fixes ?? []), ...(textProblem(file, finding)?.cures ?? [])].map((fix) => `fix: ${fix.title}`);
  const notes = cure?.note ? [cure.note] : [];
  return [...titles, ...notes];
}

function channelLine(judged: ChannelJudgement, paint: Paint): string {
  const name = paint('bold', judged.entry.name);
  if (judged.passes === null) return `  ${name}: ${paint('warning', 'not judged')}, its text has faults`;
  const verdict = judged.passes ? paint('pass', 'holds') : paint('error', 'fails');
  const limits = (judged.figures?.limits ?? []).map(limitText);
  return `  ${name}: ${[verdict, ...limits].join(' · ')}`;
}

function limitText(limit: LimitFigure): string {
  if (!limit.judged || limit.value === null || limit.margin === null) return `${limit.limit} not judged`;
  const room = `${formatAmount(Math.abs(limit.margin), limit.unit === 's' ? 's' : 'dB', 2)} ${limit.margin < 0 ? 'short' : 'in hand'}`;
  return `${limit.limit} ${formatAmount(limit.value, limit.unit, 2)} (${room})`;
}

function sumLine(files: readonly CheckedFile[]): string {
  const channels = files.reduce((sum, file) => sum + file.judgement.channels.length, 0);
  const { errors, warnings, hints, accepted } = tally(files);
  const parts = [counted(errors, 'error'), counted(warnings, 'warning'), counted(hints, 'hint')];
  if (accepted > 0) parts.push(`${String(accepted)} accepted`);
  return `${counted(files.length, 'file')}, ${counted(channels, 'channel')}: ${parts.join(', ')}`;
}

function counted(count: number, noun: string): string {
  return `${String(count)} ${noun}${count === 1 ? '' : 's'}`;
}
