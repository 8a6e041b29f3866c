/** `level-over-limit`: the wanted output leaves the range that it must stay in. */
import type { LimitFigure } from '../analysis/figures';
import { figuresOf, findingIn, limitAndFilter, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { brokenLimit, isUpperBound, nominalPasses } from './limits';
import { decimalsFor, distanceWords, limitWords, valueWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'The level of the wanted output leaves the range that the level limit allows.',
  means: `Over its whole band, and at the worst of the tolerances, the wanted signal as it comes out is somewhere stronger than the upper end
of \`limits.level\` or weaker than its lower end. Filter, aperture and hold all count, a hold's own loss too.`,
  matters: `What follows is made for a range of levels: above it something clips, below it noise takes over.`,
  cure: `Change the \`gain\` of a stage, or the level itself. Where only the edge of the band is too weak, it is droop: a higher corner or
order keeps the filter out of the band, a higher rate or a shorter hold makes the hold droop less.`,
  example: {
    spec: `bandkeep: 1
channels:
  fog-horn:
    direction: generate
    wanted: { band: 20 Hz .. 20 kHz, level: -1 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 60 kHz }
    limits: { level: -1.5 dBFS .. 0 dBFS }
`,
    from: 'rate: 96 kHz',
    to: 'rate: 192 kHz',
  },
};

/** The finding code `level-over-limit`. */
export const levelOverLimit: FindingKind = {
  code: 'level-over-limit',
  severity: 'error',
  group: 'the wanted band',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'level');
    return limit === null ? [] : [outside(subject, limit)];
  },
};

function outside({ channel, figures }: Subject, limit: LimitFigure): Finding {
  const decimals = decimalsFor('level', limit.margin ?? 0);
  const worst = { ...limit, nominalPasses: nominalPasses(limit, limit.nominal), decimals };
  const where = limit.where === null ? '' : ` at ${frequencyWords(figures, limit.where.frequency)}`;
  const upper = isUpperBound(limit);
  const reaches = `The wanted output ${upper ? 'rises' : 'falls'} to ${valueWords(limit, decimals)}${where}`;
  const by = `${distanceWords(limit, decimals)} ${upper ? 'over the upper' : 'short of the lower'} end of the level limit, ${limitWords(limit)}`;
  return findingIn(channel, {
    code: 'level-over-limit',
    severity: 'error',
    message: `${reaches}, ${by}${worstCaseWords(worst)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: limitAndFilter(channel, limit).slice(1),
    figures: figuresOf(limit),
    limit: 'level',
  });
}
