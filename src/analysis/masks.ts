/** The masks of the analogue path and of the whole: for each segment the proved point where the gain comes nearest to its bound, or passes it furthest. */
import type { Extreme } from '../signal/search';
import { largestOverBands } from '../signal/search';
import { constantResponse, inverse, product } from '../signal/response-algebra';
import type { Response } from '../signal/response';
import { slopedLine } from '../signal/sloped-line';
import type { Channel, MaskEdge, MaskLimit, MaskSegment } from '../spec/channel';
import { withPulse } from './channel-path';
import type { ChannelPath } from './channel-path';
import { decibelsPerNeper, toDb } from './decibels';
import type { MaskFigure } from './figures';
import { partsVary } from './tolerances';
import { nominalPath, worstPath } from './worst-path';
import type { WorstPath } from './worst-path';

/** What was found of a channel's masks. */
export interface Masks {
  readonly figures: readonly MaskFigure[];
  readonly evaluations: number;
}

/** The figures of `response` and `through`, segment by segment, at the worst of the tolerances. */
export function masksOf(channel: Channel, path: ChannelPath): Masks {
  const found = channel.masks.flatMap((mask) => {
    if (mask.key === 'output') return [];
    const own = mask.key === 'response' ? withoutPulse(path) : path;
    if (own.total.logGain(channel.referenceHz) === -Infinity)
      return mask.segments.map((segment, index) => endless(mask.key, segment, index));
    const gains = gainsOf(own);
    return mask.segments.map((segment, index) => segmentOf(mask.key, segment, index, gains));
  });
  return {
    figures: found.map(({ figure }) => figure),
    evaluations: found.reduce((sum, { evaluations }) => sum + evaluations, 0),
  };
}

/** A segment's bound as a response over its band. */
export function boundResponse(segment: MaskSegment, edge: MaskEdge): Response {
  const fromLog = edge.fromDb / decibelsPerNeper;
  const toLog = edge.toDb / decibelsPerNeper;
  if (fromLog === toLog || segment.highHz === Infinity || segment.lowHz === segment.highHz) return constantResponse(fromLog);
  return slopedLine({ lowHz: segment.lowHz, highHz: segment.highHz, fromLog, toLog, along: segment.along });
}

/** A path at rest, at its largest and at its smallest, all against the gain at the reference. */
interface Gains {
  readonly nominal: WorstPath;
  readonly largest: WorstPath;
  readonly smallest: WorstPath;
}

function gainsOf(path: ChannelPath): Gains {
  const { referenceHz } = path.channel;
  const nominal = nominalPath(path, referenceHz);
  if (!partsVary(path.channel)) return { nominal, largest: nominal, smallest: nominal };
  return {
    nominal,
    largest: worstPath(path, { sense: 'largest', referenceHz, axis: 'hertz' }),
    smallest: worstPath(path, { sense: 'smallest', referenceHz, axis: 'hertz' }),
  };
}

/** The analogue path alone. */
function withoutPulse(path: ChannelPath): ChannelPath {
  const channel: Channel = { ...path.channel, pulse: { shape: 'instant' }, gate: null };
  return { ...withPulse(path, constantResponse(0)), channel };
}

interface Found {
  readonly figure: MaskFigure;
  readonly evaluations: number;
}

/** Where nothing comes through at the reference, whatever does is endlessly stronger: over any upper bound, and far above any lower one. */
function endless(limit: MaskLimit['key'], { lowHz, upper, lower }: MaskSegment, index: number): Found {
  const side: Side = upper === null ? 'lower' : 'upper';
  const bound = (upper ?? lower)?.fromDb ?? 0;
  const margin = upper === null ? Infinity : -Infinity;
  const reached = { value: Infinity, nominal: Infinity, bound, margin, gap: 0, worstAt: null };
  return { figure: { limit, segment: index, side, frequency: lowHz, ...reached }, evaluations: 1 };
}

/** The nearer of the two bounds that a segment may have. */
function segmentOf(limit: MaskLimit['key'], segment: MaskSegment, index: number, gains: Gains): Found {
  const sides = [
    ...(segment.upper === null ? [] : [sideOf(segment, 'upper', segment.upper, gains)]),
    ...(segment.lower === null ? [] : [sideOf(segment, 'lower', segment.lower, gains)]),
  ];
  const nearer = sides.reduce((best, one) => (one.figure.margin < best.figure.margin ? one : best));
  return {
    figure: { limit, segment: index, ...nearer.figure },
    evaluations: sides.reduce((sum, { evaluations }) => sum + evaluations, 0),
  };
}

type Side = MaskFigure['side'];

function sideOf(
  segment: MaskSegment,
  side: Side,
  edge: MaskEdge,
  gains: Gains,
): { readonly figure: Omit<MaskFigure, 'limit' | 'segment'>; readonly evaluations: number } {
  const bound = boundResponse(segment, edge);
  const worst = side === 'upper' ? gains.largest : gains.smallest;
  const found = furthest(segment, side, bound, worst);
  const nominal = worst === gains.nominal ? found : furthest(segment, side, bound, gains.nominal);
  const boundDb = toDb(bound.logGain(found.frequencyHz));
  const over = toDb(found.logGain);
  const nominalOver = Math.min(toDb(nominal.logGain), over);
  const sign = side === 'upper' ? 1 : -1;
  return {
    figure: {
      side,
      frequency: found.frequencyHz,
      value: boundDb + sign * over,
      nominal: boundDb + sign * nominalOver,
      bound: boundDb,
      margin: 0 - over,
      gap: found.gapDb,
      worstAt: worst.worstAt(found.frequencyHz),
    },
    evaluations: found.evaluations + (nominal === found ? 0 : nominal.evaluations),
  };
}

/** How far, at most, the gain is beyond a bound over the segment's band, as a logarithm. */
function furthest(segment: MaskSegment, side: Side, bound: Response, { response }: WorstPath): Extreme {
  const beyond = side === 'upper' ? product([response, inverse(bound)]) : product([inverse(response), bound]);
  const found = largestOverBands(beyond, [{ low: segment.lowHz, high: segment.highHz }]);
  return found ?? { logGain: -Infinity, frequencyHz: segment.lowHz, gapDb: 0, evaluations: 0 };
}
