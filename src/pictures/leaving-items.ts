/** Every copy twice: pale as the hold leaves it, solid as the path leaves it, so that the eye sees who did the work. */
import { gainDb, pulseNulls } from '../analysis';
import type { Response } from '../analysis';
import type { Item, Points, Shape } from '../protocol/picture';
import { formatCount } from '../units/format';
import { item } from './items';
import { imageLimitAt } from './leaving-view';
import type { CopyView, LeavingView } from './leaving-view';
import { overLimit } from './over-limit';
import { sampleCurve } from './sample-curve';
import { levelWords, sentences, stretchWords } from './words';

/** The section's only pane. */
export const leavingPane = 'leaving';

/** The wanted bands and all copies. */
export function copyItems(view: LeavingView): Item[] {
  return view.copies.flatMap((copy) => {
    const [before, after] = [beforeItem(view, copy), afterItem(view, copy)];
    return [before, after, ...harmItems(view, copy, after)];
  });
}

/** The envelopes: what the hold leaves of a tone at the wanted level, and what hold and path leave. */
export function envelopeItems(view: LeavingView): Item[] {
  const { subject, topDb } = view;
  const hold = curveOf(view, subject.path.pulse, topDb, 0, view.output.highHz);
  const both = curveOf(view, subject.largest, topDb, 0, view.output.highHz);
  const items = [
    envelope(view, {
      id: 'hold',
      name: 'hold',
      points: hold,
      stroke: 'dashed',
      place: ['hold'],
      words: 'What the hold leaves of a tone at the wanted level',
    }),
    envelope(view, {
      id: 'hold-and-path',
      name: 'hold and path',
      points: both,
      stroke: 'dotted',
      place: ['filter'],
      words: 'What hold and path leave of it, at the worst of the tolerances',
    }),
  ];
  // Where there is no filter, hold and path are one curve; where there is no hold, the path is all there is.
  if (subject.path.stages.length === 0) return items.slice(0, 1);
  return subject.channel.pulse.shape === 'instant' ? items.slice(1) : items;
}

interface EnvelopeParts {
  readonly id: 'hold' | 'hold-and-path';
  readonly name: string;
  readonly points: Points;
  readonly stroke: 'dashed' | 'dotted';
  readonly place: readonly string[];
  readonly words: string;
}

