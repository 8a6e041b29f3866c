/** `not-a-quantity`: a value cannot be read as a quantity. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A value cannot be read as a quantity.',
  means: `Here a number with a unit is expected (or a range \`LOW .. HIGH\`, or \`CENTRE ± HALF-WIDTH\`), and the text is none.`,
  matters: 'The channel cannot be judged without it.',
  cure: `Write a number, a space and a unit: \`41.2 kHz\`. The decimal sign is a point; thousands are not separated.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: fast
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: 'rate: fast',
    to: 'rate: 200 Hz',
  },
};

/** The finding code `not-a-quantity`; reading the text brings it. */
export const notAQuantity: FindingKind = {
  code: 'not-a-quantity',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
