/** How checks look at limits: the figure of one, its place in the spec, whether its nominal value would pass. */
import type { Figures, LimitFigure, JudgedKey } from '../analysis/figures';
import type { Channel } from '../spec/channel';
import type { Place } from '../spec/place';

/** The figure of a limit that was asked for and judged, or null. */
function judgedLimit(figures: Figures, key: JudgedKey): LimitFigure | null {
  return figures.limits.find((figure) => figure.limit === key && figure.judged) ?? null;
}

/** The figure of a limit that was judged and is broken, or null. */
export function brokenLimit(figures: Figures, key: JudgedKey): LimitFigure | null {
  const figure = judgedLimit(figures, key);
  return figure === null || figure.passes ? null : figure;
}

/** Where a limit's quantity stands, in short form and in long form. */
export function limitPlace(channel: Channel, key: JudgedKey): Place {
  return { channel: channel.name, path: ['limits', key, countsSum(channel, key) ? 'sum' : 'at'] };
}

/** Whether a limit holds the sum of what breaks it rather than the strongest. */
export function countsSum(channel: Channel, key: JudgedKey): boolean {
  return channel.limits.some((limit) => limit.key === key && limit.sum);
}

/** Whether the limit would hold at nominal values. */
export function nominalPasses(figure: LimitFigure, nominal: number | null): boolean {
  if (nominal === null) return false;
  if (figure.sense === 'inside') return isUpperBound(figure) ? nominal <= figure.at : nominal >= figure.at;
  return figure.sense === 'at-most' ? nominal <= figure.at : nominal >= figure.at;
}

/** The margin below which a limit that holds is called thin: its own, or 1 dB for levels and ratios, or a tenth of the limit. */
export function thinBelow(channel: Channel, figure: LimitFigure): number {
  const own = ownMargin(channel, figure.limit);
  if (own !== null) return own;
  return inDecibels.has(figure.limit) ? 1 : Math.abs(figure.at) / 10;
}

/** The margin that a limit in long form asks for. */
function ownMargin(channel: Channel, key: JudgedKey): number | null {
  if (key === 'level') return channel.levelLimit?.margin ?? null;
  return (channel.limits.find((limit) => limit.key === key) ?? channel.masks.find((mask) => mask.key === key))?.margin ?? null;
}

/** Whether a figure that must stay inside something is held to a bound above it, as its margin tells. */
export function isUpperBound({ at, value, margin }: Pick<LimitFigure, 'at' | 'value' | 'margin'>): boolean {
  return (value ?? 0) > at === (margin ?? 0) < 0;
}

const inDecibels: ReadonlySet<JudgedKey> = new Set<JudgedKey>(['alias', 'image', 'output', 'snr', 'headroom', 'crosstalk']);

/** Whether a margin is on the wrong side of its limit by more than rounding. */
export function breaks(margin: number | null): boolean {
  return margin !== null && margin < -1e-9;
}
