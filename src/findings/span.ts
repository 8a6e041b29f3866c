/** Where findings stand in the text they were found in. */
import { spanOf } from '../spec';
import type { Span } from '../spec/place';
import type { Reading } from '../spec/reading';
import type { Finding } from './finding';

/** The stretch of text that a finding marks. */
export function spanOfFinding(reading: Reading, finding: Finding): Span {
  return 'span' in finding.at ? finding.at.span : spanOf(reading, finding.at.place);
}
