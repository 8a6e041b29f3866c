/** Which findings still ask for a search for fixes. */
import type { Range } from 'vscode-languageserver-types';
import { remediesOf, type Finding } from '../findings';
import type { SpecDocument } from './spec-document';
import { findingsIn, offsetOf } from './text-range';

/** The findings whose fixes have not been searched for, in file order. */
export function unproved(document: SpecDocument): Finding[] {
  return document.judgement.findings.filter((finding) => isCurable(finding) && !document.hasCure(finding));
}

/** Those that touch a range. */
export function unprovedIn(document: SpecDocument, range: Range): Finding[] {
  const { reading, judgement } = document;
  const span = { start: offsetOf(reading, range.start), end: offsetOf(reading, range.end) };
  return findingsIn(reading, judgement.findings, span).filter(
    (finding) => isCurable(finding) && document.cureOf(finding) === null,
  );
}

/** Faults of the text carry their own cures, and an accepted finding asks for none. */
function isCurable(finding: Finding): boolean {
  return finding.accepted === null && 'place' in finding.at && remediesOf(finding.code).length > 0;
}
