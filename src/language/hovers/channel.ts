/** Hover of a channel's name: whether it passes, and each limit's margin. */
import type { LimitFigure } from '../../analysis';
import { formatAmount, formatFrequency } from '../../units/format';
import type { Answer, Row } from './answer';
import type { Subject } from './subject';
import { decimalsOf, marginWords } from './words';

/** The channel as a whole. */
export function channelHover({ document, channel, figures }: Subject): Answer {
  const judged = document.judgement.channels.find(({ entry }) => entry.channel === channel);
  const verdict = judged?.passes === true ? 'passes' : 'does not pass';
  return {
    headline: `\`${channel.name}\` ${verdict}: ${figures.direction} at ${formatFrequency(figures.rate)}`,
    rows: figures.limits.map(limitRow),
    formula: null,
  };
}

function limitRow(limit: LimitFigure): Row {
  if (limit.value === null || limit.margin === null) return [limit.limit, 'not judged'];
  const value = formatAmount(limit.value, limit.unit, decimalsOf(limit.limit));
  return [limit.limit, `${value}, ${marginWords({ ...limit, margin: limit.margin })}`];
}
