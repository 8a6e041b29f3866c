/** What one stage is set to within its tolerances, and the stage at such a setting. */
import type { WorstAt } from './figures';
import { stretchedStage } from './stage-path';
import type { StagePath } from './stage-path';

/** A stage with parts or Qs of it off. */
export interface StageVariant {
  /** With its corner as it is. */
  readonly path: StagePath;
  /** The factor on its corner. */
  readonly factor: number;
  /** What is off besides the corner, and how far, by label. */
  readonly deviations: WorstAt;
}

/** What one stage is set to: a factor on its corner, or a variant of it. */
export type StageSetting = number | StageVariant;

/** A stage at a setting. */
export function atSetting(stage: StagePath, setting: StageSetting): StagePath {
  return typeof setting === 'number' ? stretchedStage(stage, setting) : stretchedStage(setting.path, setting.factor);
}

/** ln of a stage's gain at a setting. */
export function gainAtSetting(stage: StagePath, setting: StageSetting, frequencyHz: number): number {
  return typeof setting === 'number'
    ? stage.response.logGain(frequencyHz / setting)
    : setting.path.response.logGain(frequencyHz / setting.factor);
}

/** The factor on a stage's corner at a setting. */
export function factorOf(setting: StageSetting): number {
  return typeof setting === 'number' ? setting : setting.factor;
}

/** The same setting with another factor on the corner. */
export function withFactor(setting: StageSetting, factor: number): StageSetting {
  return typeof setting === 'number' ? factor : { ...setting, factor };
}
