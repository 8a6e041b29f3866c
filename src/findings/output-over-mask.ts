/** `output-over-mask`: something leaves outside the wanted band above a segment of the output mask. */
import type { Figures, MaskFigure } from '../analysis/figures';
import type { MaskLimit } from '../spec/channel';
import type { Path } from '../spec/place';
import { formatDb } from '../units/format';
import { findingIn, limitAndFilter } from './build';
import type { Finding } from './finding';
import { frequencyWords } from './frequency-words';
import type { FindingKind, Help, Subject } from './kind';
import { breaks } from './limits';
import { decimalsFor, worstCaseWords } from './wording';

const help: Help = {
  summary: 'Something leaves outside the wanted band above a segment of the mask of `output`.',
  means: `Everything that leaves is held to the mask: the copies of the wanted band at k·fs ± f for every whole k, and in a relay the
unwanted sources too, where they arrive and in all their copies. The wanted band itself is left out. What stands highest against the
bound of each segment is a proved maximum over its whole band, to infinity where it has no upper end, and at the worst of the tolerances.`,
  matters: `A mask on what leaves is what the next system, or the rule for a whole site, has been promised.`,
  cure: `A higher rate moves the copies further out, where the filter behind does more; a lower corner or a higher order weakens them. A
wider gate or hold weakens most copies before the filter acts.`,
  example: {
    spec: `bandkeep: 1
channels:
  fish-sounder:
    direction: generate
    wanted: { band: 100 Hz .. 2 kHz, level: -6 dBFS }
    rate: 16 kHz
    filter: { family: butterworth, order: 3, corner: 4 kHz }
    limits:
      output: [{ band: 10 kHz .., below: -60 dBFS }]
`,
    from: 'order: 3',
    to: 'order: 5',
  },
};

/** The finding code `output-over-mask`. */
export const outputOverMask: FindingKind = {
  code: 'output-over-mask',
  severity: 'error',
  group: 'copies',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) =>
    subject.channel.masks
      .filter(({ key }) => key === 'output')
      .flatMap((mask) =>
        subject.figures.masks
          .filter((figure) => figure.limit === 'output' && breaks(figure.margin))
          .map((figure) => crossed(subject, mask, figure)),
      ),
};

function crossed({ channel, figures }: Subject, mask: MaskLimit, figure: MaskFigure): Finding {
  const { worstAt, nominal, bound, value, margin, frequency } = figure;
  const decimals = decimalsFor('output', margin);
  const leaves = `${whatWords(figures, figure)} leaves at ${frequencyWords(figures, frequency)} at ${formatDb(value, 'dBFS', decimals)}`;
  const name = mask.mask === null ? '`output`' : `mask \`${mask.mask}\``;
  const by = `${formatDb(-margin, 'dB', decimals)} over the ${formatDb(bound, 'dBFS', 3)} of segment ${figure.segment + 1} of ${name}`;
  const source = figure.from?.source ?? null;
  return findingIn(channel, {
    code: 'output-over-mask',
    severity: 'error',
    message: `${leaves}, ${by}${worstCaseWords({ worstAt, nominal, nominalPasses: nominal <= bound, decimals })}.`,
    path: segmentPath(figure),
    ref: mask.ref,
    related: limitAndFilter(channel, { limit: 'output' }),
    figures: { value, nominal, limit: bound, margin, frequency: figure.from?.frequency ?? frequency, lands: frequency, source },
    limit: 'output',
  });
}

/** "A copy of 1.9 kHz", or "`drive hash` at 9.2 kHz". */
function whatWords(figures: Figures, { from }: MaskFigure): string {
  if (from === undefined) return 'Something';
  const place = frequencyWords(figures, from.frequency);
  return from.source === null ? `A copy of ${place}` : `\`${from.source}\` at ${place}`;
}

/** The segment where it is written, in place or under `masks`. */
function segmentPath({ segment }: MaskFigure): Path {
  return ['limits', 'output', 'at', segment];
}
