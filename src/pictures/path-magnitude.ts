/** The whole path over all that matters: the total, every stage, aperture or hold, and the tolerances' envelope. */
import { gainDb, hasPulse, lossDb, pulseNulls, worstPath } from '../analysis';
import type { Response } from '../analysis';
import { partsVary } from '../analysis/tolerances';
import type { FrequencyAxis, Item, LevelAxis, Plot, Points, Stroke } from '../protocol/picture';
import { stagePath } from '../spec';
import { formatFrequency } from '../units/format';
import { frequencyAxis } from './axes';
import { item, joinedBothWays, seriesOf } from './items';
import { axisWith, boundsWithin, farthestOf, maskItems, maskNames, masksOf } from './mask-items';
import { sampleCurve } from './sample-curve';
import { filterPlace, pulseKey } from './subject';
import type { Subject } from './subject';
import { levelWords, sentences } from './words';

/** The plot's only pane. */
export const magnitudePane = 'magnitude';

/** The plot. */
export function magnitudePlot(subject: Subject): Plot {
  const x = wholePathAxis(subject);
  const y = levelsOf(subject, x);
  const shifts = shiftsOf(subject);
  const masks = masksOf(subject, 'response', 'through');
  const draw = (response: Response): Points =>
    sampleCurve((f) => gainDb(response, f), {
      lowHz: x.lowHz,
      highHz: x.highHz,
      through: pulseNulls(subject.channel.pulse, subject.channel.rate.hz, 12),
      floor: y.low,
      tolerance: (y.high - y.low) / 3000,
    });
  const items = joinedBothWays([
    ...masks.flatMap((mask) => maskItems(subject, mask, { pane: magnitudePane, x, shiftDb: shifts[mask.key], joins: ['total'] })),
    ...envelopeItems(subject, draw),
    ...stageItems(subject, draw, x),
    ...pulseItems(subject, draw),
    ...filtersItem(subject, draw),
    totalItem(subject, draw),
    halfRateItem(subject, y),
  ]);
  return {
    id: 'magnitude',
    title: 'Magnitude',
    words: sentences(
      `Gain of ${subject.path.stages.length === 1 ? 'one stage' : `${subject.path.stages.length} stages`} and of all together`,
      `${levelWords(-lossAtHalfRate(subject), 'dB')} at half the rate`,
    ),
    shown: 'always',
    panes: [{ id: magnitudePane, x, y }],
    series: seriesOf(
      [...items].sort((a, b) => rankOf(a) - rankOf(b)),
      new Map(maskNames(masks)),
    ),
    items,
    table: tableOf(subject),
  };
}

/** The axis of everything that is drawn of the whole path. */
export function wholePathAxis(subject: Subject): FrequencyAxis {
  const { channel } = subject;
  const lows = channel.wanted.map((band) => band.lowHz).filter((f) => f > 0);
  const masked = masksOf(subject, 'response', 'through').map((mask) => 1.2 * farthestOf(mask));
  const high = Math.max(10 * channel.rate.hz, ...channel.wanted.map((band) => 4 * band.highHz), ...masked);
  // A band above half the rate is far from 0 Hz, where nothing happens.
  const lowest = channel.wanted.every((band) => band.lowHz > channel.rate.hz / 2) ? channel.rate.hz / 4 : high / 1e4;
  const axis = frequencyAxis('Hz', Math.min(...lows, lowest), high);
  return { ...axis, lowHz: 0 };
}

function levelsOf(subject: Subject, x: FrequencyAxis): LevelAxis {
  const { path, nominal } = subject;
  const shown = [path.total.logGain(0), path.total.logGain(x.logLowHz), nominal.logGain(x.logLowHz)].filter((value) =>
    Number.isFinite(value),
  );
  const top = Math.max(0, ...shown.map((value) => (value * 20) / Math.LN10));
  const end = gainDb(path.analogue, x.highHz);
  const low = Math.max(-140, Math.min(-60, 20 * Math.floor((Number.isFinite(end) ? end : -140) / 20)));
  const plain: LevelAxis = { title: 'dB, the whole path', unit: 'dB', low, high: 10 * Math.ceil((top + 3) / 10) };
  const shifts = shiftsOf(subject);
  return masksOf(subject, 'response', 'through').reduce(
    (axis, mask) => axisWith(axis, [boundsWithin(mask, x)], shifts[mask.key]),
    plain,
  );
}

/** A mask counts from the gain at `reference`, of the filters alone or of the whole; the plot counts from a gain of 1. */
function shiftsOf({ path, channel }: Subject): Readonly<Record<'response' | 'through' | 'output', number>> {
  const at = (response: Response): number => finite(gainDb(response, channel.referenceHz)) ?? 0;
  return { response: at(path.analogue), through: at(path.total), output: 0 };
}

/** What a `response` mask speaks of, where the pulse sets it apart from the total. */
function filtersItem(subject: Subject, draw: (response: Response) => Points): Item[] {
  const { channel, path } = subject;
  const same = channel.pulse.shape === 'instant' && channel.gate === null;
  if (same || path.stages.length === 0 || masksOf(subject, 'response').length === 0) return [];
  return [
    item({
      id: 'filters',
      series: 'filters',
      pane: magnitudePane,
      role: 'path',
      name: 'filters alone',
      words: sentences(`Gain of all stages without the ${pulseKey(channel)}, which is what the response mask speaks of`),
      place: filterPlace(subject),
      shapes: [{ kind: 'curve', points: draw(path.analogue), stroke: 'long-dash', weight: 'bold' }],
    }),
  ];
}

