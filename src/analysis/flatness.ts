/** How flat the wanted band comes out: the proved largest departure of the gain from its value at the reference, and the droop at the top edge. */
import type { Enclosure } from '../signal/response';
import { inverse } from '../signal/response-algebra';
import { largestOverBands } from '../signal/search';
import type { Extreme } from '../signal/search';
import type { Channel } from '../spec/channel';
import { lossDb } from './channel-path';
import type { ChannelPath } from './channel-path';
import { toDb } from './decibels';
import type { WorstAt } from './figures';
import { contains } from './intervals';
import { wantedRanges } from './source-range';
import { partsVary } from './tolerances';
import { nominalPath, worstPath } from './worst-path';
import type { WorstPath } from './worst-path';

/** The largest departure either way, in dB. */
export interface Flatness {
  readonly valueDb: number;
  readonly nominalDb: number;
  readonly frequencyHz: number;
  readonly gapDb: number;
  readonly worstAt: WorstAt | null;
  readonly evaluations: number;
}

/** Flatness over all wanted bands, nominally and at the worst of the tolerances; null without a wanted band. */
export function flatnessOf(channel: Channel, path: ChannelPath): Flatness | null {
  const referenceHz = channel.referenceHz;
  if (path.total.logGain(referenceHz) === -Infinity) return endless(channel);
  const plain = nominalPath(path, referenceHz);
  const nominal = departure(path, plain, plain);
  if (nominal === null) return null;
  const nominalDb = toDb(nominal.logGain);
  if (!partsVary(channel)) return figureOf(nominal, nominalDb, nominal.evaluations);
  const most = worstPath(path, { sense: 'largest', referenceHz, axis: 'hertz' });
  const least = worstPath(path, { sense: 'smallest', referenceHz, axis: 'hertz' });
  const worst = departure(path, most, least) ?? nominal;
  return figureOf(worst, nominalDb, nominal.evaluations + worst.evaluations);
}

/** Loss in dB from the reference to the top wanted edge; a gain counts negative. Null without a wanted band. */
export function droopOf(channel: Channel, path: ChannelPath): number | null {
  if (channel.wanted.length === 0) return null;
  const top = Math.max(...channel.wanted.map((band) => band.highHz));
  return lossDb(path.total, top, channel.referenceHz);
}

/** Where nothing comes through at the reference, whatever does is endlessly stronger; said of the band's edge that is not the reference. */
function endless({ wanted, referenceHz }: Channel): Flatness | null {
  const edges = wanted.flatMap((band) => [band.lowHz, band.highHz]);
  const frequencyHz = edges.find((edge) => edge !== referenceHz);
  if (frequencyHz === undefined) return null;
  return { valueDb: Infinity, nominalDb: Infinity, frequencyHz, gapDb: 0, worstAt: null, evaluations: 1 };
}

interface Departure extends Extreme {
  readonly path: WorstPath;
}

/** The larger of the largest rise and the largest loss. */
function departure(path: ChannelPath, most: WorstPath, least: WorstPath): Departure | null {
  const bands = wantedRanges(path.channel);
  const rise = largestOverBands(most.response, bands);
  // A null in the band is the answer, and a search by halving would only come near it.
  const loss = largestOverBands(inverse(least.response), [...nullsWithin(path, bands), ...bands]);
  if (rise === null || loss === null) return null;
  const worst = loss.logGain >= rise.logGain ? loss : rise;
  return {
    logGain: worst.logGain,
    frequencyHz: worst.frequencyHz,
    gapDb: worst.gapDb,
    evaluations: rise.evaluations + loss.evaluations,
    path: worst === loss ? least : most,
  };
}

/** The nulls of the stages in bands, each as a band of no width. */
function nullsWithin(path: ChannelPath, bands: readonly Enclosure[]): readonly Enclosure[] {
  return path.stages.flatMap(({ filter }) =>
    (filter?.zeros ?? []).flatMap(({ re, im }) => (re === 0 && contains(bands, im) ? [{ low: im, high: im }] : [])),
  );
}

function figureOf(extreme: Departure, nominalDb: number, evaluations: number): Flatness {
  const valueDb = Math.max(toDb(extreme.logGain), 0);
  return {
    valueDb,
    nominalDb: Math.min(Math.max(nominalDb, 0), valueDb),
    frequencyHz: extreme.frequencyHz,
    gapDb: extreme.gapDb,
    worstAt: extreme.path.worstAt(extreme.frequencyHz),
    evaluations,
  };
}
