/** Masks as shaded forbidden ground: one item a segment, which leads to its line, and a mark where it is met or passed furthest. */
import type { MaskFigure } from '../analysis/figures';
import type { FrequencyAxis, Item, LevelAxis, Points, Shape } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import type { MaskEdge, MaskLimit, MaskSegment } from '../spec/channel';
import { formatDb, formatFrequency } from '../units/format';
import { item } from './items';
import { sampleCurve } from './sample-curve';
import type { Subject } from './subject';
import { sentences, stretchWords } from './words';

/** Where masks are drawn. */
export interface MaskPane {
  readonly pane: string;
  readonly x: FrequencyAxis;
  /** What the pane's 0 dB lies below that of the mask, dB: a mask counts from the gain at `reference`, a magnitude from 1. */
  readonly shiftDb: number;
  /** Which series is lit with a segment. */
  readonly joins: readonly string[];
}

/** The masks of a kind that the channel states. */
export function masksOf({ channel }: Subject, ...keys: readonly MaskLimit['key'][]): readonly MaskLimit[] {
  return channel.masks.filter(({ key }) => keys.includes(key));
}

/** What the legend calls the masks, by their series. */
export function maskNames(masks: readonly MaskLimit[]): [string, string][] {
  return masks.map((mask) => [`mask-${mask.key}`, nameOf(mask)]);
}

/** All segments of a mask that lie on the pane, with the mask's worst point. */
export function maskItems(subject: Subject, mask: MaskLimit, pane: MaskPane): Item[] {
  const shown = mask.segments.flatMap((segment, index) => {
    const shapes = segmentShapes(segment, pane);
    return shapes.length === 0 ? [] : [segmentItem(subject, mask, index, shapes, pane)];
  });
  return [...labelled(shown, mask, pane), ...markItems(subject, mask, pane)];
}

/** The lowest and highest bound of a mask over an axis, for a level axis that shows it; null where none lies on it. */
export function boundsWithin({ segments }: MaskLimit, x: FrequencyAxis): { readonly low: number; readonly high: number } | null {
  const bounds = segments.flatMap((segment) =>
    segment.lowHz >= x.highHz ? [] : edgesOf(segment).flatMap(({ fromDb, toDb }) => [fromDb, toDb]),
  );
  return bounds.length === 0 ? null : { low: Math.min(...bounds), high: Math.max(...bounds) };
}

/** A level axis grown so that the bounds of masks stand on it with some room. */
export function axisWith(
  axis: LevelAxis,
  bounds: readonly ({ readonly low: number; readonly high: number } | null)[],
  shiftDb: number,
): LevelAxis {
  return bounds.reduce<LevelAxis>((grown, bound) => {
    if (bound === null) return grown;
    const [low, high] = [bound.low + shiftDb - 15, bound.high + shiftDb + 5];
    return {
      ...grown,
      low: Math.max(-260, Math.min(grown.low, 10 * Math.floor(low / 10))),
      high: Math.max(grown.high, 10 * Math.ceil(high / 10) + 0),
    };
  }, axis);
}

/** The highest frequency that a mask speaks of, with some room for an endless segment. */
export function farthestOf({ segments }: MaskLimit): number {
  return Math.max(0, ...segments.map(({ lowHz, highHz }) => (Number.isFinite(highHz) ? highHz : 2 * lowHz)));
}

/** Where a segment stands in the spec: in the limit itself, in its `at`, or in the mask that it names. */
function placeOfSegment({ placeOf }: Subject, { key }: MaskLimit, index: number): PlaceName | null {
  const long = placeOf(['limits', key, 'at', index]);
  return long?.path.length === 4 ? long : placeOf(['limits', key, index]);
}

function edgesOf({ lower, upper }: MaskSegment): readonly MaskEdge[] {
  return [lower, upper].flatMap((edge) => edge ?? []);
}

function segmentShapes(segment: MaskSegment, { x, shiftDb }: MaskPane): Shape[] {
  const highHz = Math.min(segment.highHz, x.highHz);
  if (segment.lowHz >= highHz) return [];
  const boundary = (edge: MaskEdge): Points =>
    sampleCurve((f) => boundAt(segment, edge, f) + shiftDb, {
      lowHz: segment.lowHz,
      highHz,
      through: [],
      floor: -Infinity,
      tolerance: 0.02,
    });
  const { lower, upper } = segment;
  return [
    ...(upper === null ? [] : [{ kind: 'forbidden', boundary: boundary(upper), side: 'above' } as const]),
    ...(lower === null ? [] : [{ kind: 'forbidden', boundary: boundary(lower), side: 'below' } as const]),
  ];
}

/** The bound at a frequency of the segment, straight in its own way along. */
function boundAt({ lowHz, highHz, along }: MaskSegment, { fromDb, toDb }: MaskEdge, f: number): number {
  if (fromDb === toDb || !Number.isFinite(highHz)) return fromDb;
  const share = along === 'log' ? Math.log(f / lowHz) / Math.log(highHz / lowHz) : (f - lowHz) / (highHz - lowHz);
  return fromDb + share * (toDb - fromDb);
}

