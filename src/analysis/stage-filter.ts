/** The poles and zeros of one stage, from the form in which the spec gives it. */
import { designFilter } from '../signal/families/design-filter';
import { seriesCapacitor, seriesResonance } from '../signal/families/passive-sections';
import { polesAndZeros } from '../signal/families/poles-and-zeros';
import { realPole } from '../signal/families/real-pole';
import { secondOrder } from '../signal/families/second-order';
import type { Filter } from '../signal/filter';
import type { FamilyForm, MeasuredForm, StageForm } from '../spec/channel';

/** The filter of a form at nominal values; a `gain` other than 1 stands in a family stage only. */
export function stageFilter(form: Exclude<StageForm, MeasuredForm>, gain: number): Filter {
  switch (form.kind) {
    case 'family':
      return familyFilter(form, gain);
    case 'second-order':
      return secondOrder(form.sectionKind, form.frequencyHz, form.q);
    case 'rc':
      return realPole(1 / (2 * Math.PI * form.ohm * form.farad));
    case 'cr':
      return seriesCapacitor(form.ohm, form.farad);
    case 'rlc':
      return seriesResonance(form.ohm, form.henry, form.farad);
    case 'bandwidth':
      return realPole(form.cornerHz);
    case 'roots':
      return polesAndZeros(form);
  }
}

function familyFilter(form: FamilyForm, gain: number): Filter {
  const { family, filterKind, order, cornerHz, upperCornerHz, cornerAt, rippleDb, attenuationDb } = form;
  const corners = upperCornerHz === null ? cornerHz : { low: cornerHz, high: upperCornerHz };
  return designFilter({ family, kind: filterKind, order, corners, cornerAt, rippleDb, attenuationDb, gain });
}
