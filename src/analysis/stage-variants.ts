/** What a stage may be besides its nominal self: each section's Q, or each part of an `rlc`, at either end. */
import { seriesResonance } from '../signal/families/passive-sections';
import { secondOrder } from '../signal/families/second-order';
import type { Filter, Root } from '../signal/filter';
import type { Enclosure } from '../signal/response';
import type { Stage, StageForm, StagePart } from '../spec/channel';
import { ofFilter } from './stage-path';
import type { StagePath } from './stage-path';
import type { StageVariant } from './stage-setting';
import { deviation, factorsOf, partLabel, qLabel, varies } from './tolerances';

/** A stage whose parts vary each by itself. */
export type PartsForm = Extract<StageForm, { readonly kind: 'rlc' }>;

/** Its form where a stage is one whose parts vary each by itself, else null. */
export function looseParts({ form, parts }: Stage): PartsForm | null {
  return form.kind === 'rlc' && parts.some(({ tolerance }) => varies(tolerance)) ? form : null;
}

/** The range of each part of a stage as factors. */
export function partRanges({ parts }: Stage): Readonly<Record<StagePart['part'], Enclosure>> {
  const rangeOf = (name: StagePart['part']): Enclosure => {
    const found = parts.find(({ part }) => part === name);
    return found === undefined ? { low: 1, high: 1 } : factorsOf(found.tolerance);
  };
  return { r: rangeOf('r'), l: rangeOf('l'), c: rangeOf('c') };
}

/** An `rlc` with its parts off by factors. */
export function withParts(stage: Stage, form: PartsForm, factors: Readonly<Record<StagePart['part'], number>>): StageVariant {
  const filter = seriesResonance(form.ohm * factors.r, form.henry * factors.l, form.farad * factors.c);
  const entries = stage.parts
    .filter(({ tolerance }) => varies(tolerance))
    .map(({ part, tolerance }) => [partLabel(stage, part), deviation(factors[part], tolerance)] as const);
  return { path: ofFilter(stage, filter), factor: 1, deviations: Object.fromEntries(entries) };
}

/**
 * The stage with its Qs, or its parts, at every combination of their ends; null where neither is loose.
 *
 * Between its ends a Q needs no look: with its natural frequency and its gain where it is stated held, |H|² is a fraction of two
 * straight lines in 1/Q² of each section, as it is against a reference, so that it is largest and smallest at an end.
 */
export function endVariants(path: StagePath): readonly StageVariant[] | null {
  const { stage, filter } = path;
  const form = looseParts(stage);
  if (form !== null) {
    const { r, l, c } = partRanges(stage);
    return endsOf(r).flatMap((ofR) =>
      endsOf(l).flatMap((ofL) => endsOf(c).map((ofC) => withParts(stage, form, { r: ofR, l: ofL, c: ofC }))),
    );
  }
  return filter === null || !varies(stage.qTolerance) ? null : qVariants(stage, filter);
}

function qVariants(stage: Stage, filter: Filter): readonly StageVariant[] | null {
  const sections = sectionsOf(stage.form, filter);
  if (sections === 0) return null;
  const ends = endsOf(factorsOf(stage.qTolerance));
  const sets = Array.from({ length: sections }).reduce<readonly (readonly number[])[]>(
    (found) => found.flatMap((set) => ends.map((end) => [...set, end])),
    [[]],
  );
  return sets.map((factors) => {
    const entries = factors.map(
      (factor, index) => [qLabel(stage, index, sections), deviation(factor, stage.qTolerance)] as const,
    );
    return { path: ofFilter(stage, withQs(stage.form, filter, factors)), factor: 1, deviations: Object.fromEntries(entries) };
  });
}

/** How many sections of a stage have a Q: its pairs of poles, of a `second-order` the one it is. */
function sectionsOf(form: StageForm, { poles }: Filter): number {
  return form.kind === 'second-order' ? 1 : poles.filter(({ im }) => im > 0).length;
}

function withQs(form: StageForm, filter: Filter, factors: readonly number[]): Filter {
  if (form.kind === 'second-order') return secondOrder(form.sectionKind, form.frequencyHz, form.q * (factors[0] ?? 1));
  const upper = filter.poles.filter(({ im }) => im > 0);
  const real = filter.poles.filter(({ im }) => im === 0);
  const moved = upper.flatMap((pole, index) => resonance(Math.hypot(pole.re, pole.im), pole.re / (factors[index] ?? 1)));
  // Where a section's Q moves by itself the turning points of the whole are no longer known.
  return { poles: [...moved, ...real], zeros: filter.zeros, gainAt: filter.gainAt, turnsHz: null };
}

/** Two poles of one natural frequency with a mean real part. */
function resonance(naturalHz: number, re: number): readonly Root[] {
  const square = (naturalHz - re) * (naturalHz + re);
  if (square > 0) {
    const im = Math.sqrt(square);
    return [
      { re, im },
      { re, im: -im },
    ];
  }
  const larger = re - Math.sqrt(-square);
  return [
    { re: larger, im: 0 },
    { re: (naturalHz / larger) * naturalHz, im: 0 },
  ];
}

function endsOf({ low, high }: Enclosure): readonly number[] {
  return low === high ? [low] : [low, high];
}
