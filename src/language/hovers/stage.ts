/** Hover of a filter or one of its stages: where it cuts, what it costs the wanted band, what it takes from the first fold. */
import {
  channelPath,
  gainDb,
  halfPowerHz,
  lossDb,
  noiseBandwidthHz,
  pathDelay,
  type ChannelPath,
  type Figures,
  type StagePath,
} from '../../analysis';
import { formatDb, formatFrequency, formatTime } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { indexIn, type Subject } from './subject';
import { lossWords } from './words';

/** The stage at the subject's path, or the whole filter where the path names none. */
export function stageHover({ channel, figures, path }: Subject): Answer | null {
  const whole = channelPath(channel);
  if (whole.stages.length === 0) return null;
  const stage = path.length > 1 || whole.stages.length === 1 ? whole.stages[indexIn(path)] : undefined;
  return stage === undefined ? filterAnswer(whole, figures) : stageAnswer(stage, whole, figures);
}

type PathResponse = ChannelPath['analogue'];

function filterAnswer(whole: ChannelPath, figures: Figures): Answer {
  return {
    headline: `${whole.stages.length} stages: ${headlineWords(whole.analogue, figures)}`,
    rows: [...responseRows(whole.analogue, figures), ['group delay', formatTime(stagesDelay(whole, figures.reference))]],
    formula: 'Poles and gain in series, nominal values',
  };
}

function stageAnswer({ stage, filter, response }: StagePath, whole: ChannelPath, figures: Figures): Answer {
  return {
    headline: `\`${stage.label}\`: ${headlineWords(response, figures)}`,
    rows: [
      ...responseRows(response, figures),
      ['group delay', formatTime(stagesDelay({ ...whole, stages: [{ stage, filter, response }] }, figures.reference))],
      ...filter.poles.filter((pole) => pole.im >= 0).map(sectionRow),
    ],
    formula: 'Poles and gain, nominal values; half power is 3.01 dB below the passband’s maximum',
  };
}

function headlineWords(response: PathResponse, figures: Figures): string {
  const loss = lossDb(response, figures.halfRate, figures.reference);
  return `${shortLoss(loss)} loss at half the rate, ${formatFrequency(figures.halfRate)}`;
}

/** The delay of the stages without that of the pulse. */
function stagesDelay(path: ChannelPath, frequencyHz: number): number {
  return pathDelay({ ...path, channel: { ...path.channel, pulse: { shape: 'instant' } } }, frequencyHz);
}

/** A loss of at least a decibel needs no more than tenths. */
function shortLoss(loss: number): string {
  return Math.abs(loss) < 1 ? lossWords(loss) : formatDb(loss);
}

function responseRows(response: PathResponse, figures: Figures): Row[] {
  const first = firstFoldHz(figures);
  return knownRows(
    ['half power at', formatHz(halfPowerHz(response))],
    ['noise bandwidth', formatHz(noiseBandwidthHz(response))],
    [`gain at ${formatFrequency(figures.reference)}`, formatDb(gainDb(response, figures.reference), 'dB', 2)],
    [
      figures.direction === 'capture' ? 'loss at the first fold' : 'loss at the first image',
      first === null ? null : `${shortLoss(lossDb(response, first, figures.reference))} at ${formatFrequency(first)}`,
    ],
  );
}

function formatHz(hz: number | null): string | null {
  return hz === null ? null : formatFrequency(hz);
}

/** The lowest frequency above half the rate that lands on, or leaves as a copy of, the top of the wanted band in zone 1. */
function firstFoldHz({ rate, wanted }: Figures): number | null {
  const edges = wanted.filter(({ zone }) => zone === 1).map(({ high }) => rate - high);
  return edges.length === 0 ? null : Math.min(...edges);
}

function sectionRow(pole: { readonly re: number; readonly im: number }, index: number): Row {
  const frequencyHz = Math.hypot(pole.re, pole.im);
  const label = `section ${index + 1}`;
  if (pole.im === 0) return [label, `${formatFrequency(frequencyHz)}, one real pole`];
  return [label, `f₀ ${formatFrequency(frequencyHz)}, Q ${(frequencyHz / (-2 * pole.re)).toPrecision(4)}`];
}
