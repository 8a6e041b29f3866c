/** The analogue path: its magnitude stage by stage over all that matters, and the wanted band close up. */
import { halfPowerPoints, hasPulse, pathDelay } from '../analysis';
import { flatnessOf } from '../analysis/flatness';
import type { Section } from '../protocol/picture';
import { formatDb, formatFrequency } from '../units/format';
import { closeUpPlot } from './path-close-up';
import { delayPlot, phasePlot } from './path-timing';
import { magnitudePlot } from './path-magnitude';
import { filterPlace, limitFigure } from './subject';
import type { Subject } from './subject';
import { furtherWords, worstStanding } from './words';

/** The section. */
export function pathSection(subject: Subject): Section {
  const limit = limitFigure(subject, 'flatness');
  const others = furtherKeys.map((key) => limitFigure(subject, key));
  // The line is that of the limit which stands worst, or of the first.
  const stated = [limit, ...others].flatMap((figure) => figure ?? []);
  const first = stated.find((figure) => figure.judged && !figure.passes) ?? stated[0];
  const closeUp = subject.channel.wanted.length === 0 ? [] : [closeUpPlot(subject)];
  const plain = subject.channel.stages.length === 0 && !hasPulse(subject.channel);
  const timed = !plain && pathDelay(subject.path, subject.channel.referenceHz) !== null;
  const timing = timed ? [phasePlot(subject), delayPlot(subject)] : [];
  return {
    id: 'path',
    title: 'Analogue path',
    answer: {
      text: `${answerText(subject)}${furtherWords(others)}`,
      standing: worstStanding(subject.channel, [limit, ...others]),
    },
    place: first === undefined ? filterPlace(subject) : subject.placeOf(['limits', first.limit]),
    plots: [...closeUp, magnitudePlot(subject), ...timing],
  };
}

/** The other limits of the path. */
const furtherKeys = ['response', 'through', 'level', 'delay', 'delay-spread'] as const;

function powerWords(points: readonly number[]): string {
  if (points.length === 0) return 'never falls to half power';
  return `half power ${points.map((hz) => formatFrequency(hz)).join(' and ')}`;
}

function answerText(subject: Subject): string {
  const { channel, path } = subject;
  const power = channel.stages.length === 0 ? 'no filter' : powerWords(halfPowerPoints(path.analogue));
  const limit = limitFigure(subject, 'flatness');
  const value = limit?.value ?? flatnessOf(channel, path)?.valueDb ?? null;
  if (value === null) return power;
  const flat = `flat to ${formatDb(value, 'dB', 2)}`;
  return `${power}, ${limit?.judged === true ? `${flat} of ${formatDb(limit.at, 'dB', 2)}` : flat}`;
}
