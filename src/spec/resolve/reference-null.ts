/** Whether a stage lets nothing through at the frequency that all gains are measured from, so that nothing could be measured. */
import { formatFrequency } from '../../units/format';
import type { Stage, StageForm } from '../channel';
import type { Path } from '../place';
import type { Report } from './report';

/** Frequencies closer than this, relatively, are the same: they come from decimal fractions and square roots. */
const sameFrequency = 1e-12;

/** Reports the first stage with a null at the reference; null where there is one. */
export function checkStagesAt(
  referenceHz: number,
  stages: readonly Stage[],
  stated: boolean,
  report: Report,
): 'measurable' | null {
  const silent = stages.find(({ form }) => nullsOf(form).some((hz) => Math.abs(hz - referenceHz) <= sameFrequency * referenceHz));
  if (silent === undefined) return 'measurable';
  const path: Path = stated ? ['reference'] : ['wanted', 0, 'band'];
  const where = stated
    ? `\`reference\` is ${formatFrequency(referenceHz)}`
    : `gains are measured from ${formatFrequency(referenceHz)}`;
  const cure = stated ? 'move it to where the path passes' : 'state a `reference` in the wanted band where the path passes';
  return report.fault(path, 'contradiction', `${where}, where \`${silent.label}\` lets nothing through: ${cure}`);
}

/** The frequencies in Hz at which a form lets nothing through, apart from the nulls of a stop band, which no reference meets but by chance. */
function nullsOf(form: StageForm): readonly number[] {
  switch (form.kind) {
    case 'family': {
      // The low-pass of these families and orders is not silent at infinity, where the others stop what they are to stop.
      if ((form.family === 'elliptic' || form.family === 'inverse-chebyshev') && form.order % 2 === 0) return [];
      if (form.filterKind === 'bandstop') return [Math.sqrt(form.cornerHz * (form.upperCornerHz ?? form.cornerHz))];
      return form.filterKind === 'lowpass' ? [] : [0];
    }
    case 'second-order':
      if (form.sectionKind === 'notch') return [form.frequencyHz];
      return form.sectionKind === 'highpass' || form.sectionKind === 'bandpass' ? [0] : [];
    case 'cr':
      return [0];
    case 'roots':
      return form.zeros.flatMap(({ re, im }) => (re === 0 && im >= 0 ? [im] : []));
    case 'rc':
    case 'rlc':
    case 'bandwidth':
    case 'measured':
      return [];
  }
}
