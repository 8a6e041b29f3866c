/** Phrases that the sections share, in the voice of the findings. */
import type { LimitFigure } from '../analysis';
import { decimalsFor, thinBelow } from '../findings';
import type { Answer, Standing } from '../protocol/picture';
import type { Channel } from '../spec/channel';
import { formatAmount, formatDb, formatFrequency } from '../units/format';

/** A level with one digit behind the point. */
export function levelWords(levelDb: number, unit = 'dBFS'): string {
  return formatDb(levelDb, unit);
}

/** A stretch of frequencies: "5 Hz … 10 kHz", "above 40 kHz". */
export function stretchWords(lowHz: number, highHz: number): string {
  if (!Number.isFinite(highHz)) return `above ${formatFrequency(lowHz)}`;
  return lowHz === highHz ? formatFrequency(lowHz) : `${formatFrequency(lowHz)} … ${formatFrequency(highHz)}`;
}

/** A margin: "0.8 dB inside", "4.8 dB over", "3 dB short". */
export function marginWords(figure: LimitFigure): string {
  const { margin, limit, sense } = figure;
  if (margin === null) return 'not judged';
  if (!Number.isFinite(margin)) return margin > 0 ? 'nothing comes near it' : 'broken without limit';
  const decimals = decimalsFor(limit, margin);
  const amount = formatAmount(Math.abs(margin), figure.unit === 's' ? 's' : 'dB', decimals);
  const beyond = { 'at-most': 'over', 'at-least': 'short', inside: 'outside' }[sense];
  return `${amount} ${margin >= 0 ? 'inside' : beyond}`;
}

/** How a limit stands. */
export function standingOf(channel: Channel, figure: LimitFigure | null): Standing {
  if (figure === null || !figure.judged || figure.margin === null) return 'unjudged';
  if (!figure.passes) return 'over';
  return figure.margin < thinBelow(channel, figure) ? 'thin' : 'passes';
}

/** How several limits stand together: as the one that stands worst. */
export function worstStanding(channel: Channel, figures: readonly (LimitFigure | null)[]): Standing {
  const order: readonly Standing[] = ['over', 'thin', 'passes', 'unjudged'];
  const standings = figures.map((figure) => standingOf(channel, figure));
  return order.find((standing) => standings.includes(standing)) ?? 'unjudged';
}

/** What further limits add to an answer: "response mask 0.2 dB inside", for each that is stated. */
export function furtherWords(figures: readonly (LimitFigure | null)[]): string {
  return figures.map((figure) => (figure === null ? '' : `, ${nameOfLimit(figure)} ${marginWords(figure)}`)).join('');
}

function nameOfLimit({ limit }: LimitFigure): string {
  return limit === 'response' || limit === 'through' || limit === 'output' ? `${limit} mask` : limit;
}

/** An answer with its limit's margin behind it, where it has one. */
export function answerWith(text: string, channel: Channel, figure: LimitFigure | null): Answer {
  const standing = standingOf(channel, figure);
  return { text: figure === null || !figure.judged ? text : `${text}, ${marginWords(figure)}`, standing };
}

/** Sentences joined, each ended. */
export function sentences(...parts: readonly string[]): string {
  return parts
    .filter((part) => part !== '')
    .map((part) => (/[.!?]$/.test(part) ? part : `${part}.`))
    .join(' ');
}

/** "first", "second", … "12th". */
export function ordinal(count: number): string {
  const words = ['zeroth', 'first', 'second', 'third', 'fourth', 'fifth', 'sixth', 'seventh', 'eighth', 'ninth'];
  return words[count] ?? `${count}th`;
}
