/** Hover of an aperture or a hold: what its width takes from the band's edges, and where it passes nothing. */
import { channelPath, gainDb, pulseNulls, pulseSeconds } from '../../analysis';
import { formatFrequency, formatPercent, formatTime } from '../../units/format';
import type { Answer, Row } from './answer';
import type { Subject } from './subject';
import { lossWords } from './words';

/** How many nulls are listed. */
const listedNulls = 3;

/** The channel's pulse. */
export function pulseHover({ channel, figures }: Subject): Answer {
  const name = channel.direction === 'capture' ? 'aperture' : 'hold';
  const width = pulseSeconds(channel.pulse, figures.rate);
  if (width === 0) return { headline: 'An instant: it takes nothing from any frequency', rows: [], formula: null };
  const { pulse } = channelPath(channel);
  const loss = (hz: number): string => lossWords(-gainDb(pulse, hz));
  const edges = figures.wanted.flatMap(({ low, high }): Row[] => [
    [`loss at ${formatFrequency(low)}`, loss(low)],
    [`loss at ${formatFrequency(high)}`, loss(high)],
  ]);
  const top = Math.max(...figures.wanted.map(({ high }) => high));
  return {
    headline: `${formatTime(width)}: ${loss(top)} loss at ${formatFrequency(top)}`,
    rows: [
      ['share of the period', formatPercent(width * figures.rate)],
      ...edges,
      [
        'passes nothing at',
        pulseNulls(channel.pulse, figures.rate, listedNulls)
          .map((hz) => formatFrequency(hz))
          .join(', '),
      ],
    ],
    formula: name === 'aperture' ? '|sinc(f·w)| at the input frequency' : '(w/T)·|sinc(f·w)| at the output frequency',
  };
}
