/** Between the spans of a reading and the lines and UTF-16 characters that editors speak. */
import type { Position, Range } from 'vscode-languageserver-types';
import { spanOfFinding, type Finding } from '../findings';
import { lineIndexOf, type Reading, type Span } from '../spec';

/** A span of the reading's text as lines and characters. */
export function rangeOf(reading: Reading, span: Span): Range {
  const lines = lineIndexOf(reading);
  return { start: lines.positionAt(span.start), end: lines.positionAt(span.end) };
}

/** The offset of a position; one that lies behind the end of its line or of the text counts as that end. */
export function offsetOf(reading: Reading, position: Position): number {
  return lineIndexOf(reading).offsetAt(position);
}

/** The findings that touch a stretch of the text, in their own order. */
export function findingsIn(reading: Reading, findings: readonly Finding[], span: Span): Finding[] {
  return findings.filter((finding) => {
    const at = spanOfFinding(reading, finding);
    return at.start <= span.end && at.end >= span.start;
  });
}
