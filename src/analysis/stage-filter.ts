/** The poles of one stage, from the form in which the spec gives it. */
import { designFilter } from '../signal/families/design-filter';
import { realPole } from '../signal/families/real-pole';
import type { Filter } from '../signal/filter';
import type { FamilyForm, StageForm } from '../spec/channel';

/** The filter that a stage is. */
export function stageFilter(form: StageForm): Filter {
  switch (form.kind) {
    case 'family':
      return familyFilter(form);
    case 'rc':
      return realPole(1 / (2 * Math.PI * form.ohm * form.farad));
    case 'bandwidth':
      return realPole(form.cornerHz);
    case 'second-order':
    case 'cr':
    case 'rlc':
    case 'roots':
    case 'measured':
      throw notComputed(form.kind);
  }
}

function familyFilter({
  family,
  filterKind,
  order,
  cornerHz,
  upperCornerHz,
  cornerAt,
  rippleDb,
  attenuationDb,
}: FamilyForm): Filter {
  const corners = upperCornerHz === null ? cornerHz : { low: cornerHz, high: upperCornerHz };
  return designFilter({ family, kind: filterKind, order, corners, cornerAt, rippleDb, attenuationDb, gain: 1 });
}

const notComputed = (form: string) => new RangeError(`a stage that is not computed yet: ${form}`);

/** A frequency above which the stage's gain only falls: its corner. */
export function stageCornerHz(form: StageForm): number {
  if (form.kind === 'rc') return 1 / (2 * Math.PI * form.ohm * form.farad);
  if (form.kind === 'family' || form.kind === 'bandwidth') return form.cornerHz;
  throw notComputed(form.kind);
}
