/** Which of a channel's values may deviate and how far, as factors, and how a worst case names where it lies between them. */
import type { Enclosure } from '../signal/response';
import type { Channel, Rate, Stage, StagePart, ToneSource } from '../spec/channel';
import type { Tolerance } from '../units/quantity';
import type { WorstAt } from './figures';

/** A tolerance as factors on the nominal value. */
export function factorsOf(tolerance: Tolerance): Enclosure {
  return { low: 1 + tolerance.low, high: 1 + tolerance.high };
}

/** Whether a value may deviate at all. */
export function varies(tolerance: Tolerance): boolean {
  return tolerance.low !== 0 || tolerance.high !== 0;
}

/** The rates that the clock's tolerance allows, in Hz. */
export function rateRange(rate: Rate): Enclosure {
  return { low: rate.hz * (1 + rate.tolerance.low), high: rate.hz * (1 + rate.tolerance.high) };
}

/** The frequencies at which a tone may stand, in Hz. */
export function toneRange(tone: ToneSource): Enclosure {
  const factors = factorsOf(tone.tolerance);
  return { low: tone.frequencyHz * factors.low, high: tone.frequencyHz * factors.high };
}

/** Whether any stage or the clock deviates: only then does the worst case differ from nominal. */
export function partsVary(channel: Channel): boolean {
  return varies(channel.rate.tolerance) || channel.stages.some(stageVaries);
}

function stageVaries({ form, parts, cornerTolerance, qTolerance, gainTolerance }: Stage): boolean {
  if (varies(cornerTolerance) || varies(qTolerance) || varies(gainTolerance)) return true;
  // Those of an `rc` and a `cr` stand in its corner.
  return form.kind === 'rlc' && parts.some(({ tolerance }) => varies(tolerance));
}

/** What a worst case calls a stage's corner, as in "pick-up guard, stage 2, corner". */
export function cornerLabel(stage: Stage): string {
  return `${stage.label}, corner`;
}

/** What a worst case calls a part of a stage, as in "trap, l". */
export function partLabel(stage: Stage, part: StagePart['part']): string {
  return `${stage.label}, ${part}`;
}

/** What a worst case calls the Q of a section, counted from 0; of a lone one no number is needed. */
export function qLabel(stage: Stage, section: number, sections: number): string {
  return sections === 1 ? `${stage.label}, q` : `${stage.label}, q of section ${section + 1}`;
}

/** What a worst case calls a stage's gain. */
export function gainLabel(stage: Stage): string {
  return `${stage.label}, gain`;
}

/** What a worst case calls the sampling rate's deviation: the clock's name, or "rate" for a plain frequency. */
export function rateLabel(rate: Rate): string {
  return rate.clock === null ? 'rate' : `${rate.clock.name}, frequency`;
}

/** What a worst case calls a tone's deviation. */
export function toneLabel(tone: ToneSource): string {
  return `${tone.name}, frequency`;
}

/** A deviation as it is reported: the written end where it is reached, else six digits, since more would be noise. */
export function deviation(factor: number, tolerance: Tolerance): number {
  const relative = factor - 1;
  const near = (end: number): boolean => Math.abs(relative - end) <= 1e-9 * Math.max(1, Math.abs(end));
  if (near(tolerance.low)) return tolerance.low;
  if (near(tolerance.high)) return tolerance.high;
  return near(0) ? 0 : Number(relative.toPrecision(6));
}

/** Several parts of one worst case joined; null where nothing deviates. */
export function joinWorst(...parts: readonly (WorstAt | null)[]): WorstAt | null {
  const joined: WorstAt = Object.assign({}, ...parts) as WorstAt;
  return Object.keys(joined).length === 0 ? null : joined;
}
