/** Resolves the stages of a channel's path, by name or in place. */
import type { Stage, StageForm } from '../channel';
import type { StageModel, StagesModel } from '../declaration/stage';
import type { Named } from '../shape';
import { oneOrMany } from './one-or-many';
import type { Lookup } from './resolution';
import type { Report } from './report';
import { cornerToleranceOfRc, exact, settledTolerance } from './tolerance';

/** The stages in series, or null where a part of them is faulty. */
export function resolveStages(stated: Named | StagesModel, lookup: Lookup, report: Report): readonly Stage[] | null {
  if (!('refersTo' in stated)) return allStages(stated, null);
  const name = stated.refersTo;
  report.use('filters', name);
  const named = lookup.filter(name);
  if (named === undefined) return report.unknownName(['filter'], { space: 'filters', name }, lookup);
  return named === null ? report.leansOnFault() : allStages(named, name);
}

function allStages(stated: StagesModel, filter: string | null): readonly Stage[] | null {
  const models = oneOrMany<StageModel | null>(stated);
  const stages = models.map((model, index) => (model === null ? null : stageOf(model, labelOf(filter, index, models.length))));
  const whole = stages.flatMap((stage) => stage ?? []);
  return whole.length === stages.length ? whole : null;
}

function labelOf(filter: string | null, index: number, count: number): string {
  const stage = `stage ${index + 1}`;
  if (filter === null) return stage;
  return count === 1 ? filter : `${filter}, ${stage}`;
}

function stageOf(model: StageModel, label: string): Stage | null {
  const form = formOf(model);
  if (form === null) return null;
  const name = model.name ?? null;
  return {
    name,
    label: name ?? label,
    form,
    gain: 1,
    parts: [],
    cornerTolerance: cornerToleranceOf(model),
    qTolerance: exact,
    gainTolerance: exact,
  };
}

function formOf(model: StageModel): StageForm | null {
  if (model.rc?.r && model.rc.c) return { kind: 'rc', ohm: model.rc.r.value, farad: model.rc.c.value };
  if (model.bandwidth) return { kind: 'bandwidth', cornerHz: model.bandwidth.value };
  if (!model.family || !model.order || !model.corner) return null;
  return {
    kind: 'family',
    family: model.family,
    filterKind: 'lowpass',
    order: model.order,
    cornerHz: model.corner.value,
    upperCornerHz: null,
    cornerAt: model['corner-at'] ?? 'half-power',
    rippleDb: model.ripple?.value ?? null,
    attenuationDb: null,
  };
}

function cornerToleranceOf(model: StageModel) {
  if (model.rc?.r && model.rc.c) {
    return cornerToleranceOfRc(settledTolerance(model.rc.r.tolerance), settledTolerance(model.rc.c.tolerance));
  }
  const share = model.tolerance?.corner?.value ?? 0;
  return { low: 0 - share, high: share };
}
