/** `response-over-mask`: the gain crosses a segment of a mask, of the analogue path or of the whole. */
import type { MaskFigure } from '../analysis/figures';
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
  summary: 'The gain crosses a segment of the mask of `response` or `through`.',
  means: `Somewhere in a segment's band the gain, measured from that at \`reference\`, is above the bound of the segment or below it. \`response\`
holds the analogue path alone to its mask, \`through\` the whole: aperture or hold too. The worst frequency of each segment is a proved
extreme over its whole band, to infinity where it has no upper end, and at the worst of the tolerances.`,
  matters: `A mask is what two parts of a system have agreed on. Where one of them leaves it, the other is not made for what it gets.`,
  cure: `Too weak inside the pass band: a higher corner, a sharper family or a higher order. Too strong in the stop band: the opposite
corner, or a higher order. Where both ask for opposite corners only another order or family helps. Under \`through\` the droop of the hold
counts as well: a higher rate or a shorter hold takes it out of the band.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 60 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits:
      response:
        - { band: 5 Hz .. 10 kHz, within: ± 0.5 dB }
        - { band: 60 kHz .., below: -60 dB }
`,
    from: 'order: 4',
    to: 'order: 6',
  },
};

/** The finding code `response-over-mask`. */
export const responseOverMask: FindingKind = {
  code: 'response-over-mask',
  severity: 'error',
  group: 'the wanted band',
  help,
  remedies: ['rate', 'pulse', 'corner', 'part', 'order', 'family'],
  check: (subject) =>
    subject.channel.masks
      .filter(({ key }) => key !== 'output')
      .flatMap((mask) =>
        subject.figures.masks
          .filter((figure) => figure.limit === mask.key && breaks(figure.margin))
          .map((figure) => crossed(subject, mask, figure)),
      ),
};

function crossed({ channel, figures }: Subject, mask: MaskLimit, figure: MaskFigure): Finding {
  const { key, ref } = mask;
  const { worstAt, nominal, bound, value, margin, frequency } = figure;
  const decimals = decimalsFor(key, margin);
  const upper = figure.side === 'upper';
  const nominalPasses = upper ? nominal <= bound : nominal >= bound;
  const what = key === 'response' ? 'The gain of the analogue path' : 'The gain from end to end';
  const stands = `${what} at ${frequencyWords(figures, frequency)} is ${formatDb(value, 'dB', decimals)} from that at ${frequencyWords(figures, figures.reference)}`;
  const by = `${formatDb(-margin, 'dB', decimals)} ${upper ? 'over' : 'short of'} the ${formatDb(bound, 'dB', 3)} of ${segmentWords(mask, figure)}`;
  return findingIn(channel, {
    code: 'response-over-mask',
    severity: 'error',
    message: `${stands}, ${by}${worstCaseWords({ worstAt, nominal, nominalPasses, decimals })}.`,
    path: segmentPath(mask, figure),
    ref,
    related: limitAndFilter(channel, { limit: key }),
    figures: { value, nominal, limit: bound, margin, frequency },
    limit: key,
  });
}

function segmentWords({ key, mask }: MaskLimit, { segment }: MaskFigure): string {
  const name = mask === null ? `\`${key}\`` : `mask \`${mask}\``;
  return `segment ${segment + 1} of ${name}`;
}

/** The segment where it is written, in place or under `masks`. */
function segmentPath({ key }: MaskLimit, { segment }: MaskFigure): Path {
  return ['limits', key, 'at', segment];
}
