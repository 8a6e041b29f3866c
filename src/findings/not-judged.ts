/** `not-judged`: a limit that nothing in the channel could break. */
import type { LimitFigure } from '../analysis/figures';
import type { Channel } from '../spec/channel';
import { findingIn, limitPath } from './build';
import type { Finding } from './finding';
import type { FindingKind, Help, Subject } from './kind';

const help: Help = {
  summary: 'A limit that nothing in the channel could break has not been judged.',
  means: `The channel states a limit, but nothing that it could be judged by: an alias limit without anything unwanted, a signal-to-noise
limit without any noise.`,
  matters: `Such a limit always holds, and an answer that is always "yes" is none. It does not count as passed.`,
  cure: `State what is missing: the message names it. Or take the limit out.`,
  example: {
    spec: `bandkeep: 1
channels:
  gate-bearing:
    direction: capture
    wanted: { band: 5 Hz .. 10 kHz, level: -3 dBFS }
    unwanted: { name: drive hash, band: 90 kHz .. 3 MHz, level: -55 dBFS }
    rate: 96 kHz
    filter: { family: butterworth, order: 4, corner: 14 kHz }
    limits: { snr: 84 dB }
`,
    from: 'rate: 96 kHz',
    to: 'rate: 96 kHz\n    bits: 16',
  },
};

/** The finding code `not-judged`. */
export const notJudged: FindingKind = {
  code: 'not-judged',
  severity: 'warning',
  group: 'advice',
  help,
  remedies: [],
  check: (subject) =>
    subject.figures.limits
      .filter((figure) => !figure.judged && !withheldFor(subject, figure))
      .map((figure) => unjudged(subject, figure)),
};

/** Whether `beyond-data` already says why it is not judged. */
function withheldFor({ figures }: Subject, { limit }: LimitFigure): boolean {
  return figures.beyondData.some(({ keys }) => keys.includes(limit));
}

function unjudged({ channel, figures }: Subject, figure: LimitFigure): Finding {
  const folded = figures.faults.some((fault) => fault.kind === 'wanted-folds');
  return findingIn(channel, {
    code: 'not-judged',
    severity: 'warning',
    message: `The limit \`${figure.limit}\` has not been judged: ${missing(channel, figure, folded)}.`,
    path: limitPath(channel, figure),
    ref: figure.ref,
    figures: { limit: figure.at },
    limit: figure.limit,
  });
}

const foldsFirst = 'the wanted band folds onto itself. Cure that first';

/** What would have to be there for the limit to mean something. */
function missing(channel: Channel, figure: LimitFigure, folded: boolean): string {
  switch (figure.limit) {
    case 'alias':
      return channel.unwanted.length === 0
        ? 'nothing unwanted is given. Name what arrives under `unwanted`'
        : 'no part of what is unwanted can land in a protected range';
    case 'snr':
      return `the channel has no noise. Give it ${channel.direction === 'relay' ? '`jitter`' : '`bits`, or `jitter`'}`;
    case 'flatness':
      return folded ? foldsFirst : `a path without a filter is flat by nature. Give it its ${filterKey(channel)}`;
    case 'output':
      return 'no segment of its mask says `below`';
    case 'crosstalk':
      return 'the channel has no time slots. Give it `slots`';
    case 'delay':
    case 'delay-spread':
      if (hasTable(channel)) return 'a measured stage has no phase. Give its table a phase column';
      return `a path without a filter delays nothing. Give it its ${filterKey(channel)}`;
    case 'response':
    case 'through':
      return `a path without a filter is flat by nature, and that is inside the mask. Give it its ${filterKey(channel)}`;
    case 'image':
    case 'headroom':
    case 'level':
      return folded ? foldsFirst : 'the channel has nothing that could break it';
  }
}

function filterKey({ direction }: Channel): string {
  return direction === 'relay' ? '`input-filter` and `output-filter`' : '`filter`';
}

function hasTable({ stages }: Channel): boolean {
  return stages.some(({ form }) => form.kind === 'measured' && form.table.phasesRad === null);
}