function segmentItem(
  subject: Subject,
  mask: MaskLimit,
  index: number,
  shapes: readonly Shape[],
  { pane, joins }: MaskPane,
): Item {
  const segment = mask.segments[index];
  const figure = figureOf(subject, mask, index);
  const unit = unitOf(mask);
  const standing =
    figure === null
      ? 'Nothing comes near it'
      : `Nearest at ${formatFrequency(figure.frequency)}: ${formatDb(figure.value, unit, 2)} against ${formatDb(figure.bound, unit, 2)}, ${insideWords(figure)}`;
  return item({
    id: `${pane}-mask-${mask.key}-${index}`,
    series: `mask-${mask.key}`,
    pane,
    role: 'limit',
    name: `${mask.key} mask, segment ${index + 1}`,
    words: sentences(segment === undefined ? '' : `${nameOf(mask)}: ${segmentWords(segment, unit)}`, standing),
    place: placeOfSegment(subject, mask, index),
    joins,
    shapes,
  });
}

/** The name stands once, on the segment that reaches lowest, where the most room is above. */
function labelled(items: readonly Item[], mask: MaskLimit, { x }: MaskPane): Item[] {
  const [named] = [...items].sort((a, b) => lowestOf(a) - lowestOf(b));
  return items.map((one) => {
    const boundary = one === named ? boundaryOf(one) : null;
    if (boundary === null) return one;
    const low = Math.max(boundary.x[0] ?? 0, x.logLowHz);
    const high = boundary.x.at(-1) ?? low;
    const frequencyHz = x.scale === 'log' ? Math.sqrt(low * high) : (low + high) / 2;
    const at = boundary.x.findIndex((f) => f >= frequencyHz);
    const level = boundary.y[at] ?? 0;
    return { ...one, label: { text: nameOf(mask), frequencyHz, level, prefer: 'above' as const, priority: 8 } };
  });
}

function boundaryOf({ shapes }: Item): Points | null {
  const [shape] = shapes;
  return shape?.kind === 'forbidden' ? shape.boundary : null;
}

function lowestOf(one: Item): number {
  return Math.min(...(boundaryOf(one)?.y ?? [Infinity]));
}

/** The worst point of the whole mask. */
function markItems(subject: Subject, mask: MaskLimit, { pane, x, shiftDb }: MaskPane): Item[] {
  const figures = subject.figures.masks.filter(({ limit }) => limit === mask.key);
  const [worst] = [...figures].sort((a, b) => a.margin - b.margin);
  if (worst === undefined || !Number.isFinite(worst.value) || worst.frequency > x.highHz) return [];
  const over = worst.margin < -1e-9;
  const text = `${insideWords(worst)} at ${formatFrequency(worst.frequency)}`;
  const level = worst.value + shiftDb;
  return [
    item({
      id: `${pane}-mask-${mask.key}-worst`,
      series: `mask-${mask.key}`,
      pane,
      role: over ? 'harm' : 'limit',
      name: `${mask.key} mask, worst point`,
      words: sentences(`${nameOf(mask)} is ${over ? 'passed' : 'met'}: ${formatDb(worst.value, unitOf(mask), 2)}, ${text}`),
      place: placeOfSegment(subject, mask, worst.segment),
      joins: [`${pane}-mask-${mask.key}-${worst.segment}`],
      shapes: [{ kind: 'mark', frequencyHz: worst.frequency, level, mark: over ? 'over' : 'inside' }],
      label: { text, frequencyHz: worst.frequency, level, prefer: 'right', priority: over ? 10 : 6 },
    }),
  ];
}

function figureOf({ figures }: Subject, { key }: MaskLimit, index: number): MaskFigure | null {
  return figures.masks.find(({ limit, segment }) => limit === key && segment === index) ?? null;
}

function unitOf({ key }: MaskLimit): 'dB' | 'dBFS' {
  return key === 'output' ? 'dBFS' : 'dB';
}

function nameOf({ key, mask }: MaskLimit): string {
  return mask === null ? `${key} mask` : `${key} mask ${mask}`;
}

function insideWords({ margin }: MaskFigure): string {
  return `${formatDb(Math.abs(margin), 'dB', 2)} ${margin < -1e-9 ? 'outside' : 'inside'}`;
}

function segmentWords({ lowHz, highHz, lower, upper }: MaskSegment, unit: string): string {
  const bounds = [
    upper === null ? null : `not above ${edgeWords(upper, unit)}`,
    lower === null ? null : `not below ${edgeWords(lower, unit)}`,
  ].filter((part) => part !== null);
  return `${stretchWords(lowHz, highHz)}, ${bounds.join(' and ')}`;
}

function edgeWords({ fromDb, toDb }: MaskEdge, unit: string): string {
  return fromDb === toDb ? formatDb(fromDb, unit, 2) : `${formatDb(fromDb, unit, 2)} sloping to ${formatDb(toDb, unit, 2)}`;
}
