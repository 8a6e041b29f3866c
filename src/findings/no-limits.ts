/** `no-limits`: a channel that asks for nothing. */
import { findingIn } from './build';
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'The channel has no limits, so nothing is judged.',
  means: `The channel is computed, and its hovers and pictures show every figure, but no \`limits\` say what is good enough.`,
  matters: `A check that asks for nothing passes whatever the design does.`,
  cure: `State what the channel must keep: \`alias\` and \`flatness\` for a capture channel, \`image\` and \`flatness\` for one that
generates, \`snr\` and \`headroom\` for either.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 200 Hz
    filter: { family: butterworth, order: 4, corner: 20 Hz }
`,
    from: 'rate: 200 Hz',
    to: 'rate: 200 Hz\n    limits: { alias: -60 dBFS }',
  },
};

/** The finding code `no-limits`. */
export const noLimits: FindingKind = {
  code: 'no-limits',
  severity: 'hint',
  group: 'advice',
  help,
  remedies: [],
  check: ({ channel }) => {
    if (channel.limits.length > 0 || channel.levelLimit !== null || channel.masks.length > 0) return [];
    const usual = usualLimits[channel.direction];
    return [
      findingIn(channel, {
        code: 'no-limits',
        severity: 'hint',
        message: `\`${channel.name}\` has no \`limits\`, so nothing in it is judged. Most channels ask for ${usual}.`,
        path: [],
        part: 'key',
      }),
    ];
  },
};

const usualLimits = {
  capture: '`alias` and `flatness`',
  generate: '`image` and `flatness`',
  relay: '`alias`, `image` and `flatness`',
} as const;
