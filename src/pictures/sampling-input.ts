/** The upper pane: what arrives – the wanted bands, each source as it is stated and as the path leaves it, and the path's response across it. */
import { gainDb, pulseNulls } from '../analysis';
import type { Enclosure } from '../analysis';
import type { WantedFigure } from '../analysis';
import type { Item, Shape } from '../protocol/picture';
import type { WantedBand } from '../spec/channel';
import { flat, item } from './items';
import { sampleCurve } from './sample-curve';
import type { SamplingView, SourceView, ToneView } from './sampling-view';
import { filterPlace } from './subject';
import { levelWords, sentences, stretchWords } from './words';

/** The id of the upper pane. */
export const inputPane = 'input';

/** The items of the upper pane. */
export function inputItems(view: SamplingView): Item[] {
  const { channel } = view.subject;
  const wanted = channel.wanted.map((band, index) => wantedItem(view, band, index));
  const zones = view.subject.figures.wanted.flatMap((band, index) => zoneItems(view, band, index));
  return [...wanted, ...zones, ...view.sources.flatMap((source) => sourceItems(view, source)), pathItem(view)];
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

/** The two multiples of half the rate around a band that lies above it: no filter parts the band from what lies just beyond them. */
function zoneItems(view: SamplingView, { zone, inverted }: WantedFigure, index: number): Item[] {
  if (zone === 1) return [];
  const { halfRate } = view.subject.figures;
  const [low, high] = [(zone - 1) * halfRate, zone * halfRate];
  const text = `zone ${zone}${inverted ? ', inverted' : ''}`;
  return [
    item({
      id: `zone-${index}`,
      series: 'zones',
      pane: inputPane,
      role: 'rule',
      name: 'zone of the wanted band',
      words: sentences(
        `The wanted band lies in zone ${zone}, ${stretchWords(low, high)}, and comes out ${inverted ? 'inverted' : 'upright'}`,
      ),
      place: view.subject.placeOf(['rate']),
      joins: [`wanted-${index}`],
      shapes: [
        { kind: 'rule', frequencyHz: low },
        { kind: 'rule', frequencyHz: high },
      ],
      label: {
        text,
        frequencyHz: low,
        level: view.levels.low + (view.levels.high - view.levels.low) * 0.06,
        prefer: 'right',
        priority: 6,
      },
    }),
  ];
}

function lid(lowHz: number, highHz: number, level: number): Shape {
  return { kind: 'curve', points: flat(lowHz, highHz, level), stroke: 'solid', weight: 'bold' };
}

function sourceItems(view: SamplingView, source: SourceView): Item[] {
  const { index } = source;
  const { name } = source.source;
  const place = view.subject.placeOf(['unwanted', index]);
  const common = { series: sourceSeries(index), pane: inputPane, role: 'source', place } as const;
  const stated = item({
    ...common,
    id: `source-${index}`,
    name,
    words: sentences(statedWords(source), landingWords(view, index)),
    shapes: source.tones.flatMap((tone) => statedShapes(view, tone)),
    joins: [`arrives-${index}`],
    label: { text: name, ...labelPoint(view, source), prefer: 'above', priority: 8 },
  });
  const arrives = item({
    ...common,
    id: `arrives-${index}`,
    name: `${name}, behind the path`,
    words: sentences(`${name} behind the path, at the worst of its tolerances`),
    shapes: source.tones.flatMap((tone) => arrivingShapes(view, tone)),
  });
  return arrives.shapes.length === 0 ? [stated] : [stated, arrives];
}

function statedWords({ source, range, tones }: SourceView): string {
  const stands = stretchWords(range.low, range.high);
  const where = range.low === range.high ? `at ${stands}` : `anywhere in ${stands}`;
  const entrance = { input: 'at the input', sampler: 'at the sampler', stage: 'in front of a later stage' };
  const enters = entrance[typeof source.enters === 'object' ? 'stage' : source.enters];
  if (source.kind === 'spectrum')
    return `${source.name}: at most ${levelWords(source.levelDb)} ${enters}, ${source.lines ? `${tones.length} lines in` : 'anywhere under its table over'} ${stands}`;
  const top = Math.max(...tones.map(({ harmonic }) => harmonic));
  return `${source.name}: ${levelWords(source.levelDb)} ${enters}, ${where}${top > 1 ? `, and its harmonics up to ${top}` : ''}`;
}

/** Over the source itself; of a table over its highest level. */
function labelPoint(view: SamplingView, { source, tones, range }: SourceView): { frequencyHz: number; level: number } {
  const [strongest] = tones;
  if (source.kind === 'spectrum' && source.lines && strongest !== undefined)
    return { frequencyHz: strongest.range.low, level: source.levelDb };
  const low = Math.max(range.low, 0);
  const frequencyHz = middleOf(low, Math.min(range.high, view.input.highHz));
  const envelope = strongest?.envelope ?? null;
  return { frequencyHz, level: source.levelDb + (envelope === null ? 0 : gainDb(envelope, frequencyHz)) };
}

/** What of a tone lies on the axis; an endless one runs to its end. */
function shownRange({ input }: SamplingView, { range }: ToneView): Enclosure {
  return { low: Math.max(range.low, 0), high: Math.min(range.high, input.highHz) };
}

function statedShapes(view: SamplingView, tone: ToneView): Shape[] {
  const { low, high } = shownRange(view, tone);
  const { levelDb, envelope } = tone;
  if (low === high) return [{ kind: 'stem', frequencyHz: low, top: levelDb, tone: 'pale' }];
  if (envelope === null) {
    return [
      { kind: 'block', lowHz: low, highHz: high, top: levelDb, tone: 'pale' },
      { kind: 'curve', points: flat(low, high, levelDb), stroke: 'dotted', weight: 'bold' },
    ];
  }
  const points = sampleCurve((f) => levelDb + gainDb(envelope, f), { lowHz: low, highHz: high, ...precision(view) });
  return [
    { kind: 'area', upper: points, lower: null, tone: 'pale' },
    { kind: 'curve', points, stroke: 'dotted', weight: 'bold' },
  ];
}

function arrivingShapes(view: SamplingView, tone: ToneView): Shape[] {
  const { low, high } = shownRange(view, tone);
  const level = (f: number): number => tone.levelDb + gainDb(tone.response, f);
  if (low === high)
    return Number.isFinite(level(low)) ? [{ kind: 'stem', frequencyHz: low, top: level(low), tone: 'solid' }] : [];
  return tone.ranges.flatMap((range): Shape[] => {
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
  const { subject, input, across } = view;
  const { direction, pulse } = subject.channel;
  const points = sampleCurve((f) => gainDb(across, f), { lowHz: 0, highHz: input.highHz, ...precision(view) });
  const filter = direction === 'relay' ? 'input filter' : 'filter';
  const name = direction === 'relay' || pulse.shape === 'instant' ? filter : `${filter} and aperture`;
  return item({
    id: 'path-across',
    series: 'path',
    pane: inputPane,
    role: 'path',
    name,
    words: sentences(`Response of the ${name} across the input, at nominal values`),
    place: direction === 'relay' ? subject.placeOf(['input-filter']) : filterPlace(subject),
    shapes: [{ kind: 'curve', points, stroke: 'dashed', weight: 'thin' }],
    label: { text: direction === 'relay' ? filter : 'path', ...pathLabelPoint(view), prefer: 'right', priority: 4 },
  });
}

/** Where the path has fallen by a fifth of what is shown. */
function pathLabelPoint({ across, input, levels }: SamplingView): { readonly frequencyHz: number; readonly level: number } {
  const wanted = levels.high + (levels.low - levels.high) / 4;
  const steps = Array.from({ length: 121 }, (_, index) => input.logLowHz * (input.highHz / input.logLowHz) ** (index / 120));
  const found = steps.find((f) => gainDb(across, f) < wanted) ?? input.highHz / 2;
  return { frequencyHz: found, level: Math.max(levels.low, gainDb(across, found)) };
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
