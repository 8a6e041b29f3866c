/** Resolves the stages of a channel's path, by name or in place. */
import type { Channel, Stage } from '../channel';
import type { FilterModel, StageModel, StagesModel } from '../declaration/stage';
import type { Path } from '../place';
import { oneOrMany } from './one-or-many';
import type { Lookup } from './resolution';
import type { Report } from './report';
import { stageForm } from './stage-form';
import type { FormContext } from './stage-form';
import { partsOf, stageGain, stageTolerances } from './stage-values';

/** The keys under which a channel has stages. */
export type FilterKey = 'filter' | 'input-filter' | 'output-filter';

/** What messages call stages that stand in a channel itself. */
const ownNames: Readonly<Record<FilterKey, string | null>> = {
  filter: null,
  'input-filter': 'input filter',
  'output-filter': 'output filter',
};

/** The stages in series, or null where a part of them is faulty. */
export function resolveStages(stated: FilterModel, key: FilterKey, lookup: Lookup, report: Report): readonly Stage[] | null {
  if (!('refersTo' in stated)) return allStages(stated, ownNames[key], { lookup, report, file: null, path: [key] });
  const name = stated.refersTo;
  report.use('filters', name);
  const named = lookup.filter(name);
  if (named === undefined) return report.unknownName([key], { space: 'filters', name }, lookup);
  if (named === null) return report.leansOnFaultOf({ space: 'filters', name }, [key], lookup);
  return allStages(named, name, { lookup, report, file: lookup.fileOf('filters', name), path: [key] });
}

function allStages(stated: StagesModel, filter: string | null, context: FormContext): readonly Stage[] | null {
  const models = oneOrMany<StageModel | null>(stated);
  const stages = models.map((model, index) => {
    const own = { ...context, path: [...context.path, index] };
    return model === null ? null : stageOf(model, labelOf(filter, index, models.length), own);
  });
  const whole = stages.flatMap((stage) => stage ?? []);
  return whole.length === stages.length ? whole : null;
}

function labelOf(filter: string | null, index: number, count: number): string {
  const stage = `stage ${index + 1}`;
  if (filter === null) return stage;
  return count === 1 ? filter : `${filter}, ${stage}`;
}

function stageOf(model: StageModel, label: string, context: FormContext): Stage | null {
  const form = stageForm(model, context);
  if (form === null) return null;
  const name = model.name ?? null;
  const gain = form.kind === 'family' ? stageGain(model) : 1;
  return { name, label: name ?? label, form, gain, parts: partsOf(model), ...stageTolerances(model) };
}

/** Where a stage of a channel stands, counted as in `stages`. */
export function stagePath({ direction, inputStages }: Pick<Channel, 'direction' | 'inputStages'>, index: number): Path {
  if (direction !== 'relay') return ['filter', index];
  return index < inputStages.length ? ['input-filter', index] : ['output-filter', index - inputStages.length];
}
