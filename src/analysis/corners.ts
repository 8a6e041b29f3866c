/** A path with what of it may deviate set to given values: which combinations are looked at, and the path at one of them. */
import { inSeries } from './channel-path';
import type { ChannelPath } from './channel-path';
import type { WorstAt } from './figures';
import type { StagePath } from './stage-path';
import { atSetting, factorOf } from './stage-setting';
import type { StageSetting } from './stage-setting';
import { endVariants } from './stage-variants';
import { cornerLabel, deviation, factorsOf, joinWorst, varies } from './tolerances';
import { hasPulse } from './wanted-pulse';

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
function endsOf(path: StagePath): readonly StageSetting[] {
  const variants = endVariants(path);
  const { low, high } = factorsOf(path.stage.cornerTolerance);
  const factors = low === high ? [1] : [low, high];
  if (variants === null) return factors;
  return variants.flatMap((variant) => factors.map((factor) => ({ ...variant, factor })));
}

/** The path with its stages set. */
export function atCorners(path: ChannelPath, corners: Corners): ChannelPath {
  if (corners.every((setting) => setting === 1)) return path;
  const stages = path.stages.map((stage, index) => atSetting(stage, corners[index] ?? 1));
  const responses = stages.map((stage) => stage.response);
  const pulses = hasPulse(path.channel) ? [path.pulse] : [];
  return { ...path, stages, analogue: inSeries(responses), total: inSeries([...pulses, ...responses]) };
}

/** What deviates at given settings and how far, by label; null where nothing can. */
export function deviationsAt({ stages }: Pick<ChannelPath, 'stages'>, corners: Corners): WorstAt | null {
  return joinWorst(
    ...stages.map(({ stage }, index) => {
      const setting = corners[index] ?? 1;
      const corner = varies(stage.cornerTolerance)
        ? { [cornerLabel(stage)]: deviation(factorOf(setting), stage.cornerTolerance) }
        : null;
      return joinWorst(corner, typeof setting === 'number' ? null : setting.deviations);
    }),
  );
}
