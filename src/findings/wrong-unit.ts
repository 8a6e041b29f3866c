/** `wrong-unit`: a quantity has a unit that does not fit, or none. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A quantity has a unit that does not fit, or none.',
  means:
    'Every physical value carries a unit, and each key says which kinds of unit it takes. This one has another, or a bare number.',
  matters: 'A corner of 20 could be 20 Hz or 20 kHz; a guess would be right half of the time.',
  cure: `Write the unit. Zero needs none. Levels in volts need \`full-scale\`, levels in dBm \`impedance\` as well.`,
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

/** The finding code `wrong-unit`; reading the text brings it. */
export const wrongUnit: FindingKind = {
  code: 'wrong-unit',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
