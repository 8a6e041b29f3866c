/** `overdriven`: the sum of all peaks exceeds full scale, though no headroom limit asks. */
import { findingIn } from './build';
import type { FindingKind, Help } from './kind';
import { peaksWords } from './headroom-short';
import { decimalsFor } from './wording';

const help: Help = {
  summary: 'All peaks together exceed full scale, so the converter clips.',
  means: `The peaks of the wanted bands and of everything unwanted, added as they reach the sampler, exceed full scale. The channel has
no headroom limit, so this is a warning; with one it is \`headroom-short\`.`,
  matters: `Levels, aliases and noise are computed as if the converter were linear. A converter that clips is not, and none of the other
figures hold while it does.`,
  cure: `Lower the wanted level or the gain in front, widen full scale, or filter the unwanted harder. Where the peaks can never meet, say
so by accepting the finding with that reason.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: pump whine, tone: 23 kHz, level: -6 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 40 kHz }
    limits: { flatness: 0.8 dB }
`,
    from: 'level: -3 dBFS',
    to: 'level: -9 dBFS',
  },
};

/** The finding code `overdriven`. */
export const overdriven: FindingKind = {
  code: 'overdriven',
  severity: 'warning',
  group: 'sampling',
  help,
  remedies: ['corner', 'part', 'order', 'family'],
  check: ({ channel, figures }) => {
    const { headroom } = figures;
    const asked = figures.limits.some((figure) => figure.limit === 'headroom');
    if (asked || headroom === null || headroom >= 0) return [];
    const peaks = peaksWords(headroom, decimalsFor('headroom', headroom));
    return [
      findingIn(channel, {
        code: 'overdriven',
        severity: 'warning',
        message: `${peaks}: it clips, and no figure of this channel holds while it does. Lower the levels, or widen \`full-scale\`.`,
        path: ['wanted', 0, 'level'],
        figures: { value: headroom, limit: 0, margin: headroom },
      }),
    ];
  },
};
