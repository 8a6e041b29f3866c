/** Capture and relay: what arrives and, on the same scale of levels, where each thing lands; the ribbons between them show which fold hurts. */
import type { Item, Plot, Section, Table } from '../protocol/picture';
import { joinedBothWays, seriesOf } from './items';
import { inputItems, inputPane, sourceSeries } from './sampling-input';
import { outputItems, outputPane } from './sampling-output';
import { ribbonItems } from './sampling-ribbons';
import { samplingView } from './sampling-view';
import type { SamplingView } from './sampling-view';
import { limitFigure } from './subject';
import type { Subject } from './subject';
import { answerWith, levelWords, sentences, stretchWords } from './words';

/** The section. */
export function samplingSection(subject: Subject): Section {
  const limit = limitFigure(subject, 'alias');
  const plot = samplingPlot(samplingView(subject));
  return {
    id: 'sampling',
    title: 'Before and after sampling',
    answer: answerWith(answerText(subject), subject.channel, limit),
    place: subject.placeOf(limit === null ? ['rate'] : ['limits', 'alias']),
    plots: [subject.channel.direction === 'relay' ? withOwnIds(plot) : plot],
  };
}

/** In relay another section has items of the same names. */
function withOwnIds(plot: Plot): Plot {
  const own = (id: string): string => `arrival-${id}`;
  const items = plot.items.map((item) => ({ ...item, id: own(item.id), joins: item.joins.map(own) }));
  const rows = plot.table.rows.map((row) => ({ ...row, item: row.item === null ? null : own(row.item) }));
  return { ...plot, items, table: { ...plot.table, rows } };
}

function answerText({ figures, channel }: Subject): string {
  const { alias } = figures;
  if (channel.unwanted.length === 0) return 'nothing unwanted is stated';
  if (figures.beyondData.some(({ keys }) => keys.includes('alias'))) return 'not known: a measured table ends first';
  if (alias === null || alias.level === null || alias.lands === null) return 'nothing lands in a protected range';
  const sum = channel.limits.some(({ key, sum: sums }) => key === 'alias' && sums)
    ? figures.limits.find(({ limit }) => limit === 'alias')
    : undefined;
  if (sum !== undefined && sum.value !== null) return `all aliases together ${levelWords(sum.value, sum.unit)}`;
  const level =
    limitIsRelative(figures.limits) && alias.relative !== null ? levelWords(alias.relative, 'dBc') : levelWords(alias.level);
  return `worst alias ${level} at ${stretchWords(alias.lands, alias.lands)}`;
}

function limitIsRelative(limits: Subject['figures']['limits']): boolean {
  return limits.some((limit) => limit.limit === 'alias' && limit.unit === 'dBc');
}

function samplingPlot(view: SamplingView): Plot {
  const items = joinedBothWays([...ribbonItems(view), ...inputItems(view), ...outputItems(view)]);
  const names = new Map(view.sources.map(({ source, index }) => [sourceSeries(index), source.name]));
  const ordered = [...items].sort((a, b) => seriesRank(a) - seriesRank(b));
  return {
    id: 'sampling',
    title: 'Before and after sampling',
    words: plotWords(view),
    shown: 'always',
    panes: [
      { id: inputPane, x: view.input, y: view.levels },
      { id: outputPane, x: view.output, y: view.levels },
    ],
    series: seriesOf(ordered, new Map([...names, ['wanted', 'wanted'], ['path', 'path'], ['noise', 'noise']])),
    items,
    table: tableOf(view),
  };
}

/** The legend follows the signal: wanted, sources, path, limit, noise; a source's looks come from its stated item. */
function seriesRank({ id, role, series }: Item): number {
  const order = ['wanted', 'source', 'path', 'zones', 'limit', 'noise'];
  const head = order.findIndex((start) => series.startsWith(start));
  return head * 10 + (id === series || role !== 'harm' ? 0 : 1);
}

function plotWords({ subject, sources, output }: SamplingView): string {
  const { channel, figures } = subject;
  const bands = figures.wanted.map((band) => `${stretchWords(band.low, band.high)} at ${levelWords(band.level)}`).join(' and ');
  return sentences(
    `Above, what arrives at the input: the wanted band ${bands}, and ${sources.length === 1 ? 'one source' : `${sources.length} sources`}, each as stated and as the path leaves it`,
    `Below, what stands between 0 and half the rate of ${stretchWords(channel.rate.hz, channel.rate.hz)}, which is ${stretchWords(output.highHz, output.highHz)}`,
    'Ribbons join each stretch of a source with the place where it lands; a twist means that the fold turns it round',
    answerText(subject),
  );
}

function tableOf({ subject, sources }: SamplingView): Table {
  const { figures, channel } = subject;
  const wanted = figures.wanted.map((band, index) => ({
    item: `wanted-${index}`,
    cells: [
      band.name === null ? 'wanted' : `wanted, ${band.name}`,
      stretchWords(band.low, band.high),
      band.level,
      null,
      stretchWords(band.appearsLow, band.appearsHigh),
      null,
      null,
    ],
  }));
  const landed = sources.map(({ source, index, range }) => {
    const alias = figures.aliases.find((candidate) => candidate.index === index);
    const from = alias?.frequency ?? null;
    const finite = from !== null && Number.isFinite(from) ? from : null;
    return {
      item: `source-${index}`,
      cells: [
        source.name,
        stretchWords(range.low, range.high),
        source.levelDb,
        finite,
        alias?.lands ?? null,
        finiteOrNull(alias?.level),
        finiteOrNull(alias?.margin),
      ],
    };
  });
  const noise =
    figures.noise.total === null
      ? []
      : [{ item: 'noise', cells: ['all noise in the wanted band', null, null, null, null, figures.noise.total, null] }];
  return {
    caption: `${channel.name}: what arrives and where its strongest part lands, at the worst of the tolerances`,
    columns: [
      { title: 'what', unit: null },
      { title: 'stands at', unit: null },
      { title: 'level', unit: 'dBFS' },
      { title: 'worst at', unit: 'Hz' },
      { title: 'lands on', unit: 'Hz' },
      { title: 'as it lands', unit: 'dBFS' },
      { title: 'margin', unit: 'dB' },
    ],
    rows: [...wanted, ...landed, ...noise],
  };
}

function finiteOrNull(value: number | null | undefined): number | null {
  return value !== null && value !== undefined && Number.isFinite(value) ? value : null;
}
