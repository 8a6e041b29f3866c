/** The gain of a stage, its parts and how far each may be off. */
import type { Stage, StagePart } from '../channel';
import type { StageModel } from '../declaration/stage';
import type { Quantity, Tolerance } from '../../units/quantity';
import { cornerToleranceOfRc, exact, settledTolerance } from './tolerance';

/** A stated gain, linear; 1 where none is. */
export function stageGain({ gain }: StageModel): number {
  if (!gain) return 1;
  return gain.unit === 'dB' ? 10 ** (gain.value / 20) : gain.value;
}

/** The parts of a stage that is given in parts. */
export function partsOf(model: StageModel): readonly StagePart[] {
  const { r, l, c }: { r?: Quantity | null; l?: Quantity | null; c?: Quantity | null } = model.rc ?? model.cr ?? model.rlc ?? {};
  return [partOf('r', r), partOf('l', l), partOf('c', c)].flatMap((part) => part ?? []);
}

function partOf(part: StagePart['part'], quantity: Quantity | null | undefined): StagePart | null {
  return quantity ? { part, value: quantity.value, tolerance: settledTolerance(quantity.tolerance) } : null;
}

/** The relative tolerances of a stage. */
export function stageTolerances(model: StageModel): Pick<Stage, 'cornerTolerance' | 'qTolerance' | 'gainTolerance'> {
  const { corner, q, gain } = model.tolerance ?? {};
  const ofParts = rcTolerance(model.rc ?? model.cr ?? null);
  return { cornerTolerance: ofParts ?? bothWays(corner), qTolerance: bothWays(q), gainTolerance: bothWays(gain) };
}

function rcTolerance(section: { readonly r?: Quantity | null; readonly c?: Quantity | null } | null): Tolerance | null {
  if (!section?.r || !section.c) return null;
  return cornerToleranceOfRc(settledTolerance(section.r.tolerance), settledTolerance(section.c.tolerance));
}

function bothWays(share: Quantity | null | undefined): Tolerance {
  return share ? { low: 0 - share.value, high: share.value } : exact;
}
