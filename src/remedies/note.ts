/** What a search says beside its fixes: why no corner alone does it, what comes nearest, or that no rate there is can help. */
import { decimalsFor, type Code, type Finding } from '../findings';
import type { Channel } from '../spec';
import { formatDb, formatTime } from '../units/format';
import type { Blocked } from './fix';
import type { KnobConflict } from './knob';
import { rateOptions } from './rate-options';

/** What a search has come to. */
export interface Outcome {
  readonly cornerConflict: KnobConflict | null;
  readonly blockedBy: Blocked | null;
  readonly isCured: boolean;
}

/** The sentences, or null where there is nothing to say. */
export function noteOf(channel: Channel, finding: Finding, { cornerConflict, blockedBy, isCured }: Outcome): string | null {
  const words = [
    ...(cornerConflict === null ? [] : [conflictWords(cornerConflict)]),
    ...(!isCured && aboutRates.has(finding.code) && !hasRates(channel) ? [noRateWords(channel)] : []),
    ...(blockedBy === null ? [] : [blockedWords(blockedBy, channel)]),
  ];
  return words.length === 0 ? null : words.join(' ');
}

/** Findings that only another rate can cure. */
const aboutRates: ReadonlySet<Code> = new Set<Code>(['wanted-folds', 'wanted-touches', 'rate-unavailable']);

function hasRates(channel: Channel): boolean {
  return rateOptions(channel).some(({ above, below }) => above.length + below.length > 0);
}

function noRateWords({ rateChoices, rate, wanted }: Channel): string {
  const what = wanted.length === 1 ? 'the wanted band whole' : 'all wanted bands whole and apart';
  if (rateChoices !== null) return `None of the \`rate-choices\` keeps ${what}.`;
  return rate.clock === null ? `No rate keeps ${what}.` : `No divisor of \`${rate.clock.name}\` keeps ${what}.`;
}

function conflictWords({ own, other }: KnobConflict): string {
  return `No corner alone does it: the ${own.limit} limit asks for ${own.words}, the ${other.limit} limit for ${other.words}.`;
}

function blockedWords({ limit, misses, candidate }: Blocked, { limits }: Channel): string {
  const isTime = limits.some(({ key, unit }) => key === limit && unit === 's');
  const by = isTime ? formatTime(misses) : formatDb(misses, 'dB', decimalsFor(limit, misses));
  return `Nothing simple works. What comes nearest (${candidate}) misses the ${limit} limit by ${by}.`;
}
