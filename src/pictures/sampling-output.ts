/** The lower pane: where everything lands between 0 and half the rate, with the limit, the harm and all noise as one level. */
import { foldFrequency, gainDb } from '../analysis';
import type { Enclosure } from '../analysis';
import type { AliasFigure, WantedFigure } from '../analysis/figures';
import type { Item, Points, Shape } from '../protocol/picture';
import { flat, item } from './items';
import { landingCurves, levelOnto } from './landings';
import { overLimit } from './over-limit';
import { sampleCurve } from './sample-curve';
import { sourceSeries } from './sampling-input';
import type { SamplingView, SourceView, ToneView } from './sampling-view';
import { limitFigure } from './subject';
import { levelWords, marginWords, sentences, stretchWords } from './words';

/** The id of the lower pane. */
export const outputPane = 'output';

/** The items of the lower pane. */
export function outputItems(view: SamplingView): Item[] {
  const wanted = view.subject.figures.wanted.map((band, index) => wantedLanding(view, band, index));
  const landings = view.sources.map((source) => ({ source, shapes: landingShapes(view, source) }));
  const landed = landings
    .filter(({ shapes }) => shapes.length > 0)
    .map(({ source, shapes }) => landingItem(view, source, shapes));
  const harm = landings.flatMap(({ source, shapes }) => harmItems(view, source, shapes));
  const marks = view.subject.figures.aliases.flatMap((alias) => markItems(view, alias));
  return [...wanted, ...landed, ...limitItems(view), ...harm, ...noiseItems(view), ...marks];
}

function wantedLanding(view: SamplingView, band: WantedFigure, index: number): Item {
  const { subject } = view;
  const points = sampleCurve((x) => band.level + gainDb(subject.nominal, inputOf(view, band, x)), {
    lowHz: band.appearsLow,
    highHz: Math.min(band.appearsHigh, view.output.highHz),
    through: [],
    floor: view.levels.low,
    tolerance: view.tolerance,
  });
  const turned = band.inverted ? `, inverted (zone ${band.zone})` : band.zone === 1 ? '' : ` (zone ${band.zone})`;
  return item({
    id: `wanted-lands-${index}`,
    series: 'wanted',
    pane: outputPane,
    role: 'wanted',
    name: 'wanted, behind the path',
    words: sentences(`The wanted band appears at ${stretchWords(band.appearsLow, band.appearsHigh)}${turned}`),
    place: subject.placeOf(['wanted', index]),
    joins: [`wanted-${index}`],
    shapes: [
      { kind: 'area', upper: points, lower: null, tone: 'pale' },
      { kind: 'curve', points, stroke: 'solid', weight: 'bold' },
    ],
    label:
      band.zone === 1
        ? null
        : {
            text: `wanted${turned}`,
            frequencyHz: (band.appearsLow + band.appearsHigh) / 2,
            level: band.level,
            prefer: 'below',
            priority: 7,
          },
  });
}

/** The input frequency inside a wanted band that appears at x. */
function inputOf({ subject }: SamplingView, band: WantedFigure, x: number): number {
  const { fold, inverted } = foldFrequency((band.low + band.high) / 2, subject.channel.rate.hz);
  const f = fold * subject.channel.rate.hz + (inverted ? -x : x);
  return Math.min(band.high, Math.max(band.low, f));
}

/** One line for each tone that stands still, else curves with what lies under them. */
function landingShapes(view: SamplingView, source: SourceView): Shape[] {
  return source.tones.flatMap((tone) => toneShapes(view, tone));
}

function toneShapes(view: SamplingView, tone: ToneView): Shape[] {
  if (tone.ranges.length === 0) return [];
  const { low, high } = tone.range;
  if (low === high) {
    const { landsHz, fold, inverted } = foldFrequency(low, tone.rateHz);
    const top = levelOnto(tone, low, inverted ? fold : -fold, landsHz);
    return Number.isFinite(top) ? [{ kind: 'stem', frequencyHz: landsHz, top, tone: 'solid' }] : [];
  }
  const through = [...view.protect.flatMap((range) => [range.low, range.high]), ...worstLandings(view)];
  return landingCurves(tone, { through, floor: view.levels.low, tolerance: view.tolerance }).flatMap((points): Shape[] => [
    { kind: 'area', upper: points, lower: null, tone: 'pale' },
    { kind: 'curve', points, stroke: 'solid', weight: 'thin' },
  ]);
}

