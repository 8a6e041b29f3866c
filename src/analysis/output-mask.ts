/** The `output` mask: for each segment the proved worst of everything that leaves in its band outside the wanted bands. */
import type { Response } from '../signal/response';
import { inverse } from '../signal/response-algebra';
import { stretched } from '../signal/stretched';
import type { Channel, MaskSegment } from '../spec/channel';
import { axisFactors } from './axis';
import type { ChannelPath } from './channel-path';
import { toDb } from './decibels';
import type { MaskFigure } from './figures';
import { without } from './intervals';
import type { LeavingPair, OutputSegment } from './leaving';
import { leavingOfGenerate } from './leaving-generate';
import { boundResponse } from './masks';
import type { Masks } from './masks';
import { leavingOfRelay } from './relay/leaving';
import { wantedRanges } from './source-range';

/** The figures of the `output` mask, segment by segment. A segment that asks for more, `above`, is none that anything could break. */
export function outputMasksOf(channel: Channel, path: ChannelPath): Masks {
  const found = channel.masks
    .filter(({ key }) => key === 'output')
    .flatMap(({ segments }) => segments.map((segment, index) => ({ segment, index, pair: leavingIn(channel, path, segment) })));
  return {
    figures: found.flatMap(({ segment, index, pair }) => figureOf(segment, index, pair)),
    evaluations: found.reduce((sum, { pair }) => sum + (pair?.nominal?.evaluations ?? 0) + (pair?.worst?.evaluations ?? 0), 0),
  };
}

function leavingIn(channel: Channel, path: ChannelPath, segment: MaskSegment): LeavingPair | null {
  const { upper } = segment;
  if (upper === null || channel.direction === 'capture') return null;
  const bound = inverse(boundResponse(segment, upper));
  const output: OutputSegment = {
    leaves: without([{ low: segment.lowHz, high: segment.highHz }], wantedRanges(channel)),
    overBound: (moved, at) => (at === 'nominal' || upper.fromDb === upper.toDb ? bound : moving(bound, moved)),
  };
  return channel.direction === 'relay' ? leavingOfRelay(channel, output) : leavingOfGenerate(channel, path, output);
}

function moving(bound: Response, channel: Channel): Response {
  const { periods } = axisFactors(channel);
  return periods.low === periods.high ? bound : stretched(bound, periods, 'largest');
}

/** Where nothing leaves in a segment its mask holds by as much as there is. */
function figureOf(segment: MaskSegment, index: number, pair: LeavingPair | null): readonly MaskFigure[] {
  if (pair === null || segment.upper === null) return [];
  const { worst, nominal } = pair;
  const frequency = worst?.frequencyHz ?? segment.lowHz;
  const bound = toDb(boundResponse(segment, segment.upper).logGain(frequency));
  const overDb = worst?.overDb ?? -Infinity;
  return [
    {
      limit: 'output',
      segment: index,
      side: 'upper',
      frequency,
      value: bound + overDb,
      nominal: bound + Math.min(nominal?.overDb ?? -Infinity, overDb),
      bound,
      margin: 0 - overDb,
      gap: worst?.gapDb ?? 0,
      worstAt: worst?.worstAt ?? null,
      ...(worst === null ? {} : { from: worst.from }),
    },
  ];
}
