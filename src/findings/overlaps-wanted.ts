/** `overlaps-wanted`: part of an unwanted source lies inside a wanted band. */
import { findingIn } from './build';
import { sourcePath, sourceWords } from './alias-over-limit';
import { bandWords } from './frequency-words';
import type { FindingKind, Help } from './kind';

const help: Help = {
  summary: 'Part of an unwanted source lies inside a wanted band.',
  means: `A source of \`unwanted\`, a harmonic of it or a row of its table stands, or may stand, at frequencies that the channel wants. That part does not get there by
sampling, so it is no alias and counts in no alias limit. Touching an edge is not overlapping.`,
  matters: `No filter and no rate can take it out: it is in the band before anything is done to it. A channel that "passes" says nothing
about it.`,
  cure: `Check the two ranges; often one is written too wide. If the source really is there, it must be cured where it arises, or the band
must end before it. Then accept the finding with that reason.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 9 kHz .. 3 MHz, level: -85 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { alias: -96 dBFS }
`,
    from: 'band: 9 kHz .. 3 MHz',
    to: 'band: 10 kHz .. 3 MHz',
  },
};

/** The finding code `overlaps-wanted`. */
export const overlapsWanted: FindingKind = {
  code: 'overlaps-wanted',
  severity: 'warning',
  group: 'advice',
  help,
  remedies: [],
  check: ({ channel, figures }) =>
    figures.overlaps.map(({ index, harmonic, lowHz, highHz }) => {
      const source = channel.unwanted[index];
      const name = source?.name ?? 'a source';
      const where =
        lowHz === highHz ? `at ${bandWords(lowHz, highHz).split(' .. ')[0] ?? ''}` : `over ${bandWords(lowHz, highHz)}`;
      return findingIn(channel, {
        code: 'overlaps-wanted',
        severity: 'warning',
        message: `${sourceWords({ source: name, harmonic })} lies inside the wanted band ${where}. That part is no alias, no filter can remove it, and no limit judges it.`,
        path: sourcePath(channel, index),
        ref: source?.ref ?? null,
        related: [{ path: ['wanted'], message: 'the wanted band' }],
        figures: { frequency: lowHz, source: name },
      });
    }),
};
