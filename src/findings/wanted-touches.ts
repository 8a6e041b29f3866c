/** `wanted-touches`: a wanted band ends exactly on a multiple of half the rate. */
import type { SamplingFault } from '../analysis/figures';
import { findingIn } from './build';
import type { Finding } from './finding';
import type { FindingKind, Help, Subject } from './kind';
import { edgeWords, sentenceCase, wantedWords } from './wanted-folds';

const help: Help = {
  summary: 'A wanted band ends exactly on a multiple of half the rate.',
  means: `The band, its guard included, reaches a multiple of half the rate without crossing it. It comes out whole, but its mirror begins
at the very frequency where it ends. (0 Hz is no such edge: a band may begin there.)`,
  matters: `A filter needs room to fall. With none, whatever stands just beyond the edge lands just inside it at nearly full strength.`,
  cure: `Raise the rate a little, or end the band a little earlier, so that the filter has a gap to fall in.`,
  example: {
    spec: `bandkeep: 1
channels:
  tide-gauge:
    direction: capture
    wanted: { band: 0 Hz .. 50 Hz, level: -6 dBFS }
    unwanted: { name: pump hum, tone: 150 Hz, level: -40 dBFS }
    rate: 100 Hz
    filter: { family: butterworth, order: 4, corner: 60 Hz }
    limits: { flatness: 3 dB }
`,
    from: 'rate: 100 Hz',
    to: 'rate: 120 Hz',
  },
};

/** The finding code `wanted-touches`. */
export const wantedTouches: FindingKind = {
  code: 'wanted-touches',
  severity: 'warning',
  group: 'sampling',
  help,
  remedies: ['rate'],
  check: (subject) =>
    subject.figures.faults.filter((fault) => fault.kind === 'wanted-touches').map((fault) => touches(subject, fault)),
};

function touches({ channel, figures }: Subject, fault: SamplingFault): Finding {
  const band = sentenceCase(wantedWords(channel, fault.index));
  const edge = fault.edgeHz === null ? 'a multiple of half the rate' : edgeWords(figures, fault.edgeHz);
  return findingIn(channel, {
    code: 'wanted-touches',
    severity: 'warning',
    message: `${band} ends on ${edge}: no filter parts it from its mirror there. Leave it some room.`,
    path: ['wanted', fault.index, 'band'],
    related: [{ path: ['rate'], message: 'the rate' }],
    figures: { frequency: fault.edgeHz },
  });
}
