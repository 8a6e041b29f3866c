/** Where a finding stands in its file's text. */
import type { Finding } from '../findings';
import { spanOf, type Reading, type Span } from '../spec';

/** The finding's span: given outright for faults of the text, looked up by its place for all others. */
export function findingSpan(reading: Reading, finding: Finding): Span {
  return 'span' in finding.at ? finding.at.span : spanOf(reading, finding.at.place);
}
