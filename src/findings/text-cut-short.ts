/** `text-cut-short`: YAML takes the rest of the line for a comment. */
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'YAML takes the rest of the line for a comment.',
  means: `A text is followed by a space and \`#\` with no space behind it. For YAML a comment begins there, and the text ends before it.`,
  matters: `A channel titled \`Gate #3\` would silently be called \`Gate\` in every report.`,
  cure: `Put the text in quotes: \`'Gate #3'\`. If a comment is meant, put a space behind the \`#\`.`,
  example: {
    spec: `bandkeep: 1
title: Sluice gate #3
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: 'title: Sluice gate #3',
    to: "title: 'Sluice gate #3'",
  },
};

/** The finding code `text-cut-short`; reading the text brings it. */
export const textCutShort: FindingKind = {
  code: 'text-cut-short',
  severity: 'warning',
  group: 'the text',
  help,
  remedies: [],
};
