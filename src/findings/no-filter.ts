/** `no-filter`: a channel without an analogue path. */
import { findingIn } from './build';
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'The channel has no filter: its analogue path is taken as flat.',
  means: `The channel has no \`filter\`, so every frequency, however high, reaches the sampler (or leaves the hold) at full strength.`,
  matters: `No real path is flat to infinity. Without one in the spec every source that can land does so unweakened, and every copy
leaves as the hold makes it.`,
  cure: `State the filter; where there is none, state what really limits the path, such as the amplifier: \`filter: { bandwidth: 400 kHz }\`.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    limits: { alias: -30 dBFS }
`,
    from: 'rate: 200 Hz',
    to: 'rate: 200 Hz\n    filter: { bandwidth: 4 kHz }',
  },
};

/** The finding code `no-filter`. */
export const noFilter: FindingKind = {
  code: 'no-filter',
  severity: 'hint',
  group: 'advice',
  help,
  remedies: [],
  check: ({ channel }) => {
    if (channel.stages.length > 0) return [];
    return [
      findingIn(channel, {
        code: 'no-filter',
        severity: 'hint',
        message: `\`${channel.name}\` has no \`filter\`, so its path is taken as flat at every frequency. State at least what limits it.`,
        path: [],
        part: 'key',
      }),
    ];
  },
};