function totalItem(subject: Subject, draw: (response: Response) => Points): Item {
  const points = draw(subject.path.total);
  return item({
    id: 'total',
    series: 'total',
    pane: magnitudePane,
    role: 'total',
    name: 'total',
    words: sentences(`Gain of the whole path, ${pulseKey(subject.channel)} included, at nominal values`),
    place: filterPlace(subject),
    shapes: [{ kind: 'curve', points, stroke: 'solid', weight: 'bold' }],
  });
}

const strokes: readonly Stroke[] = ['dashed', 'dash-dot', 'long-dash', 'dotted'];

function stageItems(subject: Subject, draw: (response: Response) => Points, x: FrequencyAxis): Item[] {
  if (subject.path.stages.length < 2) return [];
  return subject.path.stages.map(({ response }, index) => {
    const points = draw(response);
    const falls = points.x.findIndex((f, at) => f > x.logLowHz && (points.y[at] ?? 0) < (points.y[0] ?? 0) - 12);
    const name = stageName(subject, index);
    const at = falls === -1 ? points.x.length - 1 : falls;
    return item({
      id: `stage-${index}`,
      series: `stage-${index}`,
      pane: magnitudePane,
      role: 'stage',
      name,
      words: sentences(`Gain of ${name} alone`),
      place: subject.placeOf(stagePath(subject.channel, index)),
      shapes: [{ kind: 'curve', points, stroke: strokes[index % strokes.length] ?? 'dashed', weight: 'thin' }],
      label: { text: name, frequencyHz: points.x[at] ?? 0, level: points.y[at] ?? 0, prefer: 'right', priority: 5 },
    });
  });
}

/** Its own name or label; where one filter stands on both sides of a relay, with the side. */
function stageName({ path, channel }: Subject, index: number): string {
  const label = path.stages[index]?.stage.label ?? '';
  const twice = path.stages.some(({ stage }, other) => other !== index && stage.label === label);
  if (!twice || channel.direction !== 'relay') return label;
  return `${label}, ${index < channel.inputStages.length ? 'input' : 'output'} side`;
}

function pulseItems(subject: Subject, draw: (response: Response) => Points): Item[] {
  const { channel } = subject;
  if (!hasPulse(channel)) return [];
  const name = pulseKey(channel);
  return [
    item({
      id: 'pulse',
      series: 'pulse',
      pane: magnitudePane,
      role: 'pulse',
      name,
      words: sentences(
        name === 'gate'
          ? 'What the gate leaves of the wanted path'
          : `Gain of the ${name} alone, at the ${name === 'aperture' ? 'input' : 'output'} frequency`,
      ),
      place: subject.placeOf([name]),
      shapes: [{ kind: 'curve', points: draw(subject.path.pulse), stroke: 'dotted', weight: 'thin' }],
    }),
  ];
}

function envelopeItems(subject: Subject, draw: (response: Response) => Points): Item[] {
  if (!partsVary(subject.channel)) return [];
  const at = (sense: 'largest' | 'smallest'): Points =>
    draw(worstPath(subject.path, { sense, referenceHz: null, axis: 'hertz' }).response);
  return [
    item({
      id: 'envelope',
      series: 'envelope',
      pane: magnitudePane,
      role: 'envelope',
      name: 'worst of the tolerances',
      words: sentences('Between the largest and the smallest gain that the tolerances allow'),
      place: filterPlace(subject),
      joins: ['total'],
      shapes: [{ kind: 'area', upper: at('largest'), lower: at('smallest'), tone: 'solid' }],
    }),
  ];
}

function halfRateItem(subject: Subject, y: LevelAxis): Item {
  const { halfRate } = subject.figures;
  const text = `half the rate, ${formatFrequency(halfRate)}`;
  return item({
    id: 'half-rate',
    series: 'half-rate',
    pane: magnitudePane,
    role: 'rule',
    name: 'half the rate',
    words: sentences(
      `Half the rate is ${formatFrequency(halfRate)}`,
      `The path has ${levelWords(-lossAtHalfRate(subject), 'dB')} there`,
    ),
    place: subject.placeOf(['rate']),
    shapes: [{ kind: 'rule', frequencyHz: halfRate }],
    label: { text, frequencyHz: halfRate, level: y.low + (y.high - y.low) * 0.1, prefer: 'left', priority: 6 },
  });
}

function lossAtHalfRate({ path, figures, channel }: Subject): number {
  return lossDb(path.total, figures.halfRate, channel.referenceHz);
}

/** The legend: the total first. */
function rankOf({ id }: Item): number {
  return ['total', 'envelope'].indexOf(id) === -1 ? 2 : ['total', 'envelope'].indexOf(id);
}

function tableOf(subject: Subject): Plot['table'] {
  const { channel, figures, path } = subject;
  const rate = channel.rate.hz;
  const edges = channel.wanted.flatMap((band) => [band.lowHz, band.highHz]);
  const points = [...new Set([...edges, channel.referenceHz, figures.halfRate, rate, 2 * rate])].sort((a, b) => a - b);
  const stages = path.stages.map((_, index) => ({ title: stageName(subject, index), unit: 'dB' as const }));
  return {
    caption: `${channel.name}: gain of the path at nominal values`,
    columns: [{ title: 'at', unit: 'Hz' }, { title: 'total', unit: 'dB' }, { title: pulseKey(channel), unit: 'dB' }, ...stages],
    rows: points.map((f) => ({
      item: 'total',
      cells: [
        f,
        ...[path.total, path.pulse, ...path.stages.map(({ response }) => response)].map((response) =>
          finite(gainDb(response, f)),
        ),
      ],
    })),
  };
}

function finite(value: number): number | null {
  return Number.isFinite(value) ? value : null;
}
