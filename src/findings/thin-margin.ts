/** `thin-margin`: a limit holds, but only just. */
import type { LimitFigure } from '../analysis/figures';
import { formatAmount } from '../units/format';
import { figuresOf, findingIn, limitPath } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { thinBelow } from './limits';
import { decimalsFor, distanceWords, limitWords, valueWords, worstWords } from './wording';

const help: Help = {
  summary: 'A limit holds, but by less than the margin it should have.',
  means: `The limit is met at the worst case, by less than 1 dB (alias, image, signal-to-noise ratio, headroom) or by less than a tenth of
the limit (all others). A limit in long form can state its own: \`{ at: -96 dBFS, margin: 3 dB }\`.`,
  matters: `Everything that the spec leaves out (ageing, temperature, a layout that couples) eats at the same margin.`,
  cure: `Give it more room, by the same changes that cure the limit when it is broken; the quick fixes offer those that leave no other limit
thin. Or state in \`margin\` how much is enough here.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 60 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { flatness: 0.3 dB }
`,
    from: 'flatness: 0.3 dB',
    to: 'flatness: { at: 0.3 dB, margin: 0.01 dB }',
  },
};

/** The finding code `thin-margin`. */
export const thinMargin: FindingKind = {
  code: 'thin-margin',
  severity: 'warning',
  group: 'advice',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) =>
    subject.figures.limits
      .filter((figure) => figure.judged && figure.passes && (figure.margin ?? Infinity) < thinBelow(subject.channel, figure))
      .map((figure) => thin(subject, figure)),
};

function thin({ channel, figures }: Subject, figure: LimitFigure): Finding {
  const margin = figure.margin ?? 0;
  const decimals = decimalsFor(figure.limit, margin);
  const value = valueWords(figure, decimals);
  const source = figure.where?.source === undefined ? '' : `\`${figure.where.source}\` `;
  const at = figure.where === null ? '' : ` (${source}at ${frequencyWords(figures, figure.where.frequency)})`;
  const worst = worstWords(figure.worstAt);
  const enough = formatAmount(thinBelow(channel, figure), figure.unit === 's' ? 's' : 'dB', 3);
  return findingIn(channel, {
    code: 'thin-margin',
    severity: 'warning',
    message:
      `The limit \`${figure.limit}\` of ${limitWords(figure)} holds by only ${distanceWords(figure, decimals)}, at ${value}${at}` +
      `${worst === null ? '' : `, worst case ${worst}`}; less than ${enough} is thin.`,
    path: limitPath(channel, figure),
    ref: figure.ref,
    figures: figuresOf(figure),
    limit: figure.limit,
  });
}