function envelope(view: LeavingView, { id, name, points, stroke, place, words }: EnvelopeParts): Item {
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
    place: view.subject.placeOf(place),
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

function beforeItem(view: LeavingView, copy: CopyView): Item {
  const points = copyCurve(view, copy, view.subject.path.pulse);
  const side = sideWords(copy);
  return item({
    id: `${idOf(copy)}-before`,
    series: copy.wanted ? 'wanted' : 'copies',
    pane: leavingPane,
    role: copy.wanted ? 'wanted' : 'copy',
    name: `${nameOf(copy)}, as the hold leaves it`,
    words: sentences(
      `${nameOf(copy)}${side} at ${stretchWords(copy.range.low, copy.range.high)} as the hold leaves it, at most ${levelWords(Math.max(...points.y))}`,
    ),
    place: view.subject.placeOf(copy.wanted ? ['wanted', copy.index] : ['hold']),
    joins: [idOf(copy)],
    shapes: [{ kind: 'area', upper: points, lower: null, tone: 'pale' }],
    label: beforeLabel(view, copy, points),
  });
}

function beforeLabel(view: LeavingView, copy: CopyView, points: Points): Item['label'] {
  const level = Math.max(...points.y);
  const middleHz = (copy.range.low + copy.range.high) / 2;
  if (copy.wanted) {
    const text = `wanted ${stretchWords(copy.band.lowHz, copy.band.highHz)}`;
    return { text, frequencyHz: middleHz, level, prefer: 'above', priority: 8 };
  }
  if (copy.copy.fold === 0) return { text: 'baseband', frequencyHz: middleHz, level, prefer: 'above', priority: 5 };
  if (copy.index > 0 || !namesPair(view, copy)) return null;
  const frequencyHz = copy.copy.fold * view.subject.channel.rate.hz;
  return {
    text: `copy ${copy.copy.fold}`,
    frequencyHz,
    level: Math.min(view.levels.high, level + 2),
    prefer: 'above',
    priority: 5,
  };
}

/** One name a pair, between its sides: the upper side carries it, or the lower where the upper is the wanted band. */
function namesPair({ copies }: LeavingView, { copy, index }: CopyView): boolean {
  if (copy.side === 'upper') return true;
  return copies.some((other) => other.wanted && other.index === index && other.copy.fold === copy.fold);
}

function afterItem(view: LeavingView, copy: CopyView): Item {
  const points = copyCurve(view, copy, view.subject.largest);
  const figure = view.subject.figures.images.find(
    (image) => image.copy === copy.copy.fold && (image.side === copy.copy.side || image.side === 'baseband'),
  );
  const relative =
    copy.wanted || figure === undefined || view.subject.channel.wanted.length > 1
      ? ''
      : `, ${levelWords(figure.relative, 'dBc')} at ${stretchWords(figure.frequency, figure.frequency)}`;
  return item({
    id: idOf(copy),
    series: copy.wanted ? 'wanted' : 'copies',
    pane: leavingPane,
    role: copy.wanted ? 'wanted' : 'copy',
    name: `${nameOf(copy)}, as it leaves`,
    words: sentences(
      `${nameOf(copy)}${sideWords(copy)} at ${stretchWords(copy.range.low, copy.range.high)} as the path leaves it, at most ${levelWords(Math.max(...points.y))}${relative}`,
    ),
    place: view.subject.placeOf(copy.wanted ? ['wanted', copy.index] : ['filter']),
    shapes: [
      { kind: 'area', upper: points, lower: null, tone: 'solid' },
      { kind: 'curve', points, stroke: 'solid', weight: 'bold' },
    ],
  });
}

function harmItems(view: LeavingView, copy: CopyView, after: Item): Item[] {
  const curve = after.shapes.find((shape) => shape.kind === 'curve');
  if (copy.wanted || curve?.kind !== 'curve') return [];
  const over = overLimit(curve.points, (x) => imageLimitAt(view, copy, x) ?? Infinity, copy.range);
  if (over.length === 0) return [];
  return [
    item({
      id: `${after.id}-harm`,
      series: 'copies',
      pane: leavingPane,
      role: 'harm',
      name: `${nameOf(copy)}, over the limit`,
      words: sentences(
        `${nameOf(copy)}${sideWords(copy)} is over the image limit at ${over.map(({ upper }) => stretchWords(upper.x[0] ?? 0, upper.x[upper.x.length - 1] ?? 0)).join(' and ')}`,
      ),
      place: after.place,
      joins: [after.id],
      shapes: over.map(({ upper, lower }): Shape => ({ kind: 'area', upper, lower, tone: 'solid' })),
    }),
  ];
}

function copyCurve(view: LeavingView, copy: CopyView, response: Response): Points {
  const points = curveOf(view, response, copy.band.levelDb, copy.range.low, copy.range.high);
  return { ...points, from: points.x.map(copy.wantedHz) };
}

function curveOf(view: LeavingView, response: Response, levelDb: number, lowHz: number, highHz: number): Points {
  const { channel, figures } = view.subject;
  const worst = figures.image === null || !Number.isFinite(figures.image.frequency) ? [] : [figures.image.frequency];
  const through = [...worst, ...pulseNulls(channel.pulse, channel.rate.hz, view.lastFold + 1)];
  return sampleCurve((f) => levelDb + gainDb(response, f), {
    lowHz,
    highHz,
    through,
    floor: view.levels.low,
    tolerance: view.tolerance,
  });
}

function idOf({ index, copy, wanted }: CopyView): string {
  return wanted ? `wanted-${index}` : `copy-${index}-${copy.fold}-${copy.side}`;
}

function nameOf({ copy, wanted, band }: CopyView): string {
  if (wanted) return band.name === null ? 'wanted' : `wanted, ${band.name}`;
  return copy.fold === 0 ? 'baseband copy' : `copy ${formatCount(copy.fold, '').trim()}`;
}

function sideWords({ copy, wanted }: CopyView): string {
  return wanted || copy.fold === 0 ? '' : ` (${copy.side} side)`;
}
