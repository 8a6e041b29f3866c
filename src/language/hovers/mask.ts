/** Hover of a mask or one of its segments: the worst value, the bound there and the margin. */
import type { Figures, LimitFigure, MaskFigure } from '../../analysis';
import type { MaskEdge, MaskLimit, MaskSegment, Path } from '../../spec';
import { formatDb, formatFrequency } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import type { Subject } from './subject';
import { bandWords, marginWords, worstAtWords } from './words';

/** The segment at the subject's path, or the whole mask; null where the channel has no such mask. */
export function maskHover({ channel, figures, path }: Subject): Answer | null {
  const mask = channel.masks.find(({ key }) => key === path[1]);
  if (mask === undefined) return null;
  const index = segmentIn(path);
  const segment = index === null ? undefined : mask.segments[index];
  return segment === undefined || index === null ? wholeAnswer(mask, figures) : segmentAnswer(mask, segment, index, figures);
}

function segmentIn(path: Path): number | null {
  const step = path.find((part) => typeof part === 'number');
  return typeof step === 'number' ? step : null;
}

const formulas: Readonly<Record<MaskLimit['key'], string>> = {
  response: 'Proved extreme of the analogue path over each segment, against the gain at `reference`',
  through: 'Proved extreme of the end-to-end gain over each segment, against that at `reference`',
  output: 'Proved maximum of everything that leaves outside the wanted band, over each segment',
};

function wholeAnswer(mask: MaskLimit, figures: Figures): Answer {
  const limit = figures.limits.find((figure) => figure.limit === mask.key) ?? null;
  const name = mask.mask === null ? `\`${mask.key}\`` : `\`${mask.key}\`, mask \`${mask.mask}\``;
  return {
    headline: `${name}: ${limit === null ? 'not judged' : standingWords(limit)}`,
    rows: [
      ...mask.segments.map((segment, index): Row => [
        segmentWords(segment, mask.key),
        segmentStanding(found(figures, mask, index), mask),
      ]),
      ...worstRows(limit?.worstAt ?? null),
    ],
    formula: formulas[mask.key],
  };
}

function standingWords({ margin, limit, sense, where }: LimitFigure): string {
  if (margin === null) return 'not judged';
  const at = where === null ? '' : `, worst at ${formatFrequency(where.frequency)}`;
  return `${marginWords({ limit, sense, margin })}${at}`;
}

function segmentStanding(figure: MaskFigure | null, mask: MaskLimit): string {
  if (figure === null) return 'nothing comes near it';
  return `${levelOf(figure.value, mask)} at ${formatFrequency(figure.frequency)}, ${insideWords(figure)}`;
}

function segmentAnswer(mask: MaskLimit, segment: MaskSegment, index: number, figures: Figures): Answer {
  const figure = found(figures, mask, index);
  const words = segmentWords(segment, mask.key);
  if (figure === null) return { headline: `${words}: nothing comes near it`, rows: [], formula: formulas[mask.key] };
  return {
    headline: `${words}: ${insideWords(figure)}`,
    rows: [
      ['worst value', `${levelOf(figure.value, mask)} at ${formatFrequency(figure.frequency)}`],
      ['bound there', `${levelOf(figure.bound, mask)}, ${figure.side === 'upper' ? 'at most' : 'at least'}`],
      ['margin', formatDb(figure.margin, 'dB', 2)],
      ['nominal', levelOf(figure.nominal, mask)],
      ...worstRows(figure.worstAt),
    ],
    formula: formulas[mask.key],
  };
}

function found({ masks }: Figures, mask: MaskLimit, index: number): MaskFigure | null {
  return masks.find(({ limit, segment }) => limit === mask.key && segment === index) ?? null;
}

function insideWords({ margin }: MaskFigure): string {
  return `${formatDb(Math.abs(margin), 'dB', 2)} ${margin < 0 ? 'outside' : 'inside'}`;
}

function levelOf(value: number, { key }: MaskLimit): string {
  return formatDb(value, key === 'output' ? 'dBFS' : 'dB', 2);
}

/** "5.5 MHz .. 8 MHz, below −12 dB sloping to −40 dB". */
function segmentWords({ lowHz, highHz, lower, upper }: MaskSegment, key: MaskLimit['key']): string {
  const unit = key === 'output' ? 'dBFS' : 'dB';
  const band = bandWords(lowHz, highHz);
  if (lower !== null && upper !== null)
    return `${band}, within ${formatDb(lower.fromDb, unit, 2)} .. ${formatDb(upper.fromDb, unit, 2)}`;
  if (upper !== null) return `${band}, below ${edgeWords(upper, unit)}`;
  return lower === null ? band : `${band}, above ${edgeWords(lower, unit)}`;
}

function edgeWords({ fromDb, toDb }: MaskEdge, unit: string): string {
  const from = formatDb(fromDb, unit, 2);
  return fromDb === toDb ? from : `${from} sloping to ${formatDb(toDb, unit, 2)}`;
}

function worstRows(worstAt: MaskFigure['worstAt']): Row[] {
  return knownRows(['worst case at', worstAtWords(worstAt)]);
}
