/** `contradiction`: two statements cannot both hold. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'Two statements cannot both hold.',
  means: `Each key is fine by itself, but together they exclude each other: both a \`tone\` and a \`band\` in one source, or a \`hold\` in a
channel that captures.`,
  matters: 'Only one can be meant, and the figures depend on which.',
  cure: 'Keep the one that is meant; the message names both.',
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    hold: zero-order
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: '    hold: zero-order\n',
    to: '',
  },
};

/** The finding code `contradiction`; reading the text brings it. */
export const contradiction: FindingKind = {
  code: 'contradiction',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
