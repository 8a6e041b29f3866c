/** What a generate channel lets out in some bands outside its wanted ones: the copies of everything that it makes, to infinity. */
import { product } from '../signal/response-algebra';
import { largestOverFolds } from '../signal/search';
import type { FoldExtreme, FoldQuestion } from '../signal/search';
import type { Channel, WantedBand } from '../spec/channel';
import { onAxis } from './axis';
import type { ChannelPath } from './channel-path';
import { copiesOf, leavesAt } from './copies';
import type { Copy } from './copies';
import { toDb } from './decibels';
import { assumptions, rateScale } from './image';
import type { Assumption } from './image';
import { strongest } from './leaving';
import type { Leaving, LeavingPair, OutputSegment } from './leaving';
import { deviation, joinWorst, partsVary, rateLabel, varies } from './tolerances';
import { nominalPath, worstPath } from './worst-path';

/** The strongest of what leaves, nominally and at the worst of the tolerances. */
export function leavingOfGenerate(channel: Channel, path: ChannelPath, segment: OutputSegment): LeavingPair {
  const nominal = strongest(
    channel.wanted.map((band) => {
      const copies = copiesOf({ low: band.lowHz, high: band.highHz }, path.rateHz);
      return leavingOf({ channel, band, segment, at: 'nominal' }, { path, copies });
    }),
  );
  if (!partsVary(channel)) return { nominal, worst: nominal };
  const worst = channel.wanted.flatMap((band) =>
    assumptions(channel, path, { low: band.lowHz, high: band.highHz }).map((one) =>
      leavingOf({ channel, band, segment, at: 'worst' }, one),
    ),
  );
  return { nominal, worst: strongest(worst) };
}

/** Every copy but the wanted one, which only touches the bands that are looked at. */
function allBut({ fold, side }: Copy): readonly Pick<FoldQuestion, 'firstFold' | 'lastFold' | 'sides'>[] {
  return [
    { firstFold: 0, lastFold: fold - 1, sides: 'both' },
    { firstFold: fold, lastFold: fold, sides: side === 'upper' ? 'lower' : 'upper' },
    { firstFold: fold + 1, lastFold: Infinity, sides: 'both' },
  ];
}

function largestOf(all: readonly (FoldExtreme | null)[]): FoldExtreme | null {
  const found = all.filter((one) => one !== null);
  const [first, ...others] = found;
  if (first === undefined) return null;
  const best = others.reduce((most, one) => (one.logGain > most.logGain ? one : most), first);
  return { ...best, evaluations: found.reduce((sum, one) => sum + one.evaluations, 0) };
}

interface Question {
  readonly channel: Channel;
  readonly band: WantedBand;
  readonly segment: OutputSegment;
  readonly at: 'nominal' | 'worst';
}

function leavingOf({ channel, band, segment, at }: Question, { path, copies }: Assumption): Leaving | null {
  const rateHz = path.rateHz;
  const worst =
    at === 'nominal' ? nominalPath(path, null) : worstPath(path, { sense: 'largest', referenceHz: null, axis: 'periods' });
  const within = at === 'nominal' ? segment.leaves : segment.leaves.map((range) => onAxis(path.channel, 'periods', range));
  const outer = product([worst.response, segment.overBound(path.channel, at)]);
  const found = largestOf(
    allBut(copies.wanted).map((run) =>
      largestOverFolds({ rateHz: { low: rateHz, high: rateHz }, outer, inner: null, bands: [copies.baseband], within, ...run }),
    ),
  );
  if (found === null) return null;
  const wantedHz = leavesAt(copies.wanted, rateHz, found.landsHz);
  const scale = at === 'nominal' ? 1 : rateScale(path.channel, band, wantedHz);
  const { rate } = channel;
  const clock = varies(rate.tolerance) ? { [rateLabel(rate)]: deviation((scale * rateHz) / rate.hz, rate.tolerance) } : null;
  return {
    overDb: band.levelDb + toDb(found.logGain),
    frequencyHz: found.frequencyHz * scale,
    from: { source: null, frequency: wantedHz * scale },
    gapDb: found.gapDb,
    worstAt: at === 'nominal' ? null : joinWorst(worst.worstAt(found.frequencyHz), clock),
    evaluations: found.evaluations,
  };
}
