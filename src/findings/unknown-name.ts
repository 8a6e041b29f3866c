/** `unknown-name`: a clock, a filter or a channel is named that is not defined. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A clock, a filter or a channel is named that is not defined.',
  means: 'The value is a name, and nothing in this file has that name. The message offers the nearest that there is.',
  matters: 'Without what it stands for the channel cannot be judged.',
  cure: `Correct the spelling, or define the name under \`clocks\` or \`filters\`.`,
  example: {
    spec: `bandkeep: 1
filters:
  tide-guard: { family: butterworth, order: 4, corner: 20 Hz }
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    filter: tide guard
    limits: { alias: -60 dBFS }
`,
    from: 'filter: tide guard',
    to: 'filter: tide-guard',
  },
};

/** The finding code `unknown-name`; reading the text brings it. */
export const unknownName: FindingKind = {
  code: 'unknown-name',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
