/** `rate-unavailable`: the rate is not among the `rate-choices`. */
import { formatFrequency } from '../units/format';
import { findingIn } from './build';
import type { FindingKind, Help } from './kind';
import { isAvailable, neighbours } from './rate-choices';

const help: Help = {
  summary: 'The rate is not among the rates that `rate-choices` allows.',
  means: `The channel says in \`rate-choices\` which rates the hardware can give, and its own \`rate\` is not one of them.`,
  matters: `The design would be judged at a rate that it will never run at.`,
  cure: `Take one of the rates that there are; the quick fixes offer the nearest that meet every limit. Or add the rate to the choices, if
the clock tree can give it after all.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 10 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 90 Hz
    rate-choices: [ 50 Hz, 100 Hz, 200 Hz ]
    filter: { family: butterworth, order: 4, corner: 20 Hz }
    limits: { alias: -60 dBFS }
`,
    from: 'rate: 90 Hz',
    to: 'rate: 200 Hz',
  },
};

/** The finding code `rate-unavailable`. */
export const rateUnavailable: FindingKind = {
  code: 'rate-unavailable',
  severity: 'error',
  group: 'sampling',
  help,
  remedies: ['rate'],
  check: ({ channel }) => {
    if (isAvailable(channel.rateChoices, channel.rate.hz)) return [];
    const { below, above } = neighbours(channel);
    const near = [below, above].filter((hz) => hz !== null).map((hz) => formatFrequency(hz));
    const nearest = near.length === 0 ? '' : `; the nearest ${near.length === 1 ? 'is' : 'are'} ${near.join(' and ')}`;
    return [
      findingIn(channel, {
        code: 'rate-unavailable',
        severity: 'error',
        message: `The rate of ${formatFrequency(channel.rate.hz)} is not among the \`rate-choices\`${nearest}.`,
        path: ['rate'],
        related: [{ path: ['rate-choices'], message: 'the rates there are' }],
        figures: { value: channel.rate.hz },
      }),
    ];
  },
};
