/** Refuses, at its key, what the text may say and the analysis does not compute yet, so that nothing is passed over in silence. */
import type { Channel, Stage } from '../channel';
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
    ...channel.stages.flatMap((stage, index) => {
      const what = stageWhat(stage);
      return what === null ? [] : [{ path: stagePath(channel, index), what }];
    }),
    ...limitsOf(channel),
  ];
}

/** Parts of an `rlc` and Qs that may be off vary by themselves. */
function stageWhat({ form, parts, qTolerance }: Stage): string | null {
  if (qTolerance.low !== 0 || qTolerance.high !== 0) return 'a tolerance of `q`';
  const loose = form.kind === 'rlc' && parts.some(({ tolerance }) => tolerance.low !== 0 || tolerance.high !== 0);
  return loose ? 'a tolerance of a part of `rlc`' : null;
}

/** The limits of one value that are judged. */
const judged: readonly string[] = ['alias', 'image', 'flatness', 'delay', 'delay-spread', 'snr', 'headroom', 'crosstalk'];

function limitsOf({ limits, masks }: Channel): readonly NotComputed[] {
  const keys = [
    ...limits.flatMap(({ key }) => (judged.includes(key) ? [] : [key])),
    ...masks.flatMap(({ key }) => (key === 'output' ? [key] : [])),
  ];
  return keys.map((key) => ({ path: ['limits', key], what: `the limit \`${key}\`` }));
}
