/** `syntax`: the text is not what YAML, or this language, can read. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'The text is not what YAML, or this language, can read.',
  means: `The text breaks a rule of YAML, or uses a part of YAML that this language leaves out (anchors, aliases, merge keys, tags, further
documents). Slips that YAML would silently read as something else are found too: no space behind a colon, a tab in the
indentation, a decimal comma. A fault ends where its channel or its top-level key ends; the other channels are judged as usual.`,
  matters: 'The channel it stands in cannot be judged until it is cured.',
  cure: 'The message says what to write instead, and a quick fix writes it where there is only one way.',
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level:-40 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: 'level:-40 dBFS',
    to: 'level: -40 dBFS',
  },
};

/** The finding code `syntax`; reading the text brings it. */
export const syntax: FindingKind = {
  code: 'syntax',
  severity: 'error',
  group: 'the text',
  help,
  remedies: [],
};
