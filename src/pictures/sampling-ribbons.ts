/** The ribbons between the two panes: each strong stretch of a source joined with the place where it lands. */
import type { Item } from '../protocol/picture';
import { cutAtLimit, foldStretches, landsAt } from './fold-stretches';
import type { FoldStretch } from './fold-stretches';
import { item } from './items';
import { inputPane, sourceSeries } from './sampling-input';
import { outputPane } from './sampling-output';
import type { SamplingView, SourceView, ToneView } from './sampling-view';
import { levelWords, ordinal, sentences, stretchWords } from './words';

/** The most ribbons of one source; beyond that they only cover one another. */
const mostOfOne = 6;

/** How far below the limit, in dB, a stretch stops being worth a ribbon. */
const reachDb = 60;

/** The ribbons of every source, harmless ones first, so that harm is painted on top. */
export function ribbonItems(view: SamplingView): Item[] {
  const items = [...wantedRibbons(view), ...view.sources.flatMap((source) => ribbonsOf(view, source))];
  return [...items.filter(({ role }) => role !== 'harm'), ...items.filter(({ role }) => role === 'harm')];
}

/** A wanted band that appears elsewhere than it stands; in the first zone there is nothing to show. */
function wantedRibbons({ subject }: SamplingView): Item[] {
  return subject.figures.wanted.flatMap((band, index) => {
    if (band.zone === 1) return [];
    const { low: lowHz, high: highHz, appearsLow: landsLowHz, appearsHigh: landsHighHz, inverted } = band;
    const words = `The wanted band ${stretchWords(lowHz, highHz)} appears at ${stretchWords(landsLowHz, landsHighHz)}, zone ${band.zone}`;
    return [
      item({
        id: `ribbon-wanted-${index}`,
        series: 'wanted',
        pane: inputPane,
        role: 'wanted',
        name: 'fold of the wanted band',
        words: sentences(inverted ? `${words}, inverted` : words),
        place: subject.placeOf(['wanted', index]),
        joins: [`wanted-${index}`, `wanted-lands-${index}`],
        shapes: [{ kind: 'ribbon', lowHz, highHz, landsPane: outputPane, landsLowHz, landsHighHz, inverted, strength: 1 }],
      }),
    ];
  });
}

function ribbonsOf(view: SamplingView, source: SourceView): Item[] {
  const stretches = source.tones
    .flatMap((tone, index) => foldStretches(tone, view.protect).map((stretch): Fold => ({ tone, index, stretch })))
    .sort((a, b) => b.stretch.strongestDb - a.stretch.strongestDb);
  const against = view.limitDb ?? view.subject.figures.alias?.level ?? stretches[0]?.stretch.strongestDb ?? 0;
  return stretches
    .filter(({ stretch }) => stretch.strongestDb > against - reachDb)
    .slice(0, mostOfOne)
    .flatMap((fold) =>
      partsOf(view, fold).map(({ part, over }) => ({ fold, part, role: over ? ('harm' as const) : ('source' as const) })),
    )
    .map(({ fold, part, role }) =>
      ribbonItem(view, source, { ...fold, stretch: part }, role, 1 - (against - part.strongestDb) / reachDb),
    );
}

/** A stretch of one of a source's tones that lands in a protected range. */
interface Fold {
  readonly tone: ToneView;
  /** Which of the source's tones. */
  readonly index: number;
  readonly stretch: FoldStretch;
}

function partsOf(
  { limitDb, limitSums }: SamplingView,
  { tone, stretch }: Fold,
): { readonly part: FoldStretch; readonly over: boolean }[] {
  if (limitDb === null || limitSums) return [{ part: stretch, over: false }];
  if (stretch.lowHz === stretch.highHz) return [{ part: stretch, over: stretch.strongestDb > limitDb }];
  return cutAtLimit(tone, stretch, limitDb);
}

function ribbonItem(view: SamplingView, source: SourceView, fold: Fold, role: 'harm' | 'source', strength: number): Item {
  const { stretch: part, tone } = fold;
  const rateHz = view.subject.channel.rate.hz;
  const ends = [landsAt(part, part.lowHz, rateHz), landsAt(part, part.highHz, rateHz)];
  const [landsLowHz, landsHighHz] = [Math.max(0, Math.min(...ends)), Math.max(...ends)];
  const { index } = source;
  const isWorst = role === 'harm' && holdsWorst(view, index, part);
  const turned = part.inverted ? ', inverted' : '';
  return item({
    id: `ribbon-${index}-${part.fold}-${part.inverted ? 'lower' : 'upper'}-${Math.round(part.lowHz)}${fold.index === 0 ? '' : `-${fold.index}`}`,
    series: sourceSeries(index),
    pane: inputPane,
    role,
    name: `fold of ${source.source.name}`,
    words: sentences(
      `${source.source.name}${tone.harmonic > 1 ? `, harmonic ${tone.harmonic}` : ''}: ${stretchWords(part.lowHz, part.highHz)} lands on ${stretchWords(landsLowHz, landsHighHz)}, ${ordinal(part.fold)} fold${turned}`,
      `At most ${levelWords(part.strongestDb)}${role === 'harm' ? ', over the limit' : view.limitDb === null ? '' : ', within the limit'}`,
    ),
    place: view.subject.placeOf(['unwanted', index]),
    joins: [`source-${index}`, `arrives-${index}`, `landing-${index}`],
    shapes: [
      {
        kind: 'ribbon',
        lowHz: part.lowHz,
        highHz: part.highHz,
        landsPane: outputPane,
        landsLowHz,
        landsHighHz,
        inverted: part.inverted,
        strength: Math.min(1, Math.max(0, strength)),
      },
    ],
    label: isWorst
      ? {
          text: `${stretchWords(part.strongestHz, part.strongestHz)}, ${ordinal(part.fold)} fold${turned}`,
          frequencyHz: part.strongestHz,
          level: 0,
          prefer: 'ribbon',
          priority: 6,
        }
      : null,
  });
}

/** Whether a stretch is the one where its source is worst, and that source the worst of all. */
function holdsWorst({ subject }: SamplingView, index: number, part: FoldStretch): boolean {
  const { alias } = subject.figures;
  if (alias?.index !== index || alias.frequency === null) return false;
  const slack = 1e-3 * alias.frequency;
  return part.lowHz - slack <= alias.frequency && alias.frequency <= part.highHz + slack;
}
