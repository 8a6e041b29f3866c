/** Every copy twice: pale as hold or gate leave it, solid as the path leaves it, so that the eye sees who did the work. */
import { pulseNulls } from '../analysis';
import type { Item, Points, Shape } from '../protocol/picture';
import { formatCount } from '../units/format';
import { item } from './items';
import { imageLimitAt } from './leaving-view';
import type { LeavingView } from './leaving-view';
import type { CopyView } from './leaving-copies';
import { overLimit } from './over-limit';
import { sampleCurve } from './sample-curve';
import { filterPlace, pulseKey } from './subject';
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

function beforeItem(view: LeavingView, copy: CopyView): Item {
  const points = copyCurve(view, copy, copy.beforeDb);
  const side = sideWords(copy);
  return item({
    id: `${idOf(copy)}-before`,
    series: copy.wanted ? 'wanted' : 'copies',
    pane: leavingPane,
    role: copy.wanted ? 'wanted' : 'copy',
    name: `${nameOf(copy)}, as the ${pulseKey(view.subject.channel)} leaves it`,
    words: sentences(
      `${nameOf(copy)}${side} at ${stretchWords(copy.range.low, copy.range.high)} as the ${pulseKey(view.subject.channel)} leaves it, at most ${levelWords(Math.max(...points.y))}`,
    ),
    place: view.subject.placeOf(copy.wanted ? ['wanted', copy.index] : [pulseKey(view.subject.channel)]),
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
  const points = copyCurve(view, copy, copy.afterDb);
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
    place: copy.wanted ? view.subject.placeOf(['wanted', copy.index]) : filterPlace(view.subject),
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

function copyCurve(view: LeavingView, copy: CopyView, levelAt: (outputHz: number) => number): Points {
  const points = curveOf(view, levelAt, copy.range.low, copy.range.high);
  return { ...points, from: points.x.map(copy.wantedHz) };
}

/** A level over output frequencies, exact at the worst image and at the nulls of the hold. */
export function curveOf(view: LeavingView, levelAt: (outputHz: number) => number, lowHz: number, highHz: number): Points {
  const { channel, figures } = view.subject;
  const worst = figures.image === null || !Number.isFinite(figures.image.frequency) ? [] : [figures.image.frequency];
  const through = [...worst, ...pulseNulls(channel.pulse, channel.rate.hz, view.lastFold + 1)];
  return sampleCurve(levelAt, {
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
