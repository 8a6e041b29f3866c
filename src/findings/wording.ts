/** Phrases that several findings share: amounts with their unit, and what was reached at the worst case. */
import type { LimitFigure, WorstAt } from '../analysis/figures';
import { formatAmount, formatDb, formatSignedPercent, formatTime, plainNumber } from '../units/format';

/** Digits behind the point that a limit's figures are printed with, more where the margin would round to nothing. */
export function decimalsFor(limit: string, margin: number): number {
  const usual = hundredths.has(limit) ? 2 : 1;
  const needed = [1, 2, 3].find((decimals) => Math.abs(margin) >= 0.5 * 10 ** -decimals) ?? 3;
  return Math.max(usual, needed);
}

/** Limits of the gain in the wanted band, whose hundredths matter. */
const hundredths: ReadonlySet<string> = new Set(['flatness', 'level', 'response', 'through']);

/** A limit as the spec states it: "−96 dBFS", "300 µs". */
export function limitWords(figure: Pick<LimitFigure, 'at' | 'unit'>): string {
  return formatAmount(figure.at, figure.unit, 3);
}

/** What a limit is held against: "−91.2 dBFS", "312 µs". */
export function valueWords({ value, unit }: Pick<LimitFigure, 'value' | 'unit'>, decimals: number): string {
  return formatAmount(value ?? 0, unit, decimals);
}

/** How far a limit is missed or kept, without a sign: "4.8 dB", "12 µs". */
export function distanceWords({ margin, unit }: Pick<LimitFigure, 'margin' | 'unit'>, decimals: number): string {
  const size = Math.abs(margin ?? 0);
  return unit === 's' ? formatTime(size) : formatDb(size, 'dB', decimals);
}

/** The tolerances at a worst case: "corner +4 %", or whose corner it is where more than one varies; null where none does. */
export function worstWords(worstAt: WorstAt | null): string | null {
  const entries = Object.entries(worstAt ?? {}).filter(([, deviation]) => deviation !== 0);
  const only = entries.length === 1;
  const words = entries.slice(0, 3).map(([label, deviation]) => `${labelWords(label, only)} ${deviationWords(deviation)}`);
  const more = entries.length - words.length;
  if (words.length === 0) return null;
  return words.join(', ') + (more > 0 ? ` and ${more} more` : '');
}

/** What a parenthesis about the worst case needs to know. */
export interface WorstCase {
  readonly worstAt: WorstAt | null;
  readonly nominal: number | null;
  /** Whether the limit would hold without tolerances. */
  readonly nominalPasses: boolean;
  readonly decimals: number;
  /** `s` where the figure is a time; else it is in some kind of decibels, which go without saying. */
  readonly unit?: LimitFigure['unit'];
}

/** " (worst case, corner +4 %; nominal −92.6)", or nothing where no tolerance is at work. */
export function worstCaseWords({ worstAt, nominal, nominalPasses, decimals, unit }: WorstCase): string {
  const worst = worstWords(worstAt);
  if (worst === null) return '';
  if (nominal === null) return ` (worst case, ${worst})`;
  const plain = `; nominal ${unit === 's' ? formatTime(nominal) : plainNumber(nominal, decimals)}${nominalPasses ? ', which would pass' : ''}`;
  return ` (worst case, ${worst}${plain})`;
}

/** "frequency of `board`" for the label "board, frequency"; of a lone corner or gain nobody has to be told whose it is. */
function labelWords(label: string, only: boolean): string {
  const comma = label.lastIndexOf(', ');
  if (comma < 0) return label;
  const part = label.slice(comma + 2);
  if (only && (part === 'corner' || part === 'gain')) return part;
  const owner = label.slice(0, comma);
  return `${part} of ${/^stage \d+$/u.test(owner) ? owner : `\`${owner}\``}`;
}

/** A relative deviation with its sign: "+4 %", "−25 ppm". */
function deviationWords(deviation: number): string {
  if (Math.abs(deviation) >= 1e-3) return formatSignedPercent(deviation);
  return `${deviation > 0 ? '+' : ''}${plainNumber(deviation * 1e6, 1)} ppm`;
}
