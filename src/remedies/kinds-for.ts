/** Which kinds of change are worth trying for one finding: those of its code, less those that cannot move its limit. */
import { remediesOf, type Code, type Finding, type RemedyKind } from '../findings';
import type { JudgedKey } from '../analysis';
import type { Channel } from '../spec';

/** The kinds to try, cheapest first. */
export function kindsFor(finding: Finding, channel: Channel): readonly RemedyKind[] {
  const broken = finding.code === 'thin-margin' && isLimit(finding.limit) ? brokenCodes[finding.limit] : undefined;
  const code = broken ?? finding.code;
  // In generate the words are what they are before the hold and the filter come into play.
  const fixed = channel.direction === 'generate' && (code === 'headroom-short' || code === 'overdriven');
  return fixed ? [] : remediesOf(code);
}

/** What breaks a limit cures a thin margin of it too. */
const brokenCodes: Readonly<Partial<Record<JudgedKey, Code>>> = {
  alias: 'alias-over-limit',
  image: 'image-over-limit',
  output: 'output-over-mask',
  crosstalk: 'crosstalk-over-limit',
  flatness: 'flatness-over-limit',
  response: 'response-over-mask',
  through: 'response-over-mask',
  delay: 'delay-over-limit',
  'delay-spread': 'delay-spread-over-limit',
  level: 'level-over-limit',
  snr: 'snr-short',
  headroom: 'headroom-short',
};

function isLimit(limit: string | null): limit is JudgedKey {
  return limit !== null && limit in brokenCodes;
}
