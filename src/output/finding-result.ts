/** A finding and its fixes in the form of the machine-readable result. */
import { spanOfFinding, type Finding } from '../findings';
import type { Range } from '../protocol/position';
import { spanOf, type Edit, type Problem, type Span } from '../spec';
import type { CheckedFile } from './checked-file';

import type { FindingResult, FixResult } from './result-file';
import { resultNumber as number } from './result-number';

/** The finding's entry in the result; `rangeOf` turns a span of the file into lines and characters. */
export function findingResult(file: CheckedFile, finding: Finding, rangeOf: (span: Span) => Range): FindingResult {
  const { reading } = file.judgement;
  const cure = file.cures.get(finding);
  const { accepted, figures } = finding;
  return {
    code: finding.code,
    severity: finding.severity,
    channel: finding.channel,
    ref: finding.ref,
    message: finding.message,
    accepted: accepted && { reason: accepted.reason, downTo: accepted.downTo, range: rangeOf(accepted.span) },
    range: rangeOf(spanOfFinding(reading, finding)),
    related: finding.related.map((related) => ({
      path: file.path,
      message: related.message,
      range: rangeOf(spanOf(reading, related.place)),
    })),
    figures: figures && {
      value: number(figures.value),
      nominal: number(figures.nominal),
      limit: number(figures.limit),
      margin: number(figures.margin),
      frequency: number(figures.frequency),
      lands: number(figures.lands),
      source: figures.source,
    },
    fixes: fixesOf(file, finding, rangeOf),
    blockedBy: cure?.blockedBy ? { ...cure.blockedBy, misses: number(cure.blockedBy.misses) } : null,
  };
}

function fixesOf(file: CheckedFile, finding: Finding, rangeOf: (span: Span) => Range): FixResult[] {
  const edits = (changes: readonly Edit[]): FixResult['edits'] =>
    changes.map((edit) => ({ path: file.path, range: rangeOf(edit.span), newText: edit.newText }));
  const proved = file.cures.get(finding)?.fixes ?? [];
  const cures = textProblem(file, finding)?.cures ?? [];
  return [
    ...proved.map((fix) => ({ title: fix.title, kind: fix.kind, margin: number(fix.margin), edits: edits(fix.edits) })),
    ...cures.map((cure) => ({ title: cure.title, kind: 'text', margin: null, edits: edits(cure.edits) })),
  ];
}

/** The fault of the text that a finding repeats, or undefined for one that follows from figures. */
export function textProblem(file: CheckedFile, finding: Finding): Problem | undefined {
  const at = finding.at;
  if (!('span' in at)) return undefined;
  return file.judgement.reading.problems.find(
    (problem) => problem.code === finding.code && problem.span.start === at.span.start && problem.span.end === at.span.end,
  );
}
