/** Generate and relay: what leaves – the wanted bands and every copy, with the envelope of hold or gate, before and after the path, and the image limit or mask. */
import { gainDb } from '../analysis';
import type { Item, Plot, Points, Section, Table } from '../protocol/picture';
import { flat, item, joinedBothWays, seriesOf } from './items';
import { copiesUpTo } from './leaving-copies';
import { envelopeItems } from './leaving-envelopes';
import { copyItems, leavingPane } from './leaving-items';
import { maskItems, maskNames, masksOf } from './mask-items';
import { imageLimitAt, leavingView } from './leaving-view';
import type { LeavingView } from './leaving-view';
import { limitFigure, pulseKey } from './subject';
import type { Subject } from './subject';
import { answerWith, furtherWords, levelWords, marginWords, sentences, stretchWords, worstStanding } from './words';

/** The section. */
export function leavingSection(subject: Subject): Section {
  const limit = limitFigure(subject, 'image');
  const mask = limitFigure(subject, 'output');
  const stated = [limit, mask].flatMap((figure) => figure ?? []);
  const first = stated.find((figure) => figure.judged && !figure.passes) ?? stated[0];
  return {
    id: 'leaving',
    title: 'What leaves',
    answer: {
      text: `${answerWith(answerText(subject), subject.channel, limit).text}${furtherWords([mask])}`,
      standing: worstStanding(subject.channel, [limit, mask]),
    },
    place: subject.placeOf(first === undefined ? [pulseKey(subject.channel)] : ['limits', first.limit]),
    plots: [leavingPlot(leavingView(subject))],
  };
}

function answerText(subject: Subject): string {
  const { image } = subject.figures;
  if (image === null || !Number.isFinite(image.level)) return 'no copy leaves';
  return `worst image ${worstWords(subject)}`;
}

/** "−85.3 dBc at 440 kHz", in the limit's own unit. */
function worstWords(subject: Subject): string {
  const { image } = subject.figures;
  if (image === null) return '';
  const inDbfs = limitFigure(subject, 'image')?.unit === 'dBFS';
  return `${inDbfs ? levelWords(image.level) : levelWords(image.relative, 'dBc')} at ${stretchWords(image.frequency, image.frequency)}`;
}

function leavingPlot(view: LeavingView): Plot {
  const { subject } = view;
  const items = joinedBothWays([
    ...masksOf(subject, 'output').flatMap((mask) =>
      maskItems(subject, mask, { pane: leavingPane, x: view.output, shiftDb: 0, joins: [] }),
    ),
    ...copyItems(view),
    ...envelopeItems(view),
    ...limitItems(view),
    ...noiseItems(view),
    ...markItems(view),
  ]);
  const names = new Map<string, string>([['wanted', 'wanted'], ['copies', 'copies'], ...maskNames(masksOf(subject, 'output'))]);
  return {
    id: 'leaving',
    title: 'What leaves',
    words: sentences(
      `The wanted band and its copies about every multiple of the rate of ${stretchWords(subject.channel.rate.hz, subject.channel.rate.hz)}, pale as the ${pulseKey(subject.channel)} leaves them and solid as the path leaves them`,
      answerText(subject),
    ),
    shown: 'always',
    panes: [{ id: leavingPane, x: view.output, y: view.levels }],
    series: seriesOf(
      [...items].sort((a, b) => wantedFirst(a) - wantedFirst(b)),
      names,
    ),
    items,
    table: tableOf(view),
  };
}

function wantedFirst({ series }: Item): number {
  return series === 'wanted' ? 0 : 1;
}

function limitItems(view: LeavingView): Item[] {
  const { subject } = view;
  const figure = limitFigure(subject, 'image');
  if (figure === null) return [];
  const points = figure.unit === 'dBc' ? limitCurve(view) : flat(0, view.output.highHz, figure.at);
  const text = `image limit ${levelWords(figure.at, figure.unit)}`;
  const last = points.x.length - 1;
  return [
    item({
      id: 'limit-image',
      series: 'limit-image',
      pane: leavingPane,
      role: 'limit',
      name: 'image limit',
      words: sentences(text, figure.unit === 'dBc' ? 'It counts from the same tone where it is wanted' : '', marginWords(figure)),
      place: subject.placeOf(['limits', 'image']),
      shapes: [{ kind: 'curve', points, stroke: 'solid', weight: 'bold' }],
      label: { text, frequencyHz: view.output.highHz * 0.93, level: points.y[last] ?? 0, prefer: 'above', priority: 9 },
    }),
  ];
}

