/** Each limit of a channel against the figure it is about: worst case, nominal, margin, and whether anything could have broken it. */
import type { Channel, LevelLimit, Limit, LimitKey, MaskLimit } from '../spec/channel';
import type { Aliases } from './alias';
import type { Delay, WorstDelay } from './delay';
import type { LimitFigure, MaskFigure, Where, WorstAt } from './figures';
import type { Flatness } from './flatness';
import type { Headroom } from './headroom';
import type { Images } from './image';
import type { LevelRange } from './level';
import type { Noise } from './noise';
import { crosstalkOf } from './relay/crosstalk';
import { hasPulse } from './wanted-pulse';

/** The figures that limits are judged on. */
export interface Judged {
  readonly aliases: Aliases;
  readonly images: Images;
  readonly flatness: Flatness | null;
  readonly noise: Noise;
  readonly headroom: Headroom | null;
  readonly delay: Delay;
  readonly level: LevelRange | null;
  /** One for each segment of each mask. */
  readonly masks: readonly MaskFigure[];
}

/** The limit of a kind, or null. */
export function limitOf(channel: Channel, key: LimitKey): Limit | null {
  return channel.limits.find((limit) => limit.key === key) ?? null;
}

/** Every limit of a channel, judged: the single values in the order they stand, then the level's range, then the masks. */
export function judgeLimits(channel: Channel, judged: Judged): readonly LimitFigure[] {
  return [
    ...channel.limits.map((limit) => figureOf(limit, measured(channel, limit, judged))),
    ...(channel.levelLimit === null ? [] : [levelFigure(channel.levelLimit, judged.level)]),
    ...channel.masks.map((mask) => maskFigure(channel, mask, judged.masks)),
  ];
}

/** What a limit is held against; null where nothing in the channel can break it. */
interface Measured {
  readonly value: number;
  readonly nominal: number;
  readonly gap: number | null;
  readonly where: Where | null;
  readonly worstAt: WorstAt | null;
}

/** A limit that is met to within this, in dB, is met: what lies below is rounding. Of a time it is the same share of the limit. */
const rounding = 1e-9;

function measured(channel: Channel, limit: Limit, judged: Judged): Measured | null {
  switch (limit.key) {
    case 'alias':
      return aliasMeasured(channel, limit, judged.aliases);
    case 'image':
      return imageMeasured(limit, judged.images);
    case 'flatness':
      return flatnessMeasured(channel, judged.flatness);
    case 'snr':
      return snrMeasured(channel, judged.noise);
    case 'headroom':
      return headroomMeasured(judged.headroom);
    case 'delay':
      return isFlat(channel) ? null : delayMeasured(judged.delay.worst);
    case 'delay-spread':
      return isFlat(channel) ? null : delayMeasured(judged.delay.worstSpread);
    case 'crosstalk':
      return crosstalkMeasured(channel);
  }
}

function figureOf(limit: Limit, found: Measured | null): LimitFigure {
  const sense = limit.key === 'snr' || limit.key === 'headroom' ? 'at-least' : 'at-most';
  const margin = found === null ? null : sense === 'at-most' ? limit.at - found.value : found.value - limit.at;
  // Written out: spreading objects here took longer than the searches.
  return {
    limit: limit.key,
    ref: limit.ref,
    unit: limit.unit,
    sense,
    at: limit.at,
    value: found === null ? null : found.value,
    nominal: found === null ? null : found.nominal,
    margin,
    gap: found === null ? null : found.gap,
    judged: found !== null,
    passes: margin !== null && margin >= (limit.unit === 's' ? -rounding * limit.at : -rounding),
    where: found === null ? null : found.where,
    worstAt: found === null ? null : found.worstAt,
  };
}

/** Sources that land nowhere are an answer, no sources are none. */
function aliasMeasured(channel: Channel, limit: Limit, aliases: Aliases): Measured | null {
  if (channel.direction === 'generate' || channel.unwanted.length === 0) return null;
  const { strongest } = aliases;
  if (strongest === null) return { value: -Infinity, nominal: -Infinity, gap: 0, where: null, worstAt: null };
  const relative = limit.unit === 'dBc';
  const where: Where = {
    frequency: strongest.frequency ?? Infinity,
    source: strongest.source,
    ...(strongest.lands === null ? {} : { lands: strongest.lands }),
  };
  const { judgedSum } = aliases;
  if (limit.sum && judgedSum !== null) {
    // The place is the strongest contributor's, and so is what deviates there; every other stands at its own worst.
    const { valueDb, nominalDb, gapDb } = judgedSum;
    return { value: valueDb, nominal: nominalDb, gap: gapDb, where, worstAt: strongest.worstAt };
  }
  return {
    value: (relative ? strongest.relative : strongest.level) ?? -Infinity,
    nominal: (relative ? aliases.nominalRelativeDb : aliases.nominalLevelDb) ?? -Infinity,
    gap: strongest.gap,
    where,
    worstAt: strongest.worstAt,
  };
}

