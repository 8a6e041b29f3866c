/** `missing-key`: a key that is needed is not there. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A key that is needed is not there.',
  means: 'The channel, source or stage lacks a key without which it cannot be computed.',
  matters: 'A value that is made up would be a silent answer to a question nobody asked.',
  cure: 'Add the key; completion offers those that are still missing.',
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: '    filter:',
    to: '    rate: 200 Hz\n    filter:',
  },
};

/** The finding code `missing-key`; reading the text brings it. */
export const missingKey: FindingKind = {
  code: 'missing-key',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
