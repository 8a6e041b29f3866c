/** The top of the panel: what the channel is, and the verdict on it in one line and in sentences. */
import type { LimitFigure } from '../analysis';
import { limitWords, thinBelow } from '../findings';
import type { Answer, Heading } from '../protocol/picture';
import type { Channel, Pulse } from '../spec/channel';
import { formatAmount, formatCount, formatFrequency, formatPercent, formatTime } from '../units/format';
import type { Subject } from './subject';
import { marginWords, sentences } from './words';

/** The heading of a channel. */
export function headingOf(subject: Subject): Heading {
  const verdict = verdictOf(subject);
  const limits = subject.figures.limits.map(limitSentence);
  return { summary: summaryOf(subject.channel), verdict, words: sentences(`Verdict: ${verdict.text}`, ...limits) };
}

/** "generate · 500 kHz · zero-order hold · 14 bits" */
function summaryOf(channel: Channel): string {
  const pulse = channel.direction === 'generate' ? [holdWords(channel.pulse)] : [];
  const bits = channel.bits === null ? [] : [formatCount(channel.bits, 'bit')];
  return [channel.direction, formatFrequency(channel.rate.hz), ...pulse, ...bits].join(' · ');
}

function holdWords(pulse: Pulse): string {
  if (pulse.shape === 'instant') return 'impulses';
  if (pulse.shape === 'linear') return 'straight lines from sample to sample';
  if ('seconds' in pulse.width) return `held for ${formatTime(pulse.width.seconds)}`;
  return pulse.width.share === 1 ? 'zero-order hold' : `held for ${formatPercent(pulse.width.share)} of the period`;
}

function verdictOf(subject: Subject): Answer {
  const { figures, channel, passes } = subject;
  const judged = figures.limits.filter((limit) => limit.judged && limit.margin !== null);
  const broken = judged.filter((limit) => !limit.passes).sort((a, b) => (a.margin ?? 0) - (b.margin ?? 0));
  if (!passes) return failing(subject, broken);
  const [accepted] = broken;
  if (accepted !== undefined) return { text: `${accepted.limit} ${marginWords(accepted)}, accepted`, standing: 'thin' };
  const tightest = [...judged].sort((a, b) => tightness(channel, a) - tightness(channel, b))[0];
  if (tightest === undefined || tightest.margin === null) return { text: 'no limit judged', standing: 'unjudged' };
  const inHand = Number.isFinite(tightest.margin)
    ? `passes, ${tightest.limit} ${amountWords(tightest, tightest.margin, 'dB')} in hand`
    : 'passes';
  return { text: inHand, standing: tightness(channel, tightest) < 1 ? 'thin' : 'passes' };
}

function failing({ figures, findings }: Subject, broken: readonly LimitFigure[]): Answer {
  const [worst, ...others] = broken;
  if (figures.faults.some((fault) => fault.kind === 'wanted-folds')) return { text: 'the wanted band folds', standing: 'over' };
  if (worst !== undefined) {
    const more = others.length === 0 ? '' : ` and ${formatCount(others.length, 'more limit')} broken`;
    return { text: `${worst.limit} ${marginWords(worst)}${more}`, standing: 'over' };
  }
  const errors = findings.filter((finding) => finding.severity === 'error' && finding.accepted === null).length;
  return { text: formatCount(errors, 'error'), standing: 'over' };
}

/** A margin as a multiple of what counts as thin, so that limits in different measures can be compared. */
function tightness(channel: Channel, figure: LimitFigure): number {
  const thin = thinBelow(channel, figure);
  const margin = figure.margin ?? Infinity;
  return thin > 0 ? margin / thin : margin > 0 ? Infinity : 1;
}

function limitSentence(figure: LimitFigure): string {
  const name = `${figure.limit} limit of ${limitWords(figure)}`;
  if (!figure.judged || figure.value === null) return `The ${name} is not judged`;
  return `The ${name}: worst case ${amountWords(figure, figure.value, figure.unit)}, ${marginWords(figure)}`;
}

/** A figure of a limit with the digits that matter to it. */
function amountWords({ limit, unit }: LimitFigure, value: number, levelUnit: string): string {
  return formatAmount(value, unit === 's' ? 's' : levelUnit, limit === 'flatness' ? 2 : 1);
}