function imageMeasured(limit: Limit, images: Images): Measured | null {
  const { strongest } = images;
  if (strongest === null) return null;
  const relative = limit.unit === 'dBc';
  const value = relative ? strongest.relative : strongest.level;
  return {
    value,
    nominal: Math.min((relative ? images.nominalRelativeDb : images.nominalLevelDb) ?? value, value),
    gap: strongest.gap,
    where: { frequency: strongest.frequency, lands: strongest.from },
    worstAt: strongest.worstAt,
  };
}

/** Without a pulse and without a filter everything is flat by nature. */
function flatnessMeasured(channel: Channel, flatness: Flatness | null): Measured | null {
  if (flatness === null || isFlat(channel)) return null;
  const { valueDb, nominalDb, frequencyHz, gapDb, worstAt } = flatness;
  return { value: valueDb, nominal: nominalDb, gap: gapDb, where: { frequency: frequencyHz }, worstAt };
}

function snrMeasured(channel: Channel, { judged }: Noise): Measured | null {
  if (judged === null) return null;
  const { valueDb, nominalDb, worstAt } = judged;
  return { value: valueDb, nominal: nominalDb, gap: 0, where: { frequency: channel.testTone.frequencyHz }, worstAt };
}

function headroomMeasured(headroom: Headroom | null): Measured | null {
  if (headroom === null) return null;
  const { valueDb, nominalDb, worstAt } = headroom;
  return { value: valueDb, nominal: nominalDb, gap: 0, where: null, worstAt };
}

function crosstalkMeasured(channel: Channel): Measured | null {
  const found = crosstalkOf(channel);
  if (found === null) return null;
  const { valueDb, nominalDb, worstAt } = found;
  return { value: valueDb, nominal: nominalDb, gap: 0, where: null, worstAt };
}

/** Without a pulse and without a filter nothing moves any frequency. */
function isFlat(channel: Channel): boolean {
  return channel.stages.length === 0 && !hasPulse(channel);
}

function delayMeasured(delay: WorstDelay | null): Measured | null {
  if (delay === null) return null;
  const { seconds, nominalSeconds, gapSeconds, frequencyHz, worstAt } = delay;
  return { value: seconds, nominal: nominalSeconds, gap: gapSeconds, where: { frequency: frequencyHz }, worstAt };
}

/** The end of the range that the level comes nearer to, or passes further. */
function levelFigure({ lowDb, highDb, ref }: LevelLimit, level: LevelRange | null): LimitFigure {
  const highMargin = level === null ? 0 : highDb - level.highest.valueDb;
  const lowMargin = level === null ? 0 : level.lowest.valueDb - lowDb;
  const side = highMargin <= lowMargin ? ('highest' as const) : ('lowest' as const);
  const margin = Math.min(highMargin, lowMargin);
  const end = level === null ? null : level[side];
  return {
    limit: 'level',
    ref,
    unit: 'dBFS',
    sense: 'inside',
    at: side === 'highest' ? highDb : lowDb,
    value: end === null ? null : end.valueDb,
    nominal: end === null ? null : end.nominalDb,
    margin: end === null ? null : margin,
    gap: end === null ? null : end.gapDb,
    judged: end !== null,
    passes: end !== null && margin >= -rounding,
    where: end === null ? null : { frequency: end.frequencyHz },
    worstAt: end === null ? null : end.worstAt,
  };
}

/** The worst of a mask's segments. A flat path can break a mask, but one that it keeps to says nothing. */
function maskFigure(channel: Channel, { key, ref }: MaskLimit, masks: readonly MaskFigure[]): LimitFigure {
  const own = masks.filter((figure) => figure.limit === key);
  const [first] = own;
  const worst = own.reduce<MaskFigure | undefined>(
    (best, one) => (best !== undefined && best.margin <= one.margin ? best : one),
    first,
  );
  const passes = worst !== undefined && worst.margin >= -rounding;
  const idle = key === 'response' ? channel.stages.length === 0 : key === 'through' && isFlat(channel);
  const found = worst === undefined || (passes && idle) ? null : worst;
  return {
    limit: key,
    ref,
    unit: key === 'output' ? 'dBFS' : 'dB',
    sense: 'inside',
    at: found === null ? 0 : found.bound,
    value: found === null ? null : found.value,
    nominal: found === null ? null : found.nominal,
    margin: found === null ? null : found.margin,
    gap: found === null ? null : found.gap,
    judged: found !== null,
    passes: found !== null && passes,
    where: found === null ? null : { frequency: found.frequency, ...sourceOf(found) },
    worstAt: found === null ? null : found.worstAt,
  };
}

/** Which unwanted source it is that leaves there, if it is one. */
function sourceOf({ from }: MaskFigure): Pick<Where, 'source'> {
  const source = from?.source ?? null;
  return source === null ? {} : { source };
}
