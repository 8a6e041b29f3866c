/** Hover of a gate: what it costs the wanted path and how much it weakens each copy before any filter acts, as it is and if it were wider. */
import {
  gainDb,
  gateFigures,
  pulseShape,
  shapeNulls,
  stretchedGate,
  trackAndHoldCopy,
  trackAndHoldDelay,
  widthSeconds,
  type Figures,
  type GateFigures,
  type TrackAndHold,
} from '../../analysis';
import type { Pulse, PulseWidth } from '../../spec';
import { formatDb, formatFrequency, formatPercent, formatTime, plainNumber } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { shapeWords } from './shape-words';
import type { Subject } from './subject';
import { lossWords } from './words';

/** How many copies are listed. */
const listedCopies = 5;

/** By how much the gate is imagined wider and narrower. */
const otherWidths = [2, 1.5, 0.5];

/** The channel's gate, or null where it samples flat-top. */
export function gateHover({ channel, figures }: Subject): Answer | null {
  const { gate } = channel;
  if (gate === null) return null;
  return gate.kind === 'track' ? trackAnswer(gate.track, figures) : pulseAnswer(gate.pulse, figures);
}

function pulseAnswer(gate: Pulse, figures: Figures): Answer | null {
  const { rate } = figures;
  const shape = pulseShape(gate, rate);
  const own = gateFigures(gate, rate, listedCopies);
  if (shape === null || own === null) return null;
  const nulls = shapeNulls(shape, 2).map((hz) => formatFrequency(hz));
  return {
    headline: headlineOf(gate, own),
    rows: [
      ['lasts', `${formatTime(own.share / rate)} of ${formatTime(1 / rate)}`],
      ...copyRows(own),
      ...otherWidths.flatMap((factor) => widthRow(gate, factor, rate)),
      ...knownRows(
        ['its spectrum is nothing at', nulls.length === 0 ? null : nulls.join(', ')],
        ['copy 1 as it leaves', leavingWords(figures)],
        ['the wanted band', 'stays flat and undelayed: a gate weighs each copy as a whole'],
      ),
    ],
    formula: 'c_k = (area/T)·P(k·fs): copy k leaves by |c_k|/c_0 weaker than the wanted band, whatever its frequency',
  };
}

/** What gate and filters leave of the first copy. */
function leavingWords({ images }: Figures): string | null {
  const first = images.filter(({ copy }) => copy === 1).sort((a, b) => b.relative - a.relative)[0];
  if (first === undefined || !Number.isFinite(first.relative)) return null;
  return `${formatDb(first.relative, 'dBc')} at ${formatFrequency(first.frequency)}, ${first.side} side`;
}

function headlineOf(gate: Pulse, { share, ownDb, copiesDb }: GateFigures): string {
  const width = `${shapeWords(gate)}${formatPercent(share)} of the period`;
  const first = copiesDb[0];
  if (first === undefined) return `${width}: nothing of the wanted band passes`;
  return `${width}: ${formatDb(-ownDb)} own loss, copy 1 another ${lossWords(-first)} weaker before any filter`;
}

function copyRows({ ownDb, copiesDb }: GateFigures): Row[] {
  return [
    ['own loss, 20·log10 c_0', formatDb(ownDb, 'dB', 2)],
    ...copiesDb.map((copyDb, index): Row => [`|c_${index + 1}|/c_0`, formatDb(copyDb, 'dB', 2)]),
  ];
}

/** What another width would do; none that is longer than the period. */
function widthRow(gate: Pulse, factor: number, rateHz: number): Row[] {
  const other = gateFigures(stretchedGate(gate, factor), rateHz, listedCopies);
  if (other === null || other.share > 1 + 1e-12 || other.copiesDb.length === 0) return [];
  const copies = other.copiesDb.map((copyDb) => plainNumber(copyDb, 1)).join(', ');
  return [
    [
      `at a width of ${formatPercent(other.share)}`,
      `copies 1 … ${listedCopies}: ${copies} dB; own loss ${formatDb(-other.ownDb)}`,
    ],
  ];
}

function trackAnswer(track: PulseWidth, figures: Figures): Answer {
  const { rate, wanted, reference } = figures;
  const share = widthSeconds(track, rate) * rate;
  const gate: TrackAndHold = { trackShare: Math.min(1, share), periodSeconds: 1 / rate };
  const top = Math.max(...wanted.map(({ high }) => high));
  const path = trackAndHoldCopy(gate, 0);
  return {
    headline: `Tracks ${formatPercent(share)} of the period: ${lossWords(-gainDb(path, top))} loss at ${formatFrequency(top)}`,
    rows: [
      ['follows for', `${formatTime(gate.trackShare / rate)} of ${formatTime(1 / rate)}`],
      ...[...new Set(wanted.flatMap(({ low, high }) => [low, high]))].map((hz): Row => [
        `loss at ${formatFrequency(hz)}`,
        lossWords(-gainDb(path, hz)),
      ]),
      ...Array.from({ length: listedCopies }, (_, index): Row => trackedCopyRow(gate, index + 1, top)),
      [`delay at ${formatFrequency(reference)}`, formatTime(trackAndHoldDelay(gate, reference))],
    ],
    formula: 'd·sinc(k·d) of the part that follows plus e·sinc(e·f_o·T) of the part that holds, at the output frequency f_o',
  };
}

/** The lower side of a copy, where the highest wanted frequency leaves, against that frequency where it is wanted. */
function trackedCopyRow(gate: TrackAndHold, copy: number, topHz: number): Row {
  const outputHz = copy / gate.periodSeconds - topHz;
  const against = gainDb(trackAndHoldCopy(gate, copy), outputHz) - gainDb(trackAndHoldCopy(gate, 0), topHz);
  return [`copy ${copy} at ${formatFrequency(outputHz)}`, formatDb(against, 'dBc', 2)];
}
