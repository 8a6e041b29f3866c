/** Refuses, at its key, what the text may say and the analysis does not compute yet, so that nothing is passed over in silence. */
import type { Channel, Source, Stage } from '../channel';
import type { Path } from '../place';
import { Report } from './report';
import type { Resolution } from './resolution';
import { stagePath } from './stages';

/** A part of a whole channel that is not computed. */
interface NotComputed {
  readonly path: Path;
  readonly what: string;
}

/** A resolution with a fault for each part of its channel that no figure would take into account, and no channel where there is one. */
export function withoutNotComputed(resolution: Resolution): Resolution {
  if (resolution.channel === null) return resolution;
  const report = new Report();
  for (const { path, what } of notComputed(resolution.channel)) {
    report.fault(path, 'unknown-key', `${what} is not supported yet`);
  }
  return report.clean ? resolution : { ...resolution, channel: null, problems: [...resolution.problems, ...report.problems] };
}

function notComputed(channel: Channel): readonly NotComputed[] {
  return [
    ...(channel.direction === 'relay' ? [{ path: ['direction'], what: '`direction: relay`' }] : []),
    ...pulseOf(channel),
    ...channel.stages.flatMap((stage, index) => {
      const what = stageWhat(stage);
      return what === null ? [] : [{ path: stagePath(channel, index), what }];
    }),
    ...channel.unwanted.flatMap((source, index) => {
      const what = sourceWhat(source);
      return what === null ? [] : [{ path: ['unwanted', index], what }];
    }),
    ...limitsOf(channel),
  ];
}

function pulseOf({ direction, pulse }: Channel): readonly NotComputed[] {
  if (direction === 'relay' || pulse.shape === 'instant' || pulse.shape === 'rectangle') return [];
  return [{ path: [direction === 'capture' ? 'aperture' : 'hold'], what: `a pulse of shape \`${pulse.shape}\`` }];
}

/** Families whose low-pass has no zeros: above its corner the gain only falls. */
const computedFamilies: readonly string[] = ['butterworth', 'chebyshev', 'bessel', 'legendre', 'gaussian'];

function stageWhat({ form, gain, qTolerance }: Stage): string | null {
  if (qTolerance.low !== 0 || qTolerance.high !== 0) return 'a tolerance of `q`';
  if (form.kind === 'rc' || form.kind === 'bandwidth') return null;
  if (form.kind === 'roots') return 'a stage by its `poles`';
  if (form.kind !== 'family') return `a stage by \`${form.kind}\``;
  if (form.filterKind !== 'lowpass') return `\`kind: ${form.filterKind}\``;
  if (!computedFamilies.includes(form.family)) return `\`family: ${form.family}\``;
  return gain === 1 ? null : 'the `gain` of a stage';
}

function sourceWhat(source: Source): string | null {
  if (source.kind === 'spectrum') return 'a `spectrum`';
  if (source.enters !== 'input') return '`enters`';
  return source.kind === 'anything' || source.harmonics === null ? null : '`harmonics`';
}

/** The limits of one value that are judged. */
const judged: readonly string[] = ['alias', 'image', 'flatness', 'snr', 'headroom'];

function limitsOf({ limits, levelLimit, masks }: Channel): readonly NotComputed[] {
  const keys = [
    ...limits.flatMap(({ key }) => (judged.includes(key) ? [] : [key])),
    ...(levelLimit === null ? [] : ['level']),
    ...masks.map(({ key }) => key),
  ];
  const sums = limits.flatMap(({ key, sum }) => (sum ? [{ path: ['limits', key, 'sum'], what: '`sum`' }] : []));
  return [...keys.map((key) => ({ path: ['limits', key], what: `the limit \`${key}\`` })), ...sums];
}
