/** `unused-name`: a clock or filter that no channel uses. */
import type { DefinedName } from '../spec/reading';
import type { Finding } from './finding';
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'A clock or a filter is defined, and no channel uses it.',
  means: `A name stands under \`clocks\` or \`filters\`, and no channel of the file names it.`,
  matters: `It is either left over, or a channel that should use it states its own value instead, and the two will drift apart.`,
  cure: `Use the name, or take it out.`,
  example: {
    spec: `bandkeep: 1
clocks:
  board: { frequency: 24.576 MHz, jitter: 3 ps }
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 90 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { flatness: 0.8 dB }
`,
    from: 'rate: 96 kHz',
    to: 'rate: { clock: board, divide: 256 }',
  },
};

/** The finding code `unused-name`. */
export const unusedName: FindingKind = {
  code: 'unused-name',
  severity: 'hint',
  group: 'advice',
  help,
  remedies: [],
  // A channel with a fault may be the one that uses the name, so the answer waits until all are whole.
  checkFile: (reading) =>
    // A file without channels is there to be used by others.
    reading.entries.length === 0 || reading.entries.some((entry) => entry.channel === null)
      ? []
      : reading.names.filter((name) => name.users.length === 0).map(unused),
};

const spaceWords: Readonly<Record<DefinedName['space'], string>> = {
  clocks: 'clock',
  filters: 'filter',
  sources: 'source',
  masks: 'mask',
};

function unused({ space, name, place }: DefinedName): Finding {
  return {
    code: 'unused-name',
    severity: 'hint',
    channel: null,
    ref: null,
    message: `The ${spaceWords[space]} \`${name}\` is used by no channel.`,
    at: { place: { ...place, part: 'key' } },
    related: [],
    figures: null,
    limit: null,
    accepted: null,
  };
}
