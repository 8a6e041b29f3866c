/** A channel's figures in the form of the machine-readable result. */
import type { AliasFigure, Figures, ImageFigure, LimitFigure, MaskFigure } from '../analysis/figures';
import type { ChannelJudgement } from '../findings';
import type { Range } from '../protocol/position';
import type { AliasResult, ChannelResult, ImageResult, LimitResult, MaskResult } from './result-file';
import { resultNumber as number } from './result-number';

/**
 * The channel's entry in the result.
 * @param rangeOf gives the range of a path of this channel, for the limits' own places
 */
export function channelResult(judged: ChannelJudgement, rangeOf: (path: readonly string[]) => Range): ChannelResult {
  const { entry, figures, passes } = judged;
  const head = { name: entry.name, direction: entry.direction, ref: entry.ref, passes };
  const notYet = { spurs: null, settling: null, parts: null } as const;
  if (figures === null) return { ...head, ...unknownFigures, ...notYet };
  return { ...head, ...samplingOf(figures), ...levelsOf(figures, rangeOf), ...notYet };
}

/** What a channel that is not whole has in place of figures. */
const unknownFigures = {
  rate: null,
  outputRate: null,
  halfRate: null,
  zone: null,
  inverted: null,
  reference: null,
  rateWindow: null,
  wanted: null,
  protected: null,
  limits: null,
  droop: null,
  delay: null,
  delaySpread: null,
  aliases: null,
  alias: null,
  aliasSum: null,
  images: null,
  image: null,
  masks: null,
  noise: null,
  testTone: null,
  snr: null,
  sinad: null,
  enob: null,
  enobFullScale: null,
  headroom: null,
  crosstalk: null,
  copyWeights: null,
} as const;

function samplingOf(figures: Figures) {
  return {
    rate: number(figures.rate),
    outputRate: number(figures.outputRate),
    halfRate: number(figures.halfRate),
    zone: figures.zone,
    inverted: figures.inverted,
    reference: number(figures.reference),
    rateWindow: figures.rateWindow && { low: number(figures.rateWindow.low), high: number(figures.rateWindow.high) },
    wanted: figures.wanted.map((band) => ({
      name: band.name,
      low: number(band.low),
      high: number(band.high),
      level: number(band.level),
      appearsLow: number(band.appearsLow),
      appearsHigh: number(band.appearsHigh),
    })),
    protected: figures.protected.map((band) => ({ low: number(band.low), high: number(band.high) })),
  };
}

function levelsOf(figures: Figures, rangeOf: (path: readonly string[]) => Range) {
  const { noise, testTone } = figures;
  return {
    limits: figures.limits.map((limit) => limitResult(limit, rangeOf(['limits', limit.limit]))),
    droop: number(figures.droop),
    delay: number(figures.delay),
    delaySpread: number(figures.delaySpread),
    aliases: figures.aliases.map(aliasResult),
    alias: figures.alias && aliasResult(figures.alias),
    aliasSum: number(figures.aliasSum),
    images: figures.images.map(imageResult),
    image: figures.image && imageResult(figures.image),
    masks: figures.masks.map(maskResult),
    noise: {
      quantisation: number(noise.quantisation),
      jitter: number(noise.jitter),
      jitterUnwanted: number(noise.jitterUnwanted),
      sources: number(noise.sources),
      stages: number(noise.stages),
      thermal: number(noise.thermal),
      converter: number(noise.converter),
      total: number(noise.total),
      volts: number(noise.volts),
    },
    testTone: { frequency: number(testTone.frequency), level: number(testTone.level), atSampler: number(testTone.atSampler) },
    snr: number(figures.snr),
    sinad: number(figures.sinad),
    enob: number(figures.enob),
    enobFullScale: number(figures.enobFullScale),
    headroom: number(figures.headroom),
    crosstalk: number(figures.crosstalk),
    copyWeights: figures.copyWeights && figures.copyWeights.map(number),
  };
}

function limitResult(limit: LimitFigure, range: Range): LimitResult {
  return {
    limit: limit.limit,
    ref: limit.ref,
    unit: limit.unit,
    sense: limit.sense,
    at: number(limit.at),
    value: number(limit.value),
    nominal: number(limit.nominal),
    margin: number(limit.margin),
    gap: number(limit.gap),
    judged: limit.judged,
    passes: limit.passes,
    where: limit.where && {
      frequency: number(limit.where.frequency),
      lands: number(limit.where.lands),
      source: limit.where.source ?? null,
    },
    worstAt: limit.worstAt && Object.fromEntries(Object.entries(limit.worstAt).map(([label, value]) => [label, number(value)])),
    range,
  };
}

function aliasResult(alias: AliasFigure): AliasResult {
  return {
    source: alias.source,
    harmonic: alias.harmonic,
    frequency: number(alias.frequency),
    lands: number(alias.lands),
    fold: number(alias.fold),
    inverted: alias.inverted,
    level: number(alias.level),
    nominal: number(alias.nominal),
    sum: number(alias.sum),
    relative: number(alias.relative),
    limit: number(alias.limit),
    margin: number(alias.margin),
  };
}

function imageResult(image: ImageFigure): ImageResult {
  return {
    copy: image.copy,
    side: image.side,
    from: number(image.from),
    frequency: number(image.frequency),
    level: number(image.level),
    relative: number(image.relative),
    limit: number(image.limit),
    margin: number(image.margin),
  };
}

function maskResult({ limit, segment, frequency, value, bound, margin }: MaskFigure): MaskResult {
  return {
    limit,
    segment,
    frequency: number(frequency),
    value: number(value),
    bound: number(bound),
    margin: number(margin),
  };
}
