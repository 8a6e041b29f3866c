/** What a relay channel lets out in some bands outside its wanted ones: copies of the wanted bands, and unwanted sources with all of theirs. */
import { product } from '../../signal/response-algebra';
import type { Enclosure, Response } from '../../signal/response';
import { stretched } from '../../signal/stretched';
import type { Channel, Entrance } from '../../spec/channel';
import { arrivalsOf, nominalArrivals } from '../arrivals';
import { axisFactors } from '../axis';
import { toDb } from '../decibels';
import { pathFrom } from '../entrance';
import { without } from '../intervals';
import { strongest } from '../leaving';
import type { Leaving, LeavingPair, OutputSegment } from '../leaving';
import { wantedRanges } from '../source-range';
import { joinWorst } from '../tolerances';
import { strongestLeaving } from './copy-search';
import { inView, rateDeviation, rateScale, relayViews, sideOf, staysIn } from './views';
import type { RelayView } from './views';

/** The strongest of what leaves, nominally and at the worst of the tolerances. */
export function leavingOfRelay(channel: Channel, segment: OutputSegment): LeavingPair {
  const views = relayViews(channel);
  const nominal = strongest(arriving(channel, 'nominal').map((one) => leavingOf(channel, views.nominal, segment, one)));
  const worst = views.worst.flatMap((view) => arriving(channel, 'worst').map((one) => leavingOf(channel, view, segment, one)));
  return { nominal, worst: strongest(worst) };
}

/** Something that arrives and leaves again. */
interface Arriving {
  /** Null for the wanted band, of which only copies count. */
  readonly source: string | null;
  readonly enters: Entrance;
  readonly levelDb: number;
  readonly ranges: readonly Enclosure[];
  readonly envelope: Response | null;
}

function arriving(channel: Channel, at: 'nominal' | 'worst'): readonly Arriving[] {
  const wanted = channel.wanted.map((band): Arriving => {
    const ranges = [{ low: band.lowHz, high: band.highHz }];
    return { source: null, enters: 'input', levelDb: band.levelDb, ranges, envelope: null };
  });
  const unwanted = channel.unwanted.flatMap((source) =>
    (at === 'nominal' ? nominalArrivals(source) : arrivalsOf(source)).map(({ range, levelDb, envelope }): Arriving => {
      // `anything` means everything outside the wanted band.
      const ranges = source.kind === 'anything' ? without([range], wantedRanges(channel)) : [range];
      return { source: source.name, enters: source.enters, levelDb, ranges, envelope };
    }),
  );
  return [...wanted, ...unwanted];
}

function leavingOf(channel: Channel, view: RelayView, segment: OutputSegment, arriving: Arriving): Leaving | null {
  const { relay } = view;
  const passes = pathFrom(relay.input, arriving.enters);
  const input = sideOf(view, passes, 'largest', channel.levelsAt === 'sampler' ? channel.referenceHz : null);
  const output = sideOf(view, relay.output, 'largest', null);
  const envelope = envelopeIn(view, arriving.envelope);
  const found = strongestLeaving({
    relay,
    leaves: segment.leaves.map((range) => inView(view, range)),
    arrives: arriving.ranges.map((range) => inView(view, range)),
    stays: arriving.source === null ? [] : staysIn(view, arriving.ranges, segment.leaves),
    input: envelope === null ? input.response : product([input.response, envelope]),
    output: product([output.response, segment.overBound(view.channel, view.parts)]),
  });
  if (found === null) return null;
  const scale = rateScale(view, [
    { frequencyHz: found.nearHz, range: segment.leaves },
    { frequencyHz: found.farHz, range: arriving.ranges },
  ]);
  return {
    overDb: arriving.levelDb + toDb(found.logGain),
    frequencyHz: found.nearHz * scale,
    from: { source: arriving.source, frequency: found.farHz * scale },
    gapDb: found.gapDb,
    worstAt: joinWorst(
      input.worstAt(found.farHz),
      output.worstAt(found.nearHz),
      view.parts === 'nominal' ? null : rateDeviation(channel, scale * relay.rateHz),
    ),
    evaluations: found.evaluations,
  };
}

function envelopeIn(view: RelayView, envelope: Response | null): Response | null {
  if (envelope === null || view.parts === 'nominal') return envelope;
  return stretched(envelope, axisFactors(view.channel).periods, 'largest');
}
