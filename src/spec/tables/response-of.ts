/** Turns gains over frequency into the table of a stage: dB, and phase without its jumps. */
import { formatFrequency } from '../../units/format';
import type { ResponseTable } from '../model-stage';
import type { Complex } from './spec-table';

/** A response table of complex gains; a gain of nothing has no dB. */
export function responseOf(
  frequenciesHz: readonly number[],
  gains: readonly Complex[],
): { readonly table: ResponseTable } | { readonly fault: string } {
  const sizes = gains.map(({ re, im }) => Math.hypot(re, im));
  const none = sizes.findIndex((size) => !(size > 0) || !Number.isFinite(size));
  if (none >= 0) return { fault: `the gain at ${formatFrequency(frequenciesHz[none] ?? 0)} is nothing, which has no dB` };
  const phases = gains.map(({ re, im }) => Math.atan2(im, re));
  return { table: { frequenciesHz, gainsDb: sizes.map((size) => 20 * Math.log10(size)), phasesRad: unwrapped(phases) } };
}

/** Phases whose steps from point to point are never more than half a turn. */
export function unwrapped(phasesRad: readonly number[]): readonly number[] {
  const turn = 2 * Math.PI;
  let before = phasesRad[0] ?? 0;
  return phasesRad.map((phase) => {
    before = phase - turn * Math.round((phase - before) / turn);
    return before;
  });
}
