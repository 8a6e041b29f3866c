/** The wanted band in tenths of a dB against the reference: nominal, the tolerances' envelope, and the flatness limit as forbidden ground. */
import { gainDb, pulseNulls, relativeTo, worstPath } from '../analysis';
import type { LimitFigure, Response } from '../analysis';
import { flatnessOf } from '../analysis/flatness';
import { partsVary } from '../analysis/tolerances';
import { worstWords } from '../findings/wording';
import type { MaskLimit } from '../spec/channel';
import type { FrequencyAxis, Item, LevelAxis, Plot, Points, Shape } from '../protocol/picture';
import { formatDb, formatFrequency } from '../units/format';
import { frequencyAxis } from './axes';
import { flat, item, joinedBothWays, seriesOf } from './items';
import { boundsWithin, maskItems, maskNames, masksOf } from './mask-items';
import { sampleCurve } from './sample-curve';
import { filterPlace, limitFigure, pulseKey } from './subject';
import type { Subject } from './subject';
import { marginWords, sentences, stretchWords } from './words';

/** The plot's only pane. */
export const closeUpPane = 'close-up';

/** The curves that the plot is made of. */
interface Curves {
  readonly nominal: Points;
  readonly largest: Points | null;
  readonly smallest: Points | null;
}

/** The plot. */
export function closeUpPlot(subject: Subject): Plot {
  const limit = limitFigure(subject, 'flatness');
  const x = bandAxis(subject);
  const rough = limit?.at ?? 1;
  const curves = curvesOf(subject, x, rough / 400, -3 * rough - 3);
  const y = maskedAxis(levelAxisOf(curves, limit, subject), subject, x);
  const items = joinedBothWays([
    ...closeUpMasks(subject).flatMap((mask) =>
      maskItems(subject, mask, { pane: closeUpPane, x, shiftDb: 0, joins: ['close-up-total'] }),
    ),
    ...limitItems(subject, limit),
    ...curveItems(subject, curves),
    ...edgeItems(subject),
    ...markItems(subject, limit),
  ]);
  return {
    id: 'close-up',
    title: 'Wanted band, close up',
    words: sentences(
      `Gain in the wanted band against ${formatFrequency(subject.channel.referenceHz)}, ${pulseKey(subject.channel)} and filter together`,
      limit === null ? '' : `The flatness limit of ${formatDb(limit.at, 'dB', 2)} is shaded as forbidden, ${marginWords(limit)}`,
    ),
    shown: 'always',
    panes: [{ id: closeUpPane, x, y }],
    series: seriesOf(items, new Map(maskNames(closeUpMasks(subject)))),
    items,
    table: tableOf(subject, limit),
  };
}

function bandAxis({ channel }: Subject): FrequencyAxis {
  const high = Math.max(...channel.wanted.map((band) => band.highHz));
  const low = Math.min(...channel.wanted.map((band) => band.lowHz));
  // A band far above 0 Hz has room to both sides; the others begin where they begin.
  if (low > high / 4) return frequencyAxis('Hz', low - (high - low) / 4, high + (high - low) / 4);
  const lowest = low > 0 ? low : Math.min(high / 1000, channel.referenceHz > 0 ? channel.referenceHz : high);
  return frequencyAxis('Hz', lowest, high * 1.3);
}

function curvesOf(subject: Subject, x: FrequencyAxis, tolerance: number, floor: number): Curves {
  const { channel, path } = subject;
  const referenceHz = channel.referenceHz;
  const edges = channel.wanted.flatMap((band) => [band.lowHz, band.highHz]);
  const worst = limitFigure(subject, 'flatness')?.where?.frequency;
  const through = [
    ...edges,
    referenceHz,
    ...(worst === undefined ? [] : [worst]),
    ...pulseNulls(channel.pulse, channel.rate.hz, 4),
  ];
  const curve = (response: Response): Points =>
    sampleCurve((f) => gainDb(response, f), { lowHz: x.lowHz, highHz: x.highHz, through, floor, tolerance });
  const extreme = (sense: 'largest' | 'smallest'): Points | null =>
    partsVary(channel) ? curve(worstPath(path, { sense, referenceHz, axis: 'hertz' }).response) : null;
  return { nominal: curve(relativeTo(path.total, referenceHz)), largest: extreme('largest'), smallest: extreme('smallest') };
}

