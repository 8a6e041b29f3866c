/** `unknown-key`: a key is not part of the language, or not at this place. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A key is not part of the language, or not at this place.',
  means:
    'The key is not one that may stand here. The message names the nearest key that may, or says that the key is not supported yet.',
  matters: `Nothing is ever ignored in silence: a misspelt \`unwanted\` would otherwise make a channel pass that has never been judged.`,
  cure: 'Take the offered spelling, or take the key out.',
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwnated: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: 'unwnated:',
    to: 'unwanted:',
  },
};

/** The finding code `unknown-key`; reading the text brings it. */
export const unknownKey: FindingKind = {
  code: 'unknown-key',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
