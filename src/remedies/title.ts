/** Titles of fixes: what changes, the margin it leaves, and what else it moves. */
import type { Figures, LimitFigure } from '../analysis';
import { decimalsFor, thinBelow, type Finding } from '../findings';
import type { Channel } from '../spec';
import { formatAmount } from '../units/format';
import { changesWords } from './change';
import type { Fix } from './fix';
import { ownMargin, type Session } from './session';
import type { Trial } from './trial';

/** The fix that a trial has proved. */
export function fixOf(session: Session, trial: Trial): Fix {
  const { finding } = session;
  const margin = finding.limit === null ? null : ownMargin(finding, trial.figures);
  const leaves = leavesWords(session, trial);
  const effect = effectWords(session, trial.figures);
  const title = `${changesWords(trial.changes)}${effect === '' ? '' : `: ${effect}`}${leaves === null ? '' : `; ${leaves}`}`;
  const [first] = trial.changes;
  const kind = trial.changes.length > 1 || first === undefined ? 'two' : first.kind;
  return { title, kind, margin, edits: trial.changes.flatMap((change) => change.edits), leaves };
}

/** "alias margin 4.2 dB, flatness 0.22 dB": the margin that was asked for, then the limits that the change has moved. */
function effectWords({ finding, figures, channel }: Session, after: Figures | null): string {
  const limits = (after?.limits ?? []).filter((figure) => figure.judged && figure.margin !== null);
  const own =
    limits.find((figure) => figure.limit === finding.limit) ?? (finding.limit === null ? tightest(limits, channel) : undefined);
  const moved = limits.filter((figure) => figure !== own && isMoved(figure, figures, channel));
  return [...(own === undefined ? [] : [marginWords(own)]), ...moved.map(valueWords)].join(', ');
}

/** The limit with the least left of the margin it should have. */
function tightest(limits: readonly LimitFigure[], channel: Channel): LimitFigure | undefined {
  const share = (figure: LimitFigure): number => (figure.margin ?? 0) / Math.max(thinBelow(channel, figure), 1e-9);
  return [...limits].sort((a, b) => share(a) - share(b))[0];
}

/** Flatness is worth a word when it moves either way, any other limit when it has lost and has little left to lose. */
function isMoved(figure: LimitFigure, before: Figures, channel: Channel): boolean {
  const was = before.limits.find(({ limit }) => limit === figure.limit)?.margin ?? null;
  if (was === null || figure.margin === null) return false;
  if (figure.limit === 'flatness') return Math.abs(figure.margin - was) >= 0.005;
  const noticeable = figure.unit === 's' ? 0.05 * figure.at : 0.05;
  return figure.margin <= was - noticeable && figure.margin < 3 * thinBelow(channel, figure);
}

function marginWords({ limit, margin, unit }: LimitFigure): string {
  return `${limit} margin ${formatAmount(margin ?? 0, unit === 's' ? 's' : 'dB', decimalsFor(limit, margin ?? 0))}`;
}

function valueWords({ limit, value, unit, margin }: LimitFigure): string {
  return `${limit} ${formatAmount(value ?? 0, unit, decimalsFor(limit, margin ?? 0))}`;
}

/** What a change leaves behind that was not there before, or null. */
function leavesWords({ finding }: Session, { newWarnings, worsened }: Trial): string | null {
  const warnings = newWarnings.map((warning) => warningWords(warning, finding.channel));
  const worse = worsened.map(
    (error) => `${error.limit ?? error.code} even further from its limit${elsewhere(error, finding.channel)}`,
  );
  const parts = [
    ...(warnings.length === 0 ? [] : [`leaves a new warning (${[...new Set(warnings)].join(', ')})`]),
    ...(worse.length === 0 ? [] : [`leaves ${[...new Set(worse)].join(', ')}`]),
  ];
  return parts.length === 0 ? null : parts.join('; ');
}

function warningWords(warning: Finding, channel: string | null): string {
  const words = warning.code === 'thin-margin' ? `thin ${warning.limit ?? ''} margin` : `\`${warning.code}\``;
  return `${words}${elsewhere(warning, channel)}`;
}

/** Names the channel where it is not the one that the finding is in. */
function elsewhere(finding: Finding, channel: string | null): string {
  return finding.channel === null || finding.channel === channel ? '' : ` in \`${finding.channel}\``;
}
