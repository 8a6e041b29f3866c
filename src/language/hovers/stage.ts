/** Hover of a filter or one of its stages: where it cuts, what it costs the wanted band, what it takes from the first fold. */
import {
  channelPath,
  gainDb,
  halfPowerPoints,
  inSeries,
  noiseWidth,
  pathDelay,
  type ChannelPath,
  type Figures,
  type NoiseWidth,
  type StagePath,
} from '../../analysis';
import type { Path } from '../../spec';
import { formatDb, formatFrequency, formatTime } from '../../units/format';
import { knownRows, type Answer, type Row } from './answer';
import { foldRows, headlineWords } from './loss-rows';
import { formRows } from './stage-form';
import { indexIn, type Subject } from './subject';

/** The stage at the subject's path, or the whole filter where the path names none. */
export function stageHover({ channel, figures, path }: Subject): Answer | null {
  const whole = channelPath(channel);
  const own = ownStages(whole, path[0]);
  if (own.length === 0) return null;
  const stage = path.length > 1 || own.length === 1 ? own[indexIn(path)] : undefined;
  return stage === undefined ? filterAnswer(own, whole, figures, path) : stageAnswer(stage, whole, figures, path);
}

/** The stages that stand under one key; a relay channel has two. */
function ownStages({ stages, channel }: ChannelPath, head: Path[number] | undefined): readonly StagePath[] {
  const before = channel.inputStages.length;
  if (head === 'input-filter') return stages.slice(0, before);
  return head === 'output-filter' ? stages.slice(before) : stages;
}

function filterAnswer(own: readonly StagePath[], whole: ChannelPath, figures: Figures, path: Path): Answer {
  const response = inSeries(own.map((stage) => stage.response));
  return {
    headline: `${own.length} stages: ${headlineWords(response, figures, path)}`,
    rows: commonRows(own, whole, figures, path),
    formula: 'Poles, zeros and gain in series, nominal values',
  };
}

function stageAnswer(stage: StagePath, whole: ChannelPath, figures: Figures, path: Path): Answer {
  return {
    headline: `\`${stage.stage.label}\`: ${headlineWords(stage.response, figures, path)}`,
    rows: [...commonRows([stage], whole, figures, path), ...formRows(stage)],
    formula:
      stage.stage.form.kind === 'measured'
        ? 'Straight in dB and unwrapped phase between the rows of the table'
        : 'Poles, zeros and gain, nominal values; half power is 3.01 dB below the passband’s maximum',
  };
}

function commonRows(own: readonly StagePath[], whole: ChannelPath, figures: Figures, path: Path): Row[] {
  const response = inSeries(own.map((stage) => stage.response));
  return knownRows(
    ['half power at', halfPowerWords(halfPowerPoints(response))],
    ['noise bandwidth', widthWords(noiseWidth(own))],
    [`gain at ${formatFrequency(figures.reference)}`, formatDb(gainDb(response, figures.reference), 'dB', 2)],
    ...foldRows(response, figures, path),
    ['group delay', delayWords(own, whole, figures.reference)],
  );
}

function halfPowerWords(points: readonly number[]): string {
  return points.length === 0 ? 'no frequency' : points.map((hz) => formatFrequency(hz)).join(' and ');
}

function widthWords(width: NoiseWidth): string | null {
  switch (width.kind) {
    case 'finite':
      return formatFrequency(width.hz);
    case 'endless':
      return 'endless: the gain does not fall to nothing';
    case 'unknown':
      return null;
  }
}

/** The delay of these stages alone, at the reference; null where a table has no phase. */
function delayWords(own: readonly StagePath[], whole: ChannelPath, referenceHz: number): string | null {
  const alone = { ...whole.channel, pulse: { shape: 'instant' }, gate: null } as const;
  const seconds = pathDelay({ ...whole, channel: alone, stages: own }, referenceHz);
  return seconds === null ? null : formatTime(seconds);
}