function worstLandings({ subject }: SamplingView): number[] {
  return subject.figures.aliases.flatMap(({ lands }) => (lands === null ? [] : [lands]));
}

function landingItem(view: SamplingView, source: SourceView, shapes: readonly Shape[]): Item {
  const { index } = source;
  const { name } = source.source;
  const top = strongestPoint(shapes);
  return item({
    id: `landing-${index}`,
    series: sourceSeries(index),
    pane: outputPane,
    role: 'landing',
    name: `${name}, where it lands`,
    words: sentences(`${name} after sampling, the strongest of its folds at each frequency`),
    place: view.subject.placeOf(['unwanted', index]),
    joins: [`source-${index}`, `arrives-${index}`],
    shapes,
    label:
      top === null || top.level < view.levels.low
        ? null
        : { text: name, frequencyHz: top.frequencyHz, level: top.level, prefer: 'above', priority: 5 },
  });
}

/** Where a label of the landing stands: two thirds along its longest curve, or on its line. */
function strongestPoint(shapes: readonly Shape[]): { readonly frequencyHz: number; readonly level: number } | null {
  const curves = shapes.flatMap((shape) => (shape.kind === 'curve' ? [shape.points] : []));
  const longest = curves.reduce<Points | null>((best, one) => (best === null || widthOf(one) > widthOf(best) ? one : best), null);
  if (longest === null) {
    const stems = shapes.flatMap((shape) =>
      shape.kind === 'stem' ? [{ frequencyHz: shape.frequencyHz, level: shape.top }] : [],
    );
    return [...stems].sort((a, b) => b.level - a.level)[0] ?? null;
  }
  const index = longest.x.findIndex((x) => x >= (longest.x[0] ?? 0) + widthOf(longest) * 0.7);
  return { frequencyHz: longest.x[index] ?? 0, level: longest.y[index] ?? 0 };
}

function widthOf({ x }: Points): number {
  return (x[x.length - 1] ?? 0) - (x[0] ?? 0);
}

function harmItems(view: SamplingView, source: SourceView, shapes: readonly Shape[]): Item[] {
  const { limitDb, limitSums } = view;
  if (limitDb === null || limitSums) return [];
  const over = shapes.flatMap((shape) =>
    shape.kind === 'curve' ? view.protect.flatMap((range) => overLimit(shape.points, () => limitDb, range)) : [],
  );
  const lines = shapes.flatMap((shape) =>
    shape.kind === 'stem' && shape.top > limitDb && view.protect.some((range) => holds(range, shape.frequencyHz)) ? [shape] : [],
  );
  if (over.length === 0 && lines.length === 0) return [];
  const where = [
    ...over.map(({ upper }) => stretchWords(upper.x[0] ?? 0, upper.x.at(-1) ?? 0)),
    ...lines.map(({ frequencyHz }) => stretchWords(frequencyHz, frequencyHz)),
  ];
  return [
    item({
      id: `harm-${source.index}`,
      series: sourceSeries(source.index),
      pane: outputPane,
      role: 'harm',
      name: `${source.source.name}, over the limit`,
      words: sentences(
        `${source.source.name} is over the alias limit at ${where.slice(0, mostPlaces).join(' and ')}${where.length > mostPlaces ? ` and ${where.length - mostPlaces} more` : ''}`,
      ),
      place: view.subject.placeOf(['unwanted', source.index]),
      joins: [`landing-${source.index}`, `source-${source.index}`, `arrives-${source.index}`],
      shapes: [...over.map(({ upper, lower }): Shape => ({ kind: 'area', upper, lower, tone: 'solid' })), ...lines],
    }),
  ];
}

/** How many places that are over the limit are told in words. */
const mostPlaces = 4;

function holds({ low, high }: Enclosure, frequencyHz: number): boolean {
  return low <= frequencyHz && frequencyHz <= high;
}

