/** `delay-spread-over-limit`: the wanted band is not delayed alike by as much as the limit asks. */
import type { LimitFigure } from '../analysis/figures';
import { figuresOf, findingIn, limitAndFilter, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { brokenLimit, nominalPasses } from './limits';
import { decimalsFor, distanceWords, limitWords, valueWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'The group delay differs over the wanted band by more than the delay-spread limit allows.',
  means: `The largest group delay in the wanted band minus the smallest one, each a proved extreme, at the worst of the tolerances, is more
than \`limits.delay-spread\`. A pulse that delays every frequency alike has no part in it.`,
  matters: `A signal whose parts are not delayed alike changes its shape: steps overshoot, pulses smear into the next. No correction of
the gain undoes that.`,
  cure: `A filter's delay peaks near its corner: a higher corner moves the peak out of the band. A \`bessel\` or \`gaussian\` filter of the
same order delays far more evenly, at the price of a softer knee; a lower order has a lower peak.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 60 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { delay-spread: 3 µs }
`,
    from: 'family: butterworth',
    to: 'family: bessel',
  },
};

/** The finding code `delay-spread-over-limit`. */
export const delaySpreadOverLimit: FindingKind = {
  code: 'delay-spread-over-limit',
  severity: 'error',
  group: 'the wanted band',
  help,
  remedies: ['rate', 'corner', 'part', 'order', 'family'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'delay-spread');
    return limit === null ? [] : [over(subject, limit)];
  },
};

function over({ channel, figures }: Subject, limit: LimitFigure): Finding {
  const decimals = decimalsFor('delay-spread', limit.margin ?? 0);
  const worst = { ...limit, nominalPasses: nominalPasses(limit, limit.nominal), decimals };
  const where = limit.where === null ? '' : ` and is longest at ${frequencyWords(figures, limit.where.frequency)}`;
  const by = `${distanceWords(limit, decimals)} over the delay-spread limit of ${limitWords(limit)}`;
  return findingIn(channel, {
    code: 'delay-spread-over-limit',
    severity: 'error',
    message: `The delay differs by ${valueWords(limit, decimals)} over the wanted band${where}, ${by}${worstCaseWords(worst)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: limitAndFilter(channel, limit).slice(1),
    figures: figuresOf(limit),
    limit: 'delay-spread',
  });
}
