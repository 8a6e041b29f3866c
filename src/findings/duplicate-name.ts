/** `duplicate-name`: a key or a name stands twice. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A key or a name stands twice.',
  means: 'The same key stands twice in one map, or two channels, clocks or filters have the same name.',
  matters: 'Only one of the two can count, and a reader cannot know which.',
  cure: 'Take one of them out, or rename it.',
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    rate: 100 Hz
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: '    rate: 100 Hz\n',
    to: '',
  },
};

/** The finding code `duplicate-name`; reading the text brings it. */
export const duplicateName: FindingKind = {
  code: 'duplicate-name',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