/** Exact over every copy, straight between them, level beyond. */
function limitCurve(view: LeavingView): Points {
  const copies = view.copies.filter((copy) => !copy.wanted).sort((a, b) => a.range.low - b.range.low);
  const points = copies.flatMap((copy) =>
    [0, 0.25, 0.5, 0.75, 1].map((share) => {
      const x = copy.range.low + share * (copy.range.high - copy.range.low);
      return { x, y: imageLimitAt(view, copy, x) ?? 0 };
    }),
  );
  const rising = points.filter((point, index) => point.x > (points[index - 1]?.x ?? -1));
  const [first, last] = [rising[0], rising[rising.length - 1]];
  if (first === undefined || last === undefined) return { x: [], y: [] };
  const halfRate = view.subject.figures.halfRate;
  const left = first.x > halfRate ? [{ x: halfRate, y: first.y }] : [];
  const right = last.x < view.output.highHz ? [{ x: view.output.highHz, y: last.y }] : [];
  const all = [...left, ...rising, ...right];
  return { x: all.map(({ x }) => x), y: all.map(({ y }) => y) };
}

function noiseItems({ subject }: LeavingView): Item[] {
  const { total } = subject.figures.noise;
  if (total === null || !Number.isFinite(total)) return [];
  const text = `all noise in the wanted band ${levelWords(total)}`;
  return [
    item({
      id: 'noise',
      series: 'noise',
      pane: leavingPane,
      role: 'noise',
      name: 'all noise in the wanted band',
      words: sentences(text),
      place: subject.placeOf(['bits']),
      shapes: subject.channel.wanted.map((band) => ({
        kind: 'curve',
        points: flat(band.lowHz, band.highHz, total),
        stroke: 'dotted',
        weight: 'bold',
      })),
    }),
  ];
}

function markItems(view: LeavingView): Item[] {
  const { image } = view.subject.figures;
  if (image === null || !Number.isFinite(image.level) || image.frequency > view.output.highHz) return [];
  const over = image.margin !== null && image.margin < -1e-9;
  const copy = view.copies.find(
    (candidate) => candidate.copy.fold === image.copy && (candidate.copy.side === image.side || image.side === 'baseband'),
  );
  const figure = limitFigure(view.subject, 'image');
  return [
    item({
      id: 'worst-image',
      series: 'copies',
      pane: leavingPane,
      role: over ? 'harm' : 'copy',
      name: 'strongest copy',
      words: sentences(
        `Strongest copy: ${worstWords(view.subject)}, of ${stretchWords(image.from, image.from)}`,
        figure === null ? '' : marginWords(figure),
      ),
      place: view.subject.placeOf(['limits', 'image']),
      joins: copy === undefined ? [] : [`copy-${copy.index}-${copy.copy.fold}-${copy.copy.side}`],
      shapes: [{ kind: 'mark', frequencyHz: image.frequency, level: image.level, mark: over ? 'over' : 'inside' }],
      label: {
        text: worstWords(view.subject),
        frequencyHz: image.frequency,
        level: image.level,
        prefer: over ? 'right' : 'left',
        priority: 10,
      },
    }),
  ];
}

function tableOf({ subject, lastFold, output }: LeavingView): Table {
  const { figures, channel } = subject;
  const copies = copiesUpTo(subject, Math.max(lastFold, ...figures.images.map(({ copy }) => copy)));
  const wanted = channel.wanted.map((band, index) => ({
    item: `wanted-${index}`,
    cells: [
      band.name === null ? 'wanted' : `wanted, ${band.name}`,
      stretchWords(band.lowHz, band.highHz),
      copies.find((copy) => copy.wanted && copy.index === index)?.beforeDb(band.highHz) ?? null,
      band.levelDb + gainDb(subject.nominal, band.highHz),
      null,
      null,
    ],
  }));
  const rows = figures.images.map((image) => {
    const copy = copies.find(
      (candidate) => candidate.copy.fold === image.copy && (candidate.copy.side === image.side || image.side === 'baseband'),
    );
    const before = copy?.beforeDb(image.frequency) ?? null;
    const name = image.side === 'baseband' ? 'baseband copy' : `copy ${image.copy}, ${image.side}`;
    const shown = copy !== undefined && image.copy <= lastFold && image.frequency <= output.highHz;
    return {
      item: shown ? `copy-${copy.index}-${copy.copy.fold}-${copy.copy.side}` : null,
      cells: [name, stretchWords(image.frequency, image.frequency), before, image.level, image.relative, image.margin],
    };
  });
  return {
    caption: `${channel.name}: what leaves; of each copy its strongest point, at the worst of the tolerances`,
    columns: [
      { title: 'what', unit: null },
      { title: 'leaves at', unit: null },
      { title: `behind the ${pulseKey(channel)}`, unit: 'dBFS' },
      { title: 'behind the path', unit: 'dBFS' },
      { title: 'against wanted', unit: 'dBc' },
      { title: 'margin', unit: 'dB' },
    ],
    rows: [...wanted, ...rows].map((row) => ({
      ...row,
      cells: row.cells.map((cell) => (typeof cell === 'number' && !Number.isFinite(cell) ? null : cell)),
    })),
  };
}
