/** One stage of a path: what it is made of, its response, and its timing where that is known. */
import { filterResponse, groupDelay, phaseRad } from '../signal/filter';
import type { Filter } from '../signal/filter';
import { stretchedTable } from '../signal/measured/gain-table';
import type { GainTable } from '../signal/measured/gain-table';
import { tableDelay, tablePhase } from '../signal/measured/table-delay';
import { tableResponse } from '../signal/measured/table-response';
import type { Response } from '../signal/response';
import type { MeasuredForm, Stage } from '../spec/channel';
import { stageFilter } from './stage-filter';

/** One stage with what it is made of and its response. */
export interface StagePath {
  readonly stage: Stage;
  /** Null for a measured stage, which has no poles. */
  readonly filter: Filter | null;
  /** What a measured stage was measured as; null for all others. */
  readonly table: GainTable | null;
  readonly response: Response;
}

/** A stage at nominal values. */
export function stagePath(stage: Stage): StagePath {
  return stage.form.kind === 'measured'
    ? ofTable(stage, tableOf(stage.form))
    : ofFilter(stage, stageFilter(stage.form, stage.gain));
}

/** A stage that some other filter stands for: its parts are off. */
export function ofFilter(stage: Stage, filter: Filter): StagePath {
  return { stage, filter, table: null, response: filterResponse(filter) };
}

/** A stage with its frequency axis stretched by a factor. */
export function stretchedStage(path: StagePath, factor: number): StagePath {
  if (factor === 1) return path;
  if (path.table !== null) return ofTable(path.stage, stretchedTable(path.table, factor));
  return path.filter === null ? path : ofFilter(path.stage, stretchedFilter(path.filter, factor));
}

/** Group delay in seconds at a frequency; null where a table has no phase. */
export function stageDelay({ filter, table }: StagePath, frequencyHz: number): number | null {
  if (filter !== null) return groupDelay(filter, frequencyHz);
  return table === null ? null : tableDelay(table, frequencyHz);
}

/** Phase in radians at a frequency; null where a table has none. */
export function stagePhaseRad({ filter, table }: StagePath, frequencyHz: number): number | null {
  if (filter !== null) return phaseRad(filter, frequencyHz);
  return table === null ? null : tablePhase(table, frequencyHz);
}

function ofTable(stage: Stage, table: GainTable): StagePath {
  return { stage, filter: null, table, response: tableResponse(table) };
}

/** Where the table refuses to be asked its ends hold: what was asked there is not judged. */
function tableOf({ table, beyond }: MeasuredForm): GainTable {
  return { ...table, beyondDbPerDecade: typeof beyond === 'string' ? 0 : beyond.slopeDbPerDecade };
}

function stretchedFilter({ poles, zeros, gainAt, turnsHz }: Filter, factor: number): Filter {
  return {
    poles: poles.map(({ re, im }) => ({ re: re * factor, im: im * factor })),
    zeros: zeros.map(({ re, im }) => ({ re: re * factor, im: im * factor })),
    gainAt: { frequencyHz: gainAt.frequencyHz * factor, gain: gainAt.gain },
    turnsHz: turnsHz?.map((turn) => turn * factor) ?? null,
  };
}
