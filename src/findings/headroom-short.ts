/** `headroom-short`: the sum of all peaks leaves less room below full scale than the limit asks. */
import type { LimitFigure } from '../analysis/figures';
import { formatDb } from '../units/format';
import { figuresOf, findingIn, limitAndFilter, limitPath } from './build';
import type { Finding } from './finding';
import type { FindingKind, Help, Subject } from './kind';
import { brokenLimit, nominalPasses } from './limits';
import { decimalsFor, limitWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'All peaks together leave less room below full scale than the headroom limit asks.',
  means: `The peaks of the wanted bands and of everything unwanted are added as they reach the sampler (in generate: as the words to be
converted), each at its worst frequency. The distance of that sum to full scale is smaller than \`limits.headroom\`.
\`unwanted: anything\` is left out.`,
  matters: `When all peaks meet, the converter clips. Clipping spreads products over the whole band, and they are not there in any
measurement of one tone at a time.`,
  cure: `Lower the levels or the gain in front, or take more of the unwanted away before the sampler with a lower corner or a higher order.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: pump whine, tone: 23 kHz, level: -6 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 40 kHz }
    limits: { headroom: 1 dB }
`,
    from: 'corner: 40 kHz',
    to: 'corner: 14 kHz',
  },
};

/** The finding code `headroom-short`. */
export const headroomShort: FindingKind = {
  code: 'headroom-short',
  severity: 'error',
  group: 'sampling',
  help,
  remedies: ['corner', 'part', 'order', 'family'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'headroom');
    return limit === null ? [] : [short(subject, limit)];
  },
};

/** "All peaks together leave 0.4 dB below full scale" or, where they do not fit, by how much they exceed it. */
export function peaksWords(headroomDb: number, decimals: number): string {
  return headroomDb < 0
    ? `All peaks together exceed full scale by ${formatDb(-headroomDb, 'dB', decimals)}`
    : `All peaks together leave ${formatDb(headroomDb, 'dB', decimals)} below full scale`;
}

function short({ channel }: Subject, limit: LimitFigure): Finding {
  const margin = limit.margin ?? 0;
  const decimals = decimalsFor('headroom', margin);
  const worst = { worstAt: limit.worstAt, nominal: limit.nominal, nominalPasses: nominalPasses(limit, limit.nominal), decimals };
  const by = `${formatDb(-margin, 'dB', decimals)} short of the headroom limit of ${limitWords(limit)}`;
  return findingIn(channel, {
    code: 'headroom-short',
    severity: 'error',
    message: `${peaksWords(limit.value ?? 0, decimals)}, ${by}${worstCaseWords(worst)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: limitAndFilter(channel, limit).slice(1),
    figures: figuresOf(limit),
    limit: 'headroom',
  });
}