function limitItems(view: SamplingView): Item[] {
  const { limitDb, subject } = view;
  const figure = limitFigure(subject, 'alias');
  if (limitDb === null || figure === null) return [];
  const text = `${view.limitSums ? 'limit of all aliases together' : 'alias limit'} ${levelWords(figure.at, figure.unit)}`;
  const shapes = view.protect.map((range): Shape => ({
    kind: 'curve',
    points: flat(range.low, range.high, limitDb),
    stroke: 'solid',
    weight: 'bold',
  }));
  const [first] = view.protect;
  return [
    item({
      id: 'limit-alias',
      series: 'limit-alias',
      pane: outputPane,
      role: 'limit',
      name: 'alias limit',
      words: sentences(`${text} over ${rangeWords(view.protect)}, ${marginWords(figure)}`),
      place: subject.placeOf(['limits', 'alias']),
      shapes,
      label: {
        text,
        frequencyHz: first === undefined ? 0 : first.low + (first.high - first.low) * 0.25,
        level: limitDb,
        prefer: 'above',
        priority: 9,
      },
    }),
  ];
}

function rangeWords(ranges: readonly Enclosure[]): string {
  return ranges.map((range) => stretchWords(range.low, range.high)).join(' and ');
}

function noiseItems(view: SamplingView): Item[] {
  const { total, quantisation } = view.subject.figures.noise;
  if (total === null || !Number.isFinite(total)) return [];
  const text = `all noise in the wanted band ${levelWords(total)}`;
  const bands = view.subject.figures.wanted;
  const widthHz = bands.reduce((sum, band) => sum + band.appearsHigh - band.appearsLow, 0);
  const middle = bands[0] === undefined ? 0 : bands[0].appearsLow + (bands[0].appearsHigh - bands[0].appearsLow) * 0.3;
  return [
    item({
      id: 'noise',
      series: 'noise',
      pane: outputPane,
      role: 'noise',
      name: 'all noise in the wanted band',
      words: sentences(
        text,
        `That is ${levelWords(total - 10 * Math.log10(widthHz), 'dBFS/√Hz')} over ${stretchWords(widthHz, widthHz)}`,
        quantisation === null ? '' : `Quantisation alone ${levelWords(quantisation)}`,
      ),
      place: view.subject.placeOf(['bits']),
      shapes: bands.map((band): Shape => ({
        kind: 'curve',
        points: flat(band.appearsLow, band.appearsHigh, total),
        stroke: 'dotted',
        weight: 'bold',
      })),
      label: { text, frequencyHz: middle, level: total, prefer: 'below', priority: 6 },
    }),
  ];
}

function markItems(view: SamplingView, alias: AliasFigure): Item[] {
  const { level, lands, frequency } = alias;
  if (level === null || lands === null || frequency === null || !Number.isFinite(level)) return [];
  const over = alias.margin !== null && alias.margin < -1e-9;
  const isWorst = view.subject.figures.alias?.index === alias.index;
  const text = `${levelWords(level)} at ${stretchWords(lands, lands)}`;
  return [
    item({
      id: `worst-${alias.index}`,
      series: sourceSeries(alias.index),
      pane: outputPane,
      role: over ? 'harm' : 'landing',
      name: `strongest landing of ${alias.source}`,
      words: sentences(
        `${alias.source}${alias.harmonic > 1 ? `, harmonic ${alias.harmonic},` : ''} at ${stretchWords(frequency, frequency)} lands on ${text.replace(/^(.*) at (.*)$/, '$2 at $1')}${alias.inverted === true ? ', inverted' : ''}`,
        marginOf(alias),
      ),
      place: view.subject.placeOf(['unwanted', alias.index]),
      joins: [`landing-${alias.index}`, `source-${alias.index}`, `arrives-${alias.index}`],
      shapes: [{ kind: 'mark', frequencyHz: lands, level, mark: over ? 'over' : 'inside' }],
      label:
        over || isWorst ? { text, frequencyHz: lands, level, prefer: over ? 'right' : 'above', priority: over ? 10 : 8 } : null,
    }),
  ];
}

function marginOf({ margin }: AliasFigure): string {
  if (margin === null || !Number.isFinite(margin)) return '';
  return margin < 0 ? `${levelWords(-margin, 'dB')} over the limit` : `${levelWords(margin, 'dB')} inside the limit`;
}