function levelAxisOf(curves: Curves, limit: LimitFigure | null, { channel }: Subject): LevelAxis {
  const title = `dB against ${formatFrequency(channel.referenceHz)}, the wanted band close up`;
  if (limit !== null && limit.at > 0)
    return { title, unit: 'dB', low: -1.5 * Math.max(limit.at, Math.min(4 * limit.at, limit.value ?? 0)), high: 1.3 * limit.at };
  const inBand = [curves.nominal, curves.largest ?? curves.nominal, curves.smallest ?? curves.nominal].flatMap(({ x, y }) =>
    y.filter((_, index) => channel.wanted.some((band) => (x[index] ?? -1) >= band.lowHz && (x[index] ?? -1) <= band.highHz)),
  );
  const [low, high] = [Math.max(-40, Math.min(...inBand, 0)), Math.min(40, Math.max(...inBand, 0))];
  const room = Math.max(0.1, (high - low) * 0.25);
  return { title, unit: 'dB', low: low - room, high: high + room };
}

/** Those that speak of what is drawn; a `response` mask leaves a pulse out that leans across the band. */
function closeUpMasks(subject: Subject): readonly MaskLimit[] {
  const { pulse, gate } = subject.channel;
  const leans = pulse.shape !== 'instant' || gate?.kind === 'track';
  return leans ? masksOf(subject, 'through') : masksOf(subject, 'response', 'through');
}

/** Room for the bounds of masks, as far as a close-up can show them. */
function maskedAxis(axis: LevelAxis, subject: Subject, x: FrequencyAxis): LevelAxis {
  const bounds = closeUpMasks(subject)
    .flatMap((mask) => boundsWithin(mask, x) ?? [])
    .flatMap(({ low, high }) => [low, high])
    .filter((bound) => Math.abs(bound) <= farthestBoundDb);
  return {
    ...axis,
    low: Math.min(axis.low, ...bounds.map((bound) => 1.3 * bound)),
    high: Math.max(axis.high, ...bounds.map((bound) => 1.3 * bound)),
  };
}

/** Bounds further from 0 dB than this belong to the stop band. */
const farthestBoundDb = 6;

function limitItems(subject: Subject, limit: LimitFigure | null): Item[] {
  if (limit === null) return [];
  const text = `flatness limit ± ${formatDb(limit.at, 'dB', 2)}`;
  const bands = subject.channel.wanted;
  const shapes = bands.flatMap((band): Shape[] => [
    { kind: 'forbidden', boundary: flat(band.lowHz, band.highHz, limit.at), side: 'above' },
    { kind: 'forbidden', boundary: flat(band.lowHz, band.highHz, -limit.at), side: 'below' },
  ]);
  const { low, high } = {
    low: Math.min(...bands.map((band) => band.lowHz)),
    high: Math.max(...bands.map((band) => band.highHz)),
  };
  return [
    item({
      id: 'limit-flatness',
      series: 'limit-flatness',
      pane: closeUpPane,
      role: 'limit',
      name: 'flatness limit',
      words: sentences(`${text} in the wanted band, ${marginWords(limit)}`),
      place: subject.placeOf(['limits', 'flatness']),
      shapes,
      label: {
        text,
        frequencyHz: low > 0 ? low * (high / low) ** 0.2 : high * 0.15,
        level: -limit.at,
        prefer: 'below',
        priority: 9,
      },
    }),
  ];
}

function curveItems(subject: Subject, { nominal, largest, smallest }: Curves): Item[] {
  const place = filterPlace(subject);
  const common = { pane: closeUpPane, place } as const;
  const total = item({
    ...common,
    id: 'close-up-total',
    series: 'close-up-total',
    role: 'total',
    name: 'nominal',
    words: sentences('End-to-end gain at nominal values'),
    shapes: [{ kind: 'curve', points: nominal, stroke: 'solid', weight: 'bold' }],
    joins: ['close-up-envelope'],
  });
  if (largest === null || smallest === null) return [total];
  const envelope = item({
    ...common,
    id: 'close-up-envelope',
    series: 'close-up-envelope',
    role: 'envelope',
    name: 'worst of the tolerances',
    words: sentences('Between the largest and the smallest gain that the tolerances allow'),
    shapes: [
      { kind: 'area', upper: largest, lower: smallest, tone: 'pale' },
      { kind: 'curve', points: smallest, stroke: 'dashed', weight: 'thin' },
      { kind: 'curve', points: largest, stroke: 'dashed', weight: 'thin' },
    ],
  });
  return [envelope, total];
}

