/** The proved strongest point of one copy or of a run of copies, as a level or against the same tone's own output, nominally or at the worst parts. */
import { alongCopy } from '../signal/copy-axis';
import type { Response } from '../signal/response';
import { inverse, product } from '../signal/response-algebra';
import { largestOverBands, largestOverFolds } from '../signal/search';
import { axisFactors } from './axis';
import { withPulse } from './channel-path';
import type { ChannelPath } from './channel-path';
import { axisOf, leavesAt } from './copies';
import type { Copy, CopyRun, WantedCopy } from './copies';
import { deviationsAt } from './corners';
import type { Corners } from './corners';
import { wholePulse } from './whole-pulse';
import { partsVary } from './tolerances';
import type { WorstAt } from './figures';
import { nominalPath, worstPath } from './worst-path';
import type { WorstPath } from './worst-path';
import { tiedStage } from './worst-stage';

/** How images are measured: their own level, or against the same tone's wanted output. */
export type Measure = 'level' | 'relative';

/** What is searched. */
export interface ImageQuestion {
  readonly path: ChannelPath;
  readonly measure: Measure;
  readonly parts: 'nominal' | 'worst';
  readonly copies: WantedCopy;
}

/** A copy's strongest point; frequencies are multiples of the rate, written at its nominal value. */
export interface ImagePoint {
  readonly copy: Copy;
  readonly measure: Measure;
  readonly logGain: number;
  readonly basebandHz: number;
  readonly frequencyHz: number;
  readonly gapDb: number;
  readonly evaluations: number;
  /** What each stage is set to there. */
  readonly corners: Corners;
  /** ln of the stages' gain tolerances in `logGain`. */
  readonly gainLog: number;
  readonly worstAt: WorstAt | null;
}

/** The strongest point of one copy. */
export function strongestOfCopy(question: ImageQuestion, copy: Copy): ImagePoint | null {
  const run = { firstFold: copy.fold, lastFold: copy.fold };
  if (question.measure === 'level' || !movesParts(question)) return strongestOfRun(question, run, copy.side);
  return strongestTied(question, copy);
}

/**
 * The strongest point of a run of copies. Against the wanted output with parts that vary it is a bound: the copy at its largest over
 * the wanted output at its smallest, which copies as far out as these never reach in practice.
 */
export function strongestOfRun(
  question: ImageQuestion,
  run: CopyRun,
  sides: 'both' | 'upper' | 'lower' = 'both',
): ImagePoint | null {
  const { copies } = question;
  const rate = question.path.rateHz;
  const parts = splitFor(question, run);
  const most = pathFor({ ...question, path: parts.path }, 'largest');
  const found = largestOverFolds({
    rateHz: { low: rate, high: rate },
    outer: most.response,
    inner: question.measure === 'level' ? parts.ripple : againstWanted({ ...question, path: parts.path }),
    bands: [copies.baseband],
    within: null,
    ...run,
    sides,
  });
  if (found === null) return null;
  const copy: Copy = { fold: found.fold, side: found.side };
  return {
    copy,
    measure: question.measure,
    logGain: found.logGain,
    basebandHz: found.landsHz,
    frequencyHz: found.frequencyHz,
    gapDb: found.gapDb,
    evaluations: found.evaluations,
    corners: most.cornersAt(found.frequencyHz),
    gainLog: most.gainLog,
    worstAt: most.worstAt(found.frequencyHz),
  };
}

/**
 * The path with its pulse's envelope alone, where the pulse lasts whole periods: its ripple then depends on x only. It cancels between a
 * copy and the wanted output, and stands beside a level; about 0 Hz a level has the pulse itself.
 */
function splitFor(question: ImageQuestion, run: CopyRun): { readonly path: ChannelPath; readonly ripple: Response | null } {
  const { path, measure } = question;
  const whole = wholePulse(path.channel, path.rateHz);
  if (whole === null || (measure === 'level' && run.firstFold === 0)) return { path, ripple: null };
  return { path: withPulse(path, whole.envelope), ripple: whole.ripple };
}

function movesParts({ parts, path }: ImageQuestion): boolean {
  return parts === 'worst' && partsVary(path.channel);
}

function pathFor(question: ImageQuestion, sense: 'largest' | 'smallest'): WorstPath {
  const { path } = question;
  if (!movesParts(question)) return nominalPath(path, null);
  return worstPath(path, { sense, referenceHz: null, axis: 'periods' });
}

/** One over the wanted output along x, at its smallest. */
function againstWanted(question: ImageQuestion): Response {
  const axis = axisOf(question.copies.wanted, question.path.rateHz);
  return inverse(alongCopy(pathFor(question, 'smallest').response, axis));
}

/** Copy over wanted output along x, each part seen at both frequencies at once, so that what a part does to both cancels. */
function strongestTied(question: ImageQuestion, copy: Copy): ImagePoint | null {
  const { copies } = question;
  const { path } = splitFor(question, { firstFold: copy.fold, lastFold: copy.fold });
  const rate = path.rateHz;
  const axes = { copy: axisOf(copy, rate), wanted: axisOf(copies.wanted, rate) };
  const periods = axisFactors(path.channel).periods;
  const stages = path.stages.map((stage) => tiedStage(stage, periods, axes.copy, axes.wanted));
  const pulse = product([alongCopy(path.pulse, axes.copy), inverse(alongCopy(path.pulse, axes.wanted))]);
  const found = largestOverBands(product([pulse, ...stages.map((tied) => tied.response)]), [copies.baseband]);
  if (found === null) return null;
  const corners = stages.map((tied) => tied.settingAt(found.frequencyHz));
  return {
    copy,
    measure: question.measure,
    logGain: found.logGain,
    basebandHz: found.frequencyHz,
    frequencyHz: leavesAt(copy, rate, found.frequencyHz),
    gapDb: found.gapDb,
    evaluations: found.evaluations,
    corners,
    gainLog: 0,
    worstAt: deviationsAt(path, corners),
  };
}
