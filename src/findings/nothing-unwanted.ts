/** `nothing-unwanted`: a capture or relay channel that says nothing of what must be kept out. */
import { findingIn } from './build';
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'The channel says nothing of what must be kept out.',
  means: `A capture or relay channel has no \`unwanted\`, so nothing can land in its protected range and no alias can be judged.`,
  matters: `Every input has something beyond its band: a switcher, a drive, a radio, the noise of what comes before it.`,
  cure: `Name each source with its frequencies and its level. Where nothing is known, \`unwanted: anything\` takes a full-scale tone
anywhere outside the wanted band, and \`unwanted: { anything: -40 dBFS }\` a weaker one.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { flatness: 3 dB }
`,
    from: 'rate: 200 Hz',
    to: 'unwanted: anything\n    rate: 200 Hz',
  },
};

/** The finding code `nothing-unwanted`. */
export const nothingUnwanted: FindingKind = {
  code: 'nothing-unwanted',
  severity: 'hint',
  group: 'advice',
  help,
  remedies: [],
  check: ({ channel }) => {
    if (channel.direction === 'generate' || channel.unwanted.length > 0) return [];
    return [
      findingIn(channel, {
        code: 'nothing-unwanted',
        severity: 'hint',
        message: `\`${channel.name}\` names nothing \`unwanted\`, so no alias can be judged. Name what arrives, or write \`unwanted: anything\`.`,
        path: [],
        part: 'key',
      }),
    ];
  },
};
