/** `out-of-range`: a value is outside the range that makes sense. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A value is outside the range that makes sense.',
  means: `The quantity is well written, but no channel can have it: a frequency below zero, an order of a million, a band that ends before it
begins.`,
  matters: 'Computing on would give figures that mean nothing.',
  cure: `The message names the range. Look for a wrong prefix (m for M) or two values in each other's place.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 400, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: 'order: 400',
    to: 'order: 4',
  },
};

/** The finding code `out-of-range`; reading the text brings it. */
export const outOfRange: FindingKind = {
  code: 'out-of-range',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