function edgeItems({ channel, placeOf }: Subject): Item[] {
  return channel.wanted.map((band, index) =>
    item({
      id: `edge-${index}`,
      series: 'edges',
      pane: closeUpPane,
      role: 'rule',
      name: 'edges of the wanted band',
      words: sentences(`The wanted band runs ${stretchWords(band.lowHz, band.highHz)}`),
      place: placeOf(['wanted', index]),
      shapes: [
        { kind: 'rule', frequencyHz: band.highHz },
        { kind: 'rule', frequencyHz: band.lowHz },
      ],
    }),
  );
}

function markItems(subject: Subject, limit: LimitFigure | null): Item[] {
  const flatness = flatnessOf(subject.channel, subject.path);
  if (flatness === null || !Number.isFinite(flatness.frequencyHz)) return [];
  const level = signedAt(subject, flatness.frequencyHz, flatness.valueDb);
  const corner = worstWords(flatness.worstAt);
  const text = `${formatDb(level, 'dB', 2)} at ${formatFrequency(flatness.frequencyHz)}${corner === null ? '' : `, ${corner}`}`;
  const over = limit !== null && limit.judged && !limit.passes;
  return [
    item({
      id: 'worst-flatness',
      series: 'close-up-total',
      pane: closeUpPane,
      role: over ? 'harm' : 'total',
      name: 'largest departure',
      words: sentences(`Largest departure: ${text}`, limit === null ? '' : marginWords(limit)),
      place: limit === null ? filterPlace(subject) : subject.placeOf(['limits', 'flatness']),
      joins: ['close-up-total', 'close-up-envelope'],
      shapes: [{ kind: 'mark', frequencyHz: flatness.frequencyHz, level, mark: over ? 'over' : 'inside' }],
      label: { text, frequencyHz: flatness.frequencyHz, level, prefer: 'left', priority: 10 },
    }),
  ];
}

/** A departure is a rise or a loss: whichever extreme of the tolerances it belongs to. */
function signedAt({ channel, path }: Subject, frequencyHz: number, departureDb: number): number {
  const at = (sense: 'largest' | 'smallest'): number =>
    gainDb(worstPath(path, { sense, referenceHz: channel.referenceHz, axis: 'hertz' }).response, frequencyHz);
  const isLoss = Math.abs(-at('smallest') - departureDb) <= Math.abs(at('largest') - departureDb);
  // Never −0, which JSON cannot carry.
  return isLoss && departureDb > 0 ? -departureDb : departureDb;
}

function tableOf(subject: Subject, limit: LimitFigure | null): Plot['table'] {
  const { channel, path } = subject;
  const points = [...new Set(channel.wanted.flatMap((band) => [band.lowHz, band.highHz]).concat(channel.referenceHz))].sort(
    (a, b) => a - b,
  );
  const gain = (sense: 'largest' | 'smallest', f: number): number =>
    gainDb(worstPath(path, { sense, referenceHz: channel.referenceHz, axis: 'hertz' }).response, f);
  const nominal = relativeTo(path.total, channel.referenceHz);
  return {
    caption: `${channel.name}: gain against ${formatFrequency(channel.referenceHz)}${limit === null ? '' : `, flatness limit ${formatDb(limit.at, 'dB', 2)}, ${marginWords(limit)}`}`,
    columns: [
      { title: 'at', unit: 'Hz' },
      { title: 'nominal', unit: 'dB' },
      { title: 'smallest', unit: 'dB' },
      { title: 'largest', unit: 'dB' },
    ],
    rows: points.map((f) => ({
      item: 'close-up-total',
      cells: [f, gainDb(nominal, f), gain('smallest', f), gain('largest', f)].map((cell) =>
        Number.isFinite(cell) ? cell : null,
      ),
    })),
  };
}
