/** Every copy of a wanted band with its levels before and behind the filter: of a hold at the output frequency, of a relay by the weight of each copy. */
import { gainDb, relayPath, weightResponse, worstPath } from '../analysis';
import type { ChannelPath, Enclosure, Response } from '../analysis';
import { copiesOf, leavesAt } from '../analysis/copies';
import type { Copy } from '../analysis/copies';
import type { WantedBand } from '../spec/channel';
import type { Subject } from './subject';

/** One copy of a wanted band, the wanted one included. */
export interface CopyView {
  readonly band: WantedBand;
  /** Index into `wanted`. */
  readonly index: number;
  readonly copy: Copy;
  /** Where it leaves. */
  readonly range: Enclosure;
  readonly wanted: boolean;
  /** The wanted frequency that leaves at an output frequency. */
  readonly wantedHz: (outputHz: number) => number;
  /** The level as hold or gate leave it, dBFS, at an output frequency. */
  readonly beforeDb: (outputHz: number) => number;
  /** The level behind the output filter, at the largest that the tolerances allow. */
  readonly afterDb: (outputHz: number) => number;
}

/** All copies up to a multiple of the rate, of every wanted band. */
export function copiesUpTo(subject: Subject, lastFold: number): readonly CopyView[] {
  const { channel } = subject;
  const gains = channel.direction === 'relay' ? relayGains(subject) : null;
  return channel.wanted.flatMap((band, index) =>
    gains === null ? heldCopies(subject, band, index, lastFold) : relayedCopies(band, index, channel.rate.hz, lastFold, gains),
  );
}

function heldCopies({ channel, path, largest }: Subject, band: WantedBand, index: number, lastFold: number): CopyView[] {
  const rateHz = channel.rate.hz;
  const { baseband, wanted } = copiesOf({ low: band.lowHz, high: band.highHz }, rateHz);
  return [{ fold: 0, side: 'upper' } as const, ...sidesUpTo(lastFold)].map((copy) => {
    const ends = [leavesAt(copy, rateHz, baseband.low), leavesAt(copy, rateHz, baseband.high)];
    return {
      band,
      index,
      copy,
      range: { low: Math.min(...ends), high: Math.max(...ends) },
      wanted: copy.fold === wanted.fold && copy.side === wanted.side,
      wantedHz: (outputHz) => leavesAt(wanted, rateHz, Math.abs(outputHz - copy.fold * rateHz)),
      beforeDb: (outputHz) => band.levelDb + gainDb(path.pulse, outputHz),
      afterDb: (outputHz) => band.levelDb + gainDb(largest, outputHz),
    };
  });
}

/** What a relay channel does to a tone before the sampling, in it and behind it. */
export interface RelayGains {
  readonly input: Response;
  readonly largestInput: Response;
  readonly largestOutput: Response;
  /** The weight of copy k at an output frequency, dB. */
  readonly weightDb: (copy: number, outputHz: number) => number;
}

/** The gains of a relay channel, with levels counted from where they are stated. */
export function relayGains({ channel }: Subject): RelayGains {
  const relay = relayPath(channel);
  const referenceHz = channel.levelsAt === 'sampler' ? channel.referenceHz : null;
  const largest = (side: ChannelPath, from: number | null): Response =>
    worstPath(side, { sense: 'largest', referenceHz: from, axis: 'hertz' }).response;
  const weights = new Map<number, Response>();
  const weightOf = (copy: number): Response => {
    const weight = weights.get(copy) ?? weightResponse(relay.weights.copy(copy));
    weights.set(copy, weight);
    return weight;
  };
  const shift = referenceHz === null ? 0 : -gainDb(relay.input.total, referenceHz);
  return {
    input: { ...relay.input.total, logGain: (f) => relay.input.total.logGain(f) + (shift * Math.LN10) / 20 },
    largestInput: largest(relay.input, referenceHz),
    largestOutput: largest(relay.output, null),
    weightDb: (copy, outputHz) => gainDb(weightOf(copy), outputHz),
  };
}

function relayedCopies(
  band: WantedBand,
  index: number,
  rateHz: number,
  lastFold: number,
  { input, largestInput, largestOutput, weightDb }: RelayGains,
): CopyView[] {
  return [{ fold: 0, side: 'upper' } as const, ...sidesUpTo(lastFold)].map((copy) => {
    const centre = copy.fold * rateHz;
    // A lower side that would reach below 0 Hz is mirrored there: it is copy −k of the band itself.
    const mirrored = copy.side === 'lower' && band.lowHz >= centre;
    const ends = [band.lowHz, band.highHz].map((f) => (copy.side === 'upper' ? centre + f : Math.abs(centre - f)));
    const crosses = copy.side === 'lower' && band.lowHz < centre && centre < band.highHz;
    const wantedHz = (outputHz: number): number => (mirrored ? centre + outputHz : Math.abs(outputHz - centre));
    const before = (outputHz: number): number => band.levelDb + weightDb(mirrored ? -copy.fold : copy.fold, outputHz);
    return {
      band,
      index,
      copy,
      range: { low: crosses ? 0 : Math.min(...ends), high: Math.max(...ends) },
      wanted: copy.fold === 0,
      wantedHz,
      beforeDb: (outputHz) => before(outputHz) + gainDb(input, wantedHz(outputHz)),
      afterDb: (outputHz) => before(outputHz) + gainDb(largestInput, wantedHz(outputHz)) + gainDb(largestOutput, outputHz),
    };
  });
}

/** The copies on both sides of each multiple of the rate. */
function sidesUpTo(lastFold: number): Copy[] {
  return Array.from({ length: lastFold }, (_, index) => index + 1).flatMap((fold): Copy[] => [
    { fold, side: 'lower' },
    { fold, side: 'upper' },
  ]);
}
