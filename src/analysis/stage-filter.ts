/** The poles of one stage, from the form in which the spec gives it. */
import { butterworth } from '../signal/families/butterworth';
import { chebyshev } from '../signal/families/chebyshev';
import { realPole } from '../signal/families/real-pole';
import type { Filter } from '../signal/filter';
import type { StageForm } from '../spec/channel';

/** The filter that a stage is. */
export function stageFilter(form: StageForm): Filter {
  switch (form.kind) {
    case 'butterworth':
      return butterworth(form.order, form.cornerHz);
    case 'chebyshev':
      return chebyshev(form.order, form.cornerHz, form.rippleDb, form.cornerAt);
    case 'rc':
      return realPole(1 / (2 * Math.PI * form.ohm * form.farad));
    case 'bandwidth':
      return realPole(form.cornerHz);
  }
}

/** A frequency above which the stage's gain only falls: its corner. */
export function stageCornerHz(form: StageForm): number {
  return form.kind === 'rc' ? 1 / (2 * Math.PI * form.ohm * form.farad) : form.cornerHz;
}
