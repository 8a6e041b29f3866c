/** `delay-over-limit`: what passes the channel comes out later than the limit allows. */
import type { LimitFigure } from '../analysis/figures';
import { figuresOf, findingIn, limitAndFilter, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { brokenLimit, nominalPasses } from './limits';
import { decimalsFor, distanceWords, limitWords, valueWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'The group delay at `reference` is longer than the delay limit allows.',
  means: `Every stage delays what passes it, and so does an aperture or a hold, by half its length for all shapes but an exponential. Their
sum at \`reference\`, at the worst of the tolerances, is longer than \`limits.delay\`.`,
  matters: `In a control loop a delay turns the phase: at a tenth of its inverse it already costs 36 degrees. Two channels that are compared
must be late by the same amount.`,
  cure: `A low-pass delays the less the higher its corner is and the lower its order. A shorter aperture or hold delays less, and both
follow the rate where their length is a share of its period.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 60 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { delay: 25 µs }
`,
    from: 'corner: 14 kHz',
    to: 'corner: 20 kHz',
  },
};

/** The finding code `delay-over-limit`. */
export const delayOverLimit: FindingKind = {
  code: 'delay-over-limit',
  severity: 'error',
  group: 'the wanted band',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'delay');
    return limit === null ? [] : [over(subject, limit)];
  },
};

function over({ channel, figures }: Subject, limit: LimitFigure): Finding {
  const decimals = decimalsFor('delay', limit.margin ?? 0);
  const worst = { ...limit, nominalPasses: nominalPasses(limit, limit.nominal), decimals };
  const late = `What enters at ${frequencyWords(figures, figures.reference)} comes out ${valueWords(limit, decimals)} later`;
  const by = `${distanceWords(limit, decimals)} over the delay limit of ${limitWords(limit)}`;
  return findingIn(channel, {
    code: 'delay-over-limit',
    severity: 'error',
    message: `${late}, ${by}${worstCaseWords(worst)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: limitAndFilter(channel, limit).slice(1),
    figures: figuresOf(limit),
    limit: 'delay',
  });
}
