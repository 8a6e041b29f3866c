/** Hover of an aperture or a hold: what its width takes from the band's edges, where it passes nothing, how much it delays. */
import {
  channelPath,
  gainDb,
  pulseDelay,
  pulseSeconds,
  pulseShape,
  shapeNulls,
  type ChannelPath,
  type Figures,
} from '../../analysis';
import type { Pulse } from '../../spec';
import { formatFrequency, formatPercent, formatTime } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { shapeWords } from './shape-words';
import type { Subject } from './subject';
import { lossWords } from './words';

/** How many nulls are listed. */
const listedNulls = 3;

/** The channel's pulse. */
export function pulseHover({ channel, figures }: Subject): Answer {
  const shape = pulseShape(channel.pulse, figures.rate);
  if (shape === null) return { headline: 'An instant: it takes nothing from any frequency', rows: [], formula: null };
  const width = pulseSeconds(channel.pulse, figures.rate);
  const { pulse } = channelPath(channel);
  const top = Math.max(...figures.wanted.map(({ high }) => high));
  const nulls = shapeNulls(shape, listedNulls).map((hz) => formatFrequency(hz));
  return {
    headline: `${shapeWords(channel.pulse)}${formatTime(width)}: ${lossWords(-gainDb(pulse, top))} loss at ${formatFrequency(top)}`,
    rows: [
      ['share of the period', formatPercent(width * figures.rate)],
      ...edgeRows(pulse, figures),
      ...knownRows(
        ['passes nothing at', nulls.length === 0 ? 'no frequency: it decays' : nulls.join(', ')],
        [`delay at ${formatFrequency(figures.reference)}`, formatTime(pulseDelay(shape, figures.reference))],
      ),
    ],
    formula: formulaOf(channel.pulse, channel.direction),
  };
}

function edgeRows(pulse: ChannelPath['pulse'], figures: Figures): Row[] {
  const edges = [...new Set(figures.wanted.flatMap(({ low, high }) => [low, high]))];
  return edges.map((hz): Row => [`loss at ${formatFrequency(hz)}`, lossWords(-gainDb(pulse, hz))]);
}

/** |P(f)| of each shape, in the words of the language. */
const magnitudes: Readonly<Record<Exclude<Pulse['shape'], 'instant'>, string>> = {
  rectangle: '|sinc(f·w)|',
  linear: 'sinc²(f·T)',
  triangle: 'sinc²(f·w/2)',
  'half-sine': '|cos(π·f·w)/(1 − (2·f·w)²)|',
  'raised-cosine': '|sinc(f·(w − e))·cos(π·f·e)/(1 − (2·f·e)²)|',
  trapezoid: '|sinc(f·(w − e))·sinc(f·e)|',
  exponential: '|1 − e^(−(1/τ + j2πf)·w)|/(|1 + j2πf·τ|·(1 − e^(−w/τ)))',
  split: 'sin²(π·f·w/2)/(π·f·w/2)',
};

function formulaOf({ shape }: Pulse, direction: Subject['channel']['direction']): string | null {
  if (shape === 'instant') return null;
  if (direction === 'capture') return `${magnitudes[shape]} at the input frequency`;
  return shape === 'linear'
    ? `${magnitudes[shape]} at the output frequency`
    : `${holdArea(shape)}${magnitudes[shape]} at the output frequency`;
}

function holdArea(shape: Pulse['shape']): string {
  return shape === 'rectangle' || shape === 'split' ? '(w/T)·' : '(area/T)·';
}
