/** A path with what of it may deviate set to given values: which combinations are looked at, and the path at one of them. */
import { inSeries } from './channel-path';
import type { ChannelPath } from './channel-path';
import type { WorstAt } from './figures';
import { stretchedStage } from './stage-path';
import type { StagePath } from './stage-path';
import { cornerLabel, deviation, factorsOf, joinWorst, varies } from './tolerances';
import { hasPulse } from './wanted-pulse';

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

/** A setting for each stage, in order. */
export type Corners = readonly StageSetting[];

/** More combinations than this are not gone through: then the stages are moved together, and each by itself. */
const mostSets = 64;

/** Every combination of settings at either end, nominal first. */
export function cornerSets(path: ChannelPath): readonly Corners[] {
  const nominal: Corners = path.stages.map(() => 1);
  const ends = path.stages.map(endsOf);
  if (ends.every((settings) => settings.length === 1)) return [nominal];
  if (ends.reduce((count, settings) => count * settings.length, 1) > mostSets) return [nominal, ...fewSets(nominal, ends)];
  const combined = ends.reduce<readonly Corners[]>(
    (sets, settings) => sets.flatMap((set) => settings.map((setting): Corners => [...set, setting])),
    [[]],
  );
  return [nominal, ...combined];
}

/** All stages at their first settings, at their second ones and so on, then each stage at each of its own with the others nominal. */
function fewSets(nominal: Corners, ends: readonly (readonly StageSetting[])[]): readonly Corners[] {
  const most = Math.max(...ends.map((settings) => settings.length));
  const together = Array.from({ length: most }, (_, index): Corners =>
    ends.map((settings) => settings[index % settings.length] ?? 1),
  );
  const alone = ends.flatMap((settings, stage) =>
    settings.length === 1
      ? []
      : settings.map((setting): Corners => nominal.map((one, index) => (index === stage ? setting : one))),
  );
  return [...together, ...alone];
}

/** The ends of what one stage may be. */
function endsOf({ stage }: StagePath): readonly StageSetting[] {
  if (!varies(stage.cornerTolerance)) return [1];
  const { low, high } = factorsOf(stage.cornerTolerance);
  return [low, high];
}

/** The path with its stages set. */
export function atCorners(path: ChannelPath, corners: Corners): ChannelPath {
  if (corners.every((setting) => setting === 1)) return path;
  const stages = path.stages.map((stage, index) => atSetting(stage, corners[index] ?? 1));
  const responses = stages.map((stage) => stage.response);
  const pulses = hasPulse(path.channel) ? [path.pulse] : [];
  return { ...path, stages, analogue: inSeries(responses), total: inSeries([...pulses, ...responses]) };
}

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

/** What deviates at given settings and how far, by label; null where nothing can. */
export function deviationsAt(path: ChannelPath, corners: Corners): WorstAt | null {
  return joinWorst(
    ...path.stages.map(({ stage }, index) => {
      const setting = corners[index] ?? 1;
      const corner = varies(stage.cornerTolerance)
        ? { [cornerLabel(stage)]: deviation(factorOf(setting), stage.cornerTolerance) }
        : null;
      return joinWorst(corner, typeof setting === 'number' ? null : setting.deviations);
    }),
  );
}
