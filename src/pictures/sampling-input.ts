/** The upper pane: what arrives – the wanted bands, each source as it is stated and as the path leaves it, and the path's response across it. */
import { gainDb, pulseNulls } from '../analysis';
import type { Item, Shape } from '../protocol/picture';
import type { WantedBand } from '../spec/channel';
import { flat, item } from './items';
import { sampleCurve } from './sample-curve';
import type { SamplingView, SourceView } from './sampling-view';
import { filterPlace } from './subject';
import { levelWords, sentences, stretchWords } from './words';

/** The id of the upper pane. */
export const inputPane = 'input';

/** The items of the upper pane. */
export function inputItems(view: SamplingView): Item[] {
  const { channel } = view.subject;
  const wanted = channel.wanted.map((band, index) => wantedItem(view, band, index));
  return [...wanted, ...view.sources.flatMap((source) => sourceItems(view, source)), pathItem(view)];
}

/** The series of a source, shared by all that comes of it. */
export function sourceSeries(index: number): string {
  return `source-${index}`;
}

function wantedItem(view: SamplingView, band: WantedBand, index: number): Item {
  const name = band.name === null ? 'wanted' : `wanted, ${band.name}`;
  const words = sentences(`Wanted band ${stretchWords(band.lowHz, band.highHz)} at ${levelWords(band.levelDb)}`);
  const lowHz = Math.max(band.lowHz, 0);
  return item({
    id: `wanted-${index}`,
    series: 'wanted',
    pane: inputPane,
    role: 'wanted',
    name,
    words,
    place: view.subject.placeOf(['wanted', index]),
    shapes: [
      { kind: 'block', lowHz, highHz: band.highHz, top: band.levelDb, tone: 'pale' },
      lid(lowHz, band.highHz, band.levelDb),
    ],
    label: {
      text: `wanted ${stretchWords(band.lowHz, band.highHz)}`,
      frequencyHz: middleOf(Math.max(band.lowHz, view.input.logLowHz), band.highHz),
      level: band.levelDb,
      prefer: 'below',
      priority: 7,
    },
  });
}

function lid(lowHz: number, highHz: number, level: number): Shape {
  return { kind: 'curve', points: flat(lowHz, highHz, level), stroke: 'solid', weight: 'bold' };
}

function sourceItems(view: SamplingView, source: SourceView): Item[] {
  const { index } = source;
  const { name, levelDb } = source.source;
  const place = view.subject.placeOf(['unwanted', index]);
  const range = shownRange(view, source);
  const stands = stretchWords(source.range.low, source.range.high);
  const common = { series: sourceSeries(index), pane: inputPane, role: 'source', place } as const;
  const stated = item({
    ...common,
    id: `source-${index}`,
    name,
    words: sentences(
      `${name}: ${levelWords(levelDb)} at the input, ${source.range.low === source.range.high ? 'at' : 'anywhere in'} ${stands}`,
      landingWords(view, index),
    ),
    shapes: statedShapes(range, levelDb),
    joins: [`arrives-${index}`],
    label: { text: name, frequencyHz: middleOf(range.low, range.high), level: levelDb, prefer: 'above', priority: 8 },
  });
  const arrives = item({
    ...common,
    id: `arrives-${index}`,
    name: `${name}, behind the path`,
    words: sentences(`${name} behind the path, at the worst of its tolerances`),
    shapes: arrivingShapes(view, source, range),
  });
  return arrives.shapes.length === 0 ? [stated] : [stated, arrives];
}

/** What of a source lies on the axis; an endless one runs to its end. */
function shownRange({ input }: SamplingView, { range }: SourceView): { readonly low: number; readonly high: number } {
  return { low: Math.max(range.low, 0), high: Math.min(range.high, input.highHz) };
}

function statedShapes({ low, high }: { readonly low: number; readonly high: number }, level: number): Shape[] {
  if (low === high) return [{ kind: 'stem', frequencyHz: low, top: level, tone: 'pale' }];
  return [
    { kind: 'block', lowHz: low, highHz: high, top: level, tone: 'pale' },
    { kind: 'curve', points: flat(low, high, level), stroke: 'dotted', weight: 'bold' },
  ];
}

function arrivingShapes(
  view: SamplingView,
  source: SourceView,
  { low, high }: { readonly low: number; readonly high: number },
): Shape[] {
  const level = (f: number): number => source.levelDb + gainDb(source.response, f);
  if (low === high) return [{ kind: 'stem', frequencyHz: low, top: level(low), tone: 'solid' }];
  return source.ranges.flatMap((range): Shape[] => {
    const highHz = Math.min(range.high, view.input.highHz);
    if (range.low >= highHz) return [];
    const points = sampleCurve(level, { lowHz: range.low, highHz, ...precision(view) });
    return [
      { kind: 'area', upper: points, lower: null, tone: 'solid' },
      { kind: 'curve', points, stroke: 'solid', weight: 'thin' },
    ];
  });
}

function pathItem(view: SamplingView): Item {
  const { subject, input } = view;
  const points = sampleCurve((f) => gainDb(subject.nominal, f), { lowHz: 0, highHz: input.highHz, ...precision(view) });
  const aperture = subject.channel.pulse.shape === 'instant' ? '' : ' and aperture';
  return item({
    id: 'path-across',
    series: 'path',
    pane: inputPane,
    role: 'path',
    name: `filter${aperture}`,
    words: sentences(`Response of the filter${aperture} across the input, at nominal values`),
    place: filterPlace(subject),
    shapes: [{ kind: 'curve', points, stroke: 'dashed', weight: 'thin' }],
    label: { text: 'path', ...pathLabelPoint(view), prefer: 'right', priority: 4 },
  });
}

/** Where the path has fallen by a fifth of what is shown. */
function pathLabelPoint({ subject, input, levels }: SamplingView): { readonly frequencyHz: number; readonly level: number } {
  const wanted = levels.high + (levels.low - levels.high) / 4;
  const steps = Array.from({ length: 121 }, (_, index) => input.logLowHz * (input.highHz / input.logLowHz) ** (index / 120));
  const found = steps.find((f) => gainDb(subject.nominal, f) < wanted) ?? input.highHz / 2;
  return { frequencyHz: found, level: Math.max(levels.low, gainDb(subject.nominal, found)) };
}

function precision(view: SamplingView): {
  readonly through: readonly number[];
  readonly floor: number;
  readonly tolerance: number;
} {
  const { channel, figures } = view.subject;
  const worst = figures.aliases.flatMap(({ frequency }) =>
    frequency === null || !Number.isFinite(frequency) ? [] : [frequency],
  );
  return {
    through: [...worst, ...pulseNulls(channel.pulse, channel.rate.hz, 8)],
    floor: view.levels.low,
    tolerance: view.tolerance,
  };
}

function landingWords({ subject }: SamplingView, index: number): string {
  const alias = subject.figures.aliases.find((candidate) => candidate.index === index);
  if (alias === undefined || alias.lands === null || alias.level === null || alias.frequency === null)
    return 'Lands in no protected range';
  return `Its strongest landing: ${stretchWords(alias.frequency, alias.frequency)} onto ${stretchWords(alias.lands, alias.lands)} at ${levelWords(alias.level)}`;
}

function middleOf(lowHz: number, highHz: number): number {
  return lowHz > 0 ? Math.sqrt(lowHz * highHz) : highHz / 2;
}
