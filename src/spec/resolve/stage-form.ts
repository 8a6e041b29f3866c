/** Turns a stage as it was written into the plain form of the analysis. */
import type { FamilyForm, MeasuredForm, ResponseTable, RootHz, RootsForm, SecondOrderForm, StageForm } from '../channel';
import type { StageModel } from '../declaration/stage';
import type { Path } from '../place';
import { loadedResponse } from '../tables/loaded-response';
import type { RootPair } from '../../units/read-root';
import type { Lookup } from './resolution';
import type { Report } from './report';
import { stageGain } from './stage-values';

/** Where a stage stands. */
export interface FormContext {
  readonly lookup: Lookup;
  readonly report: Report;
  /** The file that the stage is written in; null for the channel's own. */
  readonly file: string | null;
  /** The channel's path to the stage. */
  readonly path: Path;
}

/** The form, or null where a part of it is faulty. */
export function stageForm(model: StageModel, context: FormContext): StageForm | null {
  if (model.rc?.r && model.rc.c) return { kind: 'rc', ohm: model.rc.r.value, farad: model.rc.c.value };
  if (model.cr?.r && model.cr.c) return { kind: 'cr', ohm: model.cr.r.value, farad: model.cr.c.value };
  if (model.rlc?.r && model.rlc.l && model.rlc.c) {
    return { kind: 'rlc', ohm: model.rlc.r.value, henry: model.rlc.l.value, farad: model.rlc.c.value };
  }
  if (model.bandwidth) return { kind: 'bandwidth', cornerHz: model.bandwidth.value };
  if (model['second-order']) return secondOrderForm(model['second-order']);
  if (model.poles) return rootsForm(model, model.poles);
  if (model.measured) return measuredForm(model, model.measured, context);
  return familyForm(model);
}

function familyForm(model: StageModel): FamilyForm | null {
  const { family, kind = 'lowpass', order, corner, corners, ripple, attenuation } = model;
  if (!family || kind === null || !order) return null;
  const edges = corners ? [corners.low.value, corners.high.value] : corner ? [corner.value] : [];
  const [cornerHz, upperCornerHz = null] = edges;
  if (cornerHz === undefined || ripple === null || attenuation === null) return null;
  return {
    kind: 'family',
    family,
    filterKind: kind,
    order,
    cornerHz,
    upperCornerHz,
    cornerAt: model['corner-at'] ?? 'half-power',
    rippleDb: ripple?.value ?? null,
    attenuationDb: attenuation?.value ?? null,
  };
}

function secondOrderForm({ frequency, q, kind = 'lowpass' }: NonNullable<StageModel['second-order']>): SecondOrderForm | null {
  if (!frequency || !q || kind === null) return null;
  return { kind: 'second-order', sectionKind: kind, frequencyHz: frequency.value, q };
}

function rootsForm(model: StageModel, stated: readonly (RootPair | null)[]): RootsForm | null {
  const poles = allRoots(stated);
  const zeros = model.zeros === null ? null : allRoots(model.zeros ?? []);
  if (poles === null || zeros === null || model.gain === null || model['gain-at'] === null) return null;
  return { kind: 'roots', poles, zeros, gain: stageGain(model), gainAtHz: model['gain-at']?.value ?? 0 };
}

/** Both of each pair of conjugates; null where one is faulty. */
function allRoots(stated: readonly (RootPair | null)[]): readonly RootHz[] | null {
  if (stated.includes(null)) return null;
  return stated.flatMap((root) => {
    if (root === null || root.im === 0) return root ?? [];
    return [root, { re: root.re, im: -root.im }];
  });
}

function measuredForm(model: StageModel, path: string, context: FormContext): MeasuredForm | null {
  const { below = 'hold', beyond = 'refuse' } = model;
  const table = measuredTable(model, path, context);
  if (table === null || below === null || beyond === null) return null;
  return {
    kind: 'measured',
    path,
    table,
    below,
    beyond: typeof beyond === 'string' ? beyond : { slopeDbPerDecade: beyond.value },
  };
}

function measuredTable(
  model: StageModel,
  path: string,
  { lookup, report, file, path: place }: FormContext,
): ResponseTable | null {
  const at = [...place, 'measured'];
  const found = report.table({ role: 'response', file, path }, at, lookup);
  if (found === null || found.kind === 'spectrum') return null;
  const { source, load } = model;
  if (found.kind === 'response') {
    if (source === undefined && load === undefined) return found.table;
    const message = '`source` and `load` need all four parameters of a Touchstone file: this table has the gain alone';
    return report.fault([...place, source === undefined ? 'load' : 'source'], 'contradiction', message);
  }
  if (source === null || load === null) return null;
  const loads = source === undefined || load === undefined ? null : { sourceOhm: source.value, loadOhm: load.value };
  const response = loadedResponse(found.network, loads);
  if ('table' in response) return response.table;
  return report.fault(at, 'file-not-read', `\`${path}\`: ${response.fault}`);
}
