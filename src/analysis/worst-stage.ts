/** One stage at the worst of its tolerances, as a gain or against its own gain at other frequencies. */
import { tiedAlong } from '../signal/copy-axis';
import type { CopyAxis } from '../signal/copy-axis';
import { FactorRatio } from '../signal/factor-ratio';
import { largestRatio, measuredFrom } from '../signal/pair-ratio';
import type { PairRatio } from '../signal/pair-ratio';
import { ResonanceRatio } from '../signal/resonance-ratio';
import type { Enclosure, Response } from '../signal/response';
import { inverse, largestOf } from '../signal/response-algebra';
import { looseParts, endVariants, partRanges, withParts } from './stage-variants';
import type { PartsForm } from './stage-variants';
import type { StagePath } from './stage-path';
import { withFactor } from './stage-setting';
import type { StageSetting } from './stage-setting';
import { stretchedFrom } from './stretched-from';
import type { WorstQuestion } from './stretched-from';
import { factorsOf } from './tolerances';

/** A stage's worst response, and what the stage is set to where it is reached. */
export interface MovedStage {
  readonly response: Response;
  settingAt(frequencyHz: number): StageSetting;
}

/**
 * The stage at its worst, without its gain's tolerance. Its corner is searched with proof, parts of an `rlc` are exact, Qs are taken at their
 * ends, where they are worst.
 *
 * @param axis what the axis adds to the factors on the corner: 1 in hertz. What it moves is no deviation of the stage.
 */
export function movedStage(path: StagePath, axis: Enclosure, question: WorstQuestion): MovedStage {
  const { referenceHz, sense } = question;
  const own = factorsOf(path.stage.cornerTolerance);
  const factors = both(own, axis);
  const form = looseParts(path.stage);
  const variants = form === null ? endVariants(path) : null;
  if (form === null && variants === null) {
    const moved = stretchedFrom(path.response, factors, question);
    return { response: moved.response, settingAt: (frequencyHz) => within(moved.factorAt(frequencyHz), own) };
  }
  // The gain of an `rlc` at 0 Hz is 1 whatever its parts, so that measured from there it is the gain itself.
  if (variants === null || referenceHz !== null) {
    const measured = measuredFrom(stageRatio(path, axis), referenceHz ?? 0, sense);
    return { response: measured, settingAt: (frequencyHz) => measured.at(frequencyHz).setting };
  }
  const moved = variants.map((variant) => ({ variant, ...stretchedFrom(variant.path.response, factors, question) }));
  const sign = sense === 'largest' ? 1 : -1;
  return {
    response:
      sense === 'largest'
        ? largestOf(moved.map((one) => one.response))
        : inverse(largestOf(moved.map((one) => inverse(one.response)))),
    settingAt: (frequencyHz) => {
      const gain = ({ response }: { readonly response: Response }): number => sign * response.logGain(frequencyHz);
      const worst = moved.reduce((best, one) => (gain(one) > gain(best) ? one : best));
      return withFactor(worst.variant, within(worst.factorAt(frequencyHz), own));
    },
  };
}

/** A stage at two frequencies at once, at the worst of its tolerances: where each x of one copy leaves against where it leaves in another. */
export function tiedStage(path: StagePath, axis: Enclosure, copy: CopyAxis, wanted: CopyAxis): MovedStage {
  const tied = tiedAlong(stageRatio(path, axis), copy, wanted);
  return { response: tied, settingAt: (x) => tied.at(x).setting };
}

/** A ratio, and the setting that makes it. */
interface Set {
  readonly logGain: number;
  readonly setting: StageSetting;
}

function stageRatio(path: StagePath, axis: Enclosure): PairRatio<Set> {
  const own = factorsOf(path.stage.cornerTolerance);
  const factors = both(own, axis);
  const form = looseParts(path.stage);
  if (form !== null) return largestRatio(pointsOf(axis).map((factor) => partsRatio(path, form, factor)));
  const variants: readonly StageSetting[] = endVariants(path) ?? [1];
  return largestRatio(
    variants.map((variant) => {
      const response = typeof variant === 'number' ? path.response : variant.path.response;
      return withSetting(new FactorRatio(response, factors), ({ factor }) => withFactor(variant, within(factor, own)));
    }),
  );
}

/** The parts at one factor on the axis. */
function partsRatio({ stage }: StagePath, form: PartsForm, factor: number): PairRatio<Set> {
  const naturalHz = factor / (2 * Math.PI * Math.sqrt(form.henry * form.farad));
  const ratio = new ResonanceRatio(naturalHz, Math.sqrt(form.henry / form.farad) / form.ohm, partRanges(stage));
  return withSetting(ratio, ({ parts }) => withParts(stage, form, parts));
}

function withSetting<At extends { readonly logGain: number }>(
  ratio: PairRatio<At>,
  settingOf: (at: At) => StageSetting,
): PairRatio<Set> {
  return {
    at: (frequencyHz, referenceHz) => {
      const at = ratio.at(frequencyHz, referenceHz);
      return {
        logGain: at.logGain,
        get setting() {
          return settingOf(at);
        },
      };
    },
    upper: (frequencies, references) => ratio.upper(frequencies, references),
    lower: (frequencies, references) => ratio.lower(frequencies, references),
    slopes: (frequencies, references) => ratio.slopes(frequencies, references),
  };
}

/** What a clock's parts per million move is looked at in the middle and at the ends. */
function pointsOf({ low, high }: Enclosure): readonly number[] {
  return low === high ? [low] : [low, 1, high];
}

function both(own: Enclosure, axis: Enclosure): Enclosure {
  return { low: own.low * axis.low, high: own.high * axis.high };
}

function within(factor: number, { low, high }: Enclosure): number {
  return Math.min(Math.max(factor, low), high);
}
