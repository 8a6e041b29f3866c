/** Refuses, at its key, what the text may say and the analysis does not compute yet, so that nothing is passed over in silence. */
import type { Channel, Stage, StageForm } from '../channel';
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
  ];
}

/** Of this many sections every combination of their Qs is looked at, which doubles with each. */
const mostLooseSections = 4;

function stageWhat({ form, qTolerance }: Stage): string | null {
  if (qTolerance.low === 0 && qTolerance.high === 0) return null;
  return sectionsOf(form) > mostLooseSections ? `a tolerance of \`q\` over more than ${mostLooseSections} sections` : null;
}

/** How many sections of a stage have a Q, at most. */
function sectionsOf(form: StageForm): number {
  if (form.kind === 'roots') return form.poles.filter(({ im }) => im > 0).length;
  if (form.kind !== 'family') return 1;
  return form.filterKind === 'lowpass' || form.filterKind === 'highpass' ? Math.floor(form.order / 2) : form.order;
}
