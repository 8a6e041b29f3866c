/** Figures of a channel as a test wants them, everything else at rest: a 51.2 kHz capture of 5 Hz .. 10 kHz without limits. */
import type { AliasFigure, Figures, ImageFigure, LimitFigure } from '../../src/analysis/figures';

/** Figures with some of their parts replaced. */
export function figures(parts: Partial<Figures> = {}): Figures {
  return { ...atRest, ...parts };
}

/** A limit's figure: judged, its margin and verdict reckoned from `at` and `value`. */
export function limitFigure(
  limit: LimitFigure['limit'],
  at: number,
  value: number,
  parts: Partial<LimitFigure> = {},
): LimitFigure {
  const sense = limit === 'snr' || limit === 'headroom' ? 'at-least' : 'at-most';
  const margin = sense === 'at-most' ? at - value : value - at;
  return {
    limit,
    ref: null,
    unit: limit === 'alias' ? 'dBFS' : limit === 'image' ? 'dBc' : 'dB',
    sense,
    at,
    value,
    nominal: value,
    margin,
    gap: 0,
    judged: true,
    passes: margin >= 0,
    where: null,
    worstAt: null,
    ...parts,
  };
}

/** A limit that has not been judged. */
export function unjudgedFigure(limit: LimitFigure['limit'], at: number): LimitFigure {
  return { ...limitFigure(limit, at, 0), value: null, nominal: null, margin: null, gap: null, judged: false, passes: false };
}

/** The landing of one source: the first one's, 41.2 kHz onto 10 kHz, unless replaced. */
export function aliasFigure(parts: Partial<AliasFigure> = {}): AliasFigure {
  return {
    source: 'drive hash',
    index: 0,
    harmonic: 1,
    frequency: 41200,
    lands: 10000,
    fold: 1,
    inverted: true,
    level: -91.2,
    nominal: -92.6,
    sum: -91.2,
    relative: -88.2,
    limit: -96,
    margin: -4.8,
    gap: 0.001,
    worstAt: null,
    ...parts,
  };
}

/** One copy: the lower one about the rate, unless replaced. */
export function imageFigure(parts: Partial<ImageFigure> = {}): ImageFigure {
  return {
    copy: 1,
    side: 'lower',
    from: 8000,
    frequency: 43200,
    level: -53,
    nominal: -54,
    relative: -50,
    limit: -60,
    margin: -10,
    gap: 0.001,
    worstAt: null,
    ...parts,
  };
}

const atRest: Figures = {
  name: 'channel',
  direction: 'capture',
  ref: null,
  rate: 51200,
  outputRate: 51200,
  halfRate: 25600,
  zone: 1,
  inverted: false,
  reference: 223.6,
  rateWindow: { low: 20000, high: Infinity },
  wanted: [{ name: null, low: 5, high: 10000, level: -3, appearsLow: 5, appearsHigh: 10000, zone: 1, inverted: false }],
  protected: [{ low: 5, high: 10000 }],
  limits: [],
  droop: 0,
  delay: null,
  delaySpread: null,
  aliases: [],
  alias: null,
  aliasSum: null,
  images: [],
  image: null,
  noise: {
    quantisation: null,
    jitter: null,
    jitterUnwanted: null,
    sources: null,
    stages: null,
    thermal: null,
    converter: null,
    total: null,
    volts: null,
  },
  testTone: { frequency: 10000, level: -3, atSampler: -3.3 },
  snr: null,
  sinad: null,
  enob: null,
  enobFullScale: null,
  headroom: 3,
  masks: [],
  crosstalk: null,
  copyWeights: null,
  beyondData: [],
  faults: [],
  overlaps: [],
  evaluations: 0,
};
