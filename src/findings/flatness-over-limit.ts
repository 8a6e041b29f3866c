/** `flatness-over-limit`: the end-to-end gain departs further from its value at `reference` than the limit allows. */
import type { LimitFigure } from '../analysis/figures';
import { formatDb } from '../units/format';
import { figuresOf, findingIn, limitAndFilter, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { brokenLimit, nominalPasses } from './limits';
import { decimalsFor, limitWords, worstCaseWords } from './wording';

const help: Help = {
  summary: 'The gain in the wanted band is not as flat as the flatness limit asks.',
  means: `From end to end (filter, and aperture or hold) the gain at some frequency of the wanted band differs from the gain at
\`reference\` by more than \`limits.flatness\`, either way. The largest departure is a proved maximum over the whole band and all
tolerances.`,
  matters: `A wanted tone is shown weaker or stronger than it is. A reading at the edge of the band is then wrong by this much, and no
calibration at one frequency shows it.`,
  cure: `A filter droops ahead of its corner: a higher corner moves the droop out of the band, a higher order makes the knee sharper. A hold
droops too (3.92 dB at half the rate for a zero-order hold): a higher rate makes the band a smaller part of it. A chebyshev filter
departs by its own ripple, whatever the corner.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 60 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 12 kHz }
    limits: { flatness: 0.8 dB }
`,
    from: 'corner: 12 kHz',
    to: 'corner: 14 kHz',
  },
};

/** The finding code `flatness-over-limit`. */
export const flatnessOverLimit: FindingKind = {
  code: 'flatness-over-limit',
  severity: 'error',
  group: 'the wanted band',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) => {
    const limit = brokenLimit(subject.figures, 'flatness');
    return limit === null ? [] : [over(subject, limit)];
  },
};

function over({ channel, figures }: Subject, limit: LimitFigure): Finding {
  const margin = limit.margin ?? 0;
  const decimals = decimalsFor('flatness', margin);
  const worst = { worstAt: limit.worstAt, nominal: limit.nominal, nominalPasses: nominalPasses(limit, limit.nominal), decimals };
  const where = limit.where === null ? 'in the wanted band' : `at ${frequencyWords(figures, limit.where.frequency)}`;
  const from = `that at ${frequencyWords(figures, figures.reference)}`;
  const by = `departs by ${formatDb(limit.value ?? 0, 'dB', decimals)} from ${from}, ${formatDb(-margin, 'dB', decimals)} over`;
  const departs = limit.value === Infinity ? `is nothing at all, which departs from ${from} by more than` : by;
  return findingIn(channel, {
    code: 'flatness-over-limit',
    severity: 'error',
    message: `The gain ${where} ${departs} the flatness limit of ${limitWords(limit)}${worstCaseWords(worst)}.`,
    path: limitPath(channel, limit),
    ref: limit.ref,
    related: limitAndFilter(channel, limit).slice(1),
    figures: figuresOf(limit),
    limit: 'flatness',
  });
}
