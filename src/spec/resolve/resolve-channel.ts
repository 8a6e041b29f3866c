/** Turns a decoded channel into the plain `Channel` of the analysis: names looked up, defaults applied, levels in dBFS. */
import type { Channel } from '../channel';
import type { ChannelModel } from '../declaration/channel';
import type { Decoded } from '../decode';
import { checkDirections, checkRequired } from './directions';
import { mergeLike } from './like';
import type { Merged } from './like';
import { fullScaleVpp } from './levels';
import type { Scale } from './levels';
import { resolveLevelLimit, resolveLimits } from './limits';
import { resolveMasks } from './masks';
import { oneOrMany } from './one-or-many';
import { resolveRate, resolveRateChoices } from './rate';
import { resolveSampling, resolveSlots } from './relay';
import { Report } from './report';
import type { Lookup, Resolution, ResolveProblem } from './resolution';
import { bandBetween, resolveSources } from './sources';
import { resolvePaths } from './paths';
import { checkStagesAt } from './reference-null';
import { checkReference } from './pulse-reference';
import { resolveReference, resolveTestTone, resolveWanted } from './wanted';

/**
 * Resolves one channel; never throws. Every fault is found, whatever else is faulty.
 * @param own what the channel's own text decodes to
 */
export function resolveChannel(name: string, own: Decoded<ChannelModel>, lookup: Lookup): Resolution {
  const report = new Report();
  const merged = mergeLike(name, own.value ?? {}, lookup, report);
  const direction = merged.model.direction ?? null;
  if (own.value !== null && merged.complete) checkRequired(name, merged, report);
  if (direction !== null) checkDirections(direction, merged, report);
  const channel = direction === null ? null : partsOf(name, direction, merged.model, lookup, report);
  const whole = own.problems.length === 0 && own.value !== null && report.clean;
  return {
    channel: whole ? channel : null,
    direction,
    ref: merged.model.ref ?? null,
    problems: atHome(report.problems, merged, lookup),
    uses: report.uses,
    merged: merged.model,
  };
}

function partsOf(
  name: string,
  direction: Channel['direction'],
  model: ChannelModel,
  lookup: Lookup,
  report: Report,
): Channel | null {
  const scale = scaleOf(model, report);
  const wanted = model.wanted ? resolveWanted(model.wanted, scale, report) : null;
  const rate = model.rate ? resolveRate(model.rate, lookup, report) : null;
  const rateChoices = given(model['rate-choices'], null, (stated) => resolveRateChoices(stated, lookup, report));
  const paths = resolvePaths(direction, model, lookup, report);
  const unwanted = given(model.unwanted, [], (stated) => resolveSources(stated, { scale, ...paths, lookup, report }));
  const sampling = resolveSampling(direction, model, rate?.hz ?? null, report);
  const slots = given(model.slots, undefined, (stated) => resolveSlots(stated, sampling, rate?.hz ?? null, report));
  const judged = judgedParts(model, scale, lookup, report);
  const referenceHz = resolveReference(model.reference, wanted ?? [], report);
  const testTone = resolveTestTone(model['test-tone'], wanted ?? [], scale, report);
  if (sampling !== null && referenceHz !== null) checkReference(referenceHz, sampling.pulse, direction, model, report);
  const { inputStages, outputStages } = paths;
  if (!wanted || !unwanted || !rate || !inputStages || !outputStages || !sampling || slots === null || !judged) return null;
  if (referenceHz === null || testTone === null) return null;
  const stages = [...inputStages, ...outputStages];
  if (checkStagesAt(referenceHz, stages, model.reference !== undefined, report) === null) return null;
  return {
    name,
    direction,
    ...plainParts(model),
    fullScaleVpp: scale.fullScaleVpp ?? null,
    wanted,
    unwanted,
    rate,
    rateChoices,
    stages,
    inputStages,
    outputStages,
    ...sampling,
    slots: slots ?? null,
    ...judged,
    referenceHz,
    testTone,
    protect: protectedBands(model, (rate.hz / 2) * (1 + rate.tolerance.high)),
  };
}

/** Limits, the level's range and masks; null where one of them is faulty. */
function judgedParts(
  model: ChannelModel,
  scale: Scale,
  lookup: Lookup,
  report: Report,
): Pick<Channel, 'limits' | 'levelLimit' | 'masks'> | null {
  if (model.limits === undefined) return { limits: [], levelLimit: null, masks: [] };
  if (model.limits === null) return null;
  const limits = resolveLimits(model.limits);
  const levelLimit = given(model.limits.level, undefined, (stated) => resolveLevelLimit(stated, scale, report));
  const masks = resolveMasks(model.limits, lookup, report);
  return limits === null || levelLimit === null || masks === null ? null : { limits, levelLimit: levelLimit ?? null, masks };
}

function scaleOf(model: ChannelModel, report: Report): Scale {
  const stated = model['full-scale'];
  return {
    fullScaleVpp: stated ? fullScaleVpp(stated, ['full-scale'], report) : stated,
    impedanceOhm: model.impedance ? model.impedance.value : model.impedance,
  };
}

function given<T, R>(stated: T | null | undefined, absent: R, resolve: (stated: T) => R | null): R | null {
  if (stated === undefined) return absent;
  return stated === null ? null : resolve(stated);
}

type PlainParts = Pick<Channel, 'ref' | 'guardHz' | 'levelsAt' | 'impedanceOhm' | 'jitterSeconds' | 'bits'>;

function plainParts(model: ChannelModel): PlainParts {
  return {
    ref: model.ref ?? null,
    guardHz: model.guard?.value ?? 0,
    levelsAt: model['levels-at'] ?? 'input',
    impedanceOhm: model.impedance?.value ?? null,
    jitterSeconds: model.jitter?.value ?? 0,
    bits: model.bits ?? null,
  };
}

/** After sampling nothing stands above half the rate, so an open end stops there. */
function protectedBands(model: ChannelModel, highestHz: number): Channel['protect'] {
  if (!model.protect) return null;
  const ranges = oneOrMany(model.protect).flatMap((range) => (range === null ? [] : [bandBetween(range)]));
  return ranges.map(({ lowHz, highHz }) => ({ lowHz, highHz: highHz === Infinity ? Math.max(lowHz, highestHz) : highHz }));
}

/**
 * A fault in something that `like` brought stands in another channel's text. If that channel is faulty itself it says so
 * there; if not, it is the combination that is at fault, and this channel's `like` is the place to say so.
 */
function atHome(problems: readonly ResolveProblem[], { inherited, from }: Merged, lookup: Lookup): readonly ResolveProblem[] {
  if (from === null) return problems;
  const base = lookup.resolution(from);
  const baseIsWhole = base !== undefined && base.channel !== null;
  return problems.flatMap((problem) => {
    if (!inherited.has(String(problem.path[0]))) return [problem];
    if (!baseIsWhole) return [];
    const message = `${problem.message} \`${problem.path.join('.')}\` comes from \`${from}\`.`;
    return [{ ...problem, path: ['like'], part: 'value' as const, message, cures: [] }];
  });
}
