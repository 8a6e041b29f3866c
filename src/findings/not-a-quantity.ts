/** `not-a-quantity`: a value cannot be read as a quantity, or has no unit. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A value cannot be read as a quantity, or has no unit.',
  means: `Here a number with a unit is expected (or a range \`LOW .. HIGH\`, or \`CENTRE ± HALF-WIDTH\`), and the text is none,
or is a bare number.`,
  matters: 'A corner of 20 could be 20 Hz or 20 kHz; a guess would be right half of the time.',
  cure: `Write a number, a space and a unit: \`41.2 kHz\`. The decimal sign is a point; thousands are not separated.
Only zero needs no unit.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 4, corner: 20 }
    limits: { alias: -60 dBFS }
`,
    from: 'corner: 20',
    to: 'corner: 20 Hz',
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
