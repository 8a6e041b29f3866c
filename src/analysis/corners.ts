/** A path at given corners of its tolerances: which combinations are looked at, and the path with its stages stretched to one of them. */
import { filterResponse } from '../signal/filter';
import type { Filter } from '../signal/filter';
import { inSeries } from './channel-path';
import type { ChannelPath, StagePath } from './channel-path';
import { factorsOf, varies } from './tolerances';

/** One factor for the corner of each stage, in order. */
export type Corners = readonly number[];

/** More stages than this that vary by themselves are moved together. */
const separateStages = 6;

/** Every combination of corners at either end, nominal first. */
export function cornerSets(path: ChannelPath): readonly Corners[] {
  const nominal = path.stages.map(() => 1);
  const varying = path.stages.filter(({ stage }) => varies(stage.cornerTolerance)).length;
  if (varying === 0) return [nominal];
  const ends = path.stages.map(({ stage }) => factorsOf(stage.cornerTolerance));
  if (varying > separateStages) return [nominal, ends.map((end) => end.low), ends.map((end) => end.high)];
  const combined = ends.reduce<readonly Corners[]>(
    (sets, end) =>
      sets.flatMap((set) =>
        end.low === end.high
          ? [[...set, 1]]
          : [
              [...set, end.low],
              [...set, end.high],
            ],
      ),
    [[]],
  );
  return [nominal, ...combined];
}

/** The path with its stages' corners moved. */
export function atCorners(path: ChannelPath, corners: Corners): ChannelPath {
  if (corners.every((factor) => factor === 1)) return path;
  const stages = path.stages.map((stage, index) => stretchedStage(stage, corners[index] ?? 1));
  const responses = stages.map((stage) => stage.response);
  const pulses = path.channel.pulse.shape === 'instant' ? [] : [path.pulse];
  return {
    channel: path.channel,
    rateHz: path.rateHz,
    pulse: path.pulse,
    stages,
    analogue: inSeries(responses),
    total: inSeries([...pulses, ...responses]),
  };
}

function stretchedStage(path: StagePath, factor: number): StagePath {
  if (factor === 1) return path;
  const filter = stretchedFilter(path.filter, factor);
  return { stage: path.stage, filter, response: filterResponse(filter) };
}

function stretchedFilter({ poles, zeros, gainAt, turnsHz }: Filter, factor: number): Filter {
  return {
    poles: poles.map(({ re, im }) => ({ re: re * factor, im: im * factor })),
    zeros: zeros.map(({ re, im }) => ({ re: re * factor, im: im * factor })),
    gainAt: { frequencyHz: gainAt.frequencyHz * factor, gain: gainAt.gain },
    turnsHz: turnsHz?.map((turn) => turn * factor) ?? null,
  };
}
