/** What hold or gate leave of a tone at every output frequency, alone and with the filter behind them, and the weight of each copy of a gate. */
import { gainDb, gateResponse } from '../analysis';
import type { Item, Points } from '../protocol/picture';
import { formatDb, formatFrequency } from '../units/format';
import { item } from './items';
import { relayGains } from './leaving-copies';
import { curveOf, leavingPane } from './leaving-items';
import type { LeavingView } from './leaving-view';
import { filterPlace, pulseKey } from './subject';
import { sentences } from './words';

/** The envelopes at the highest wanted level; none of track and hold, whose copies follow no common curve. */
export function envelopeItems(view: LeavingView): Item[] {
  const { subject } = view;
  const { channel } = subject;
  if (channel.gate?.kind === 'track') return [];
  const alone = aloneDb(view);
  const both = bothDb(view, alone);
  const key = pulseKey(channel);
  const curve = (levelAt: (f: number) => number): Points => curveOf(view, levelAt, 0, view.output.highHz);
  const items = [
    envelope(view, {
      id: 'hold',
      name: key,
      points: curve(alone),
      stroke: 'dashed',
      words:
        key === 'gate'
          ? 'The spectrum of the gate: copy k of a tone at the wanted level leaves it as high as this stands at k times the rate'
          : 'What the hold leaves of a tone at the wanted level',
    }),
    envelope(view, {
      id: 'hold-and-path',
      name: `${key} and path`,
      points: curve(both),
      stroke: 'dotted',
      words: `What ${key} and output filter leave of it, at the worst of the tolerances`,
    }),
  ];
  // Where there is no filter, hold and path are one curve; where there is no hold, the path is all there is.
  if (outputStages(view) === 0) return [...items.slice(0, 1), ...weightItems(view, alone)];
  const shown = channel.pulse.shape === 'instant' && channel.gate === null ? items.slice(1) : items;
  return [...shown, ...weightItems(view, alone)];
}

function outputStages({ subject: { channel } }: LeavingView): number {
  return channel.outputStages.length;
}

function aloneDb({ subject, topDb }: LeavingView): (f: number) => number {
  const { channel, path } = subject;
  const gate = channel.gate?.kind === 'pulse' ? gateResponse(channel.gate.pulse, channel.rate.hz) : null;
  return (f) => topDb + gainDb(gate ?? path.pulse, f);
}

function bothDb({ subject, topDb }: LeavingView, alone: (f: number) => number): (f: number) => number {
  if (subject.channel.direction !== 'relay') return (f) => topDb + gainDb(subject.largest, f);
  const { largestOutput } = relayGains(subject);
  return (f) => alone(f) + gainDb(largestOutput, f);
}

interface EnvelopeParts {
  readonly id: 'hold' | 'hold-and-path';
  readonly name: string;
  readonly points: Points;
  readonly stroke: 'dashed' | 'dotted';
  readonly words: string;
}

function envelope(view: LeavingView, { id, name, points, stroke, words }: EnvelopeParts): Item {
  // The hold is named on its first lobe beyond the rate, hold and path where they part.
  const nameHz = (id === 'hold' ? 1.43 : 0.42) * view.subject.channel.rate.hz;
  const index = points.x.findIndex((x) => x >= nameHz);
  return item({
    id: `envelope-${id}`,
    series: id,
    pane: leavingPane,
    role: id === 'hold' ? 'pulse' : 'path',
    name,
    words: sentences(words),
    place: id === 'hold' ? view.subject.placeOf([pulseKey(view.subject.channel)]) : filterPlace(view.subject),
    shapes: [{ kind: 'curve', points, stroke, weight: 'thin' }],
    label: {
      text: name,
      frequencyHz: points.x[index] ?? 0,
      level: points.y[index] ?? 0,
      prefer: id === 'hold' ? 'above' : 'right',
      priority: 4,
    },
  });
}

/** |c_k| of a gate as a mark at each multiple of the rate. */
function weightItems(view: LeavingView, alone: (f: number) => number): Item[] {
  const { channel, placeOf } = view.subject;
  if (channel.gate?.kind !== 'pulse') return [];
  const folds = Array.from({ length: view.lastFold + 1 }, (_, fold) => fold);
  return folds.flatMap((fold) => {
    const frequencyHz = fold * channel.rate.hz;
    const level = alone(frequencyHz);
    if (!Number.isFinite(level) || level < view.levels.low) return [];
    const against = formatDb(level - alone(0), 'dB', 2);
    return [
      item({
        id: `weight-${fold}`,
        series: 'hold',
        pane: leavingPane,
        role: 'pulse',
        name: `weight of copy ${fold}`,
        words: sentences(
          fold === 0
            ? `The wanted path loses ${formatDb(view.topDb - level, 'dB', 2)} to the gate itself`
            : `Copy ${fold}, about ${formatFrequency(frequencyHz)}, leaves the gate at ${against} against the wanted path`,
        ),
        place: placeOf(['gate']),
        joins: ['envelope-hold'],
        shapes: [{ kind: 'mark', frequencyHz, level, mark: 'inside' }],
      }),
    ];
  });
}
