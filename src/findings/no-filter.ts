/** `no-filter`: a channel without an analogue path. */
import type { Channel } from '../spec/channel';
import { findingIn } from './build';
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'The channel has no filter: its analogue path is taken as flat.',
  means: `The channel has no \`filter\`, or a relay lacks one of its two, so every frequency, however high, reaches the sampler (or leaves the
hold) at full strength.`,
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
    const message = channel.direction === 'relay' ? relayWords(channel) : plainWords(channel);
    return message === null ? [] : [findingIn(channel, { code: 'no-filter', severity: 'hint', message, path: [], part: 'key' })];
  },
};

function plainWords({ name, stages }: Channel): string | null {
  if (stages.length > 0) return null;
  return `\`${name}\` has no \`filter\`, so its path is taken as flat at every frequency. State at least what limits it.`;
}

/** A relay has two filters, and each keeps out what the other cannot. */
function relayWords({ name, inputStages, outputStages }: Channel): string | null {
  if (inputStages.length > 0 && outputStages.length > 0) return null;
  if (inputStages.length > 0)
    return `\`${name}\` has no \`output-filter\`, so every copy leaves as the sampling makes it. State at least what limits its output.`;
  if (outputStages.length > 0)
    return `\`${name}\` has no \`input-filter\`, so everything that arrives is sampled as it is. State at least what limits its input.`;
  return `\`${name}\` has neither \`input-filter\` nor \`output-filter\`, so its path is taken as flat at every frequency. State at least what limits it.`;
}
