/** Accepting a finding: the comment that does it, above the finding's line. */
import { acceptability, spanOfFinding, type Finding } from '../findings';
import type { Edit, Reading } from '../spec';

/** What stands where the reason must be written. */
const reasonToWrite = 'say why';

/** Findings about the text cannot be accepted, nor can an acceptance itself. */
export function isAcceptable(finding: Finding): boolean {
  return acceptability(finding.code) === 'acceptable';
}

/** The insertion of the comment, as text and as a snippet whose reason is selected. */
export function acceptanceEdit(reading: Reading, finding: Finding): Edit & { readonly snippet: string } {
  const { start } = spanOfFinding(reading, finding);
  const lineStart = reading.text.lastIndexOf('\n', start - 1) + 1;
  const indent = /^ */.exec(reading.text.slice(lineStart, start))?.[0] ?? '';
  const lineEnd = reading.text.includes('\r\n') ? '\r\n' : '\n';
  const opening = `${indent}# bandkeep: accept ${finding.code}${boundOf(finding)}, `;
  return {
    span: { start: lineStart, end: lineStart },
    newText: `${opening}${reasonToWrite}${lineEnd}`,
    snippet: `${opening}\${1:${reasonToWrite}}${lineEnd}`,
  };
}

/** A broken limit is accepted as far as it is broken now, so that the acceptance lapses when it gets worse. */
function boundOf(finding: Finding): string {
  const margin = finding.figures?.margin ?? null;
  if (margin === null || margin >= 0 || !Number.isFinite(margin)) return '';
  const decimals = margin > -1 ? 2 : 1;
  const scale = 10 ** decimals;
  return ` down to ${(Math.floor(margin * scale) / scale).toFixed(decimals)} dB`;
}
