/** `wrong-unit`: a quantity has a unit that does not fit its key. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A quantity has a unit that does not fit its key.',
  means: 'Every physical value carries a unit, and each key says which kinds of unit it takes. This one has another.',
  matters: 'A corner of 20 s is no frequency; to read it as 0.05 Hz, or as 20 Hz, would be a guess.',
  cure: `Write a unit of the kind that the message names. Levels in volts need \`full-scale\`, levels in dBm \`impedance\` as well.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 4, corner: 20 s }
    limits: { alias: -60 dBFS }
`,
    from: 'corner: 20 s',
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
