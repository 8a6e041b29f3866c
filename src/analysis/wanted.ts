/** What sampling does to the wanted bands: their zones, where they appear, and whether they fold. */
import { foldFrequency, zoneOf } from '../signal/folding';
import type { Enclosure } from '../signal/response';
import type { Band, Channel } from '../spec/channel';
import type { SamplingFault, WantedFigure } from './figures';
import { rateRange } from './tolerances';

/** Both floors and all edges take this relative slack, because 1.1 / (1.1 − 1.0) is not 11 in double precision. */
const slack = 1e-12;

/** The wanted bands' figures, in their order. */
export function wantedFigures(channel: Channel): readonly WantedFigure[] {
  return channel.wanted.map((band) => {
    const zone = zoneOf(band.lowHz, channel.rate.hz);
    const stays = channel.direction !== 'capture';
    const appears = appearance(band, channel.rate.hz);
    return {
      name: band.name,
      low: band.lowHz,
      high: band.highHz,
      level: band.levelDb,
      appearsLow: stays ? band.lowHz : appears.low,
      appearsHigh: stays ? band.highHz : appears.high,
      zone,
      inverted: zone % 2 === 0,
    };
  });
}

/** Where a band appears between 0 and half the rate; a band that folds reaches the edge it folds at. */
export function appearance(band: Band, rateHz: number): Enclosure {
  const low = foldFrequency(band.lowHz, rateHz).landsHz;
  const high = foldFrequency(band.highHz, rateHz).landsHz;
  const edges = foldedEdges(band.lowHz, band.highHz, rateHz / 2);
  return { low: Math.min(low, high, ...edges), high: Math.max(low, high, ...edges) };
}

/** Where the multiples of half the rate inside a band land: one is an end of 0 … half the rate, two are both. */
function foldedEdges(lowHz: number, highHz: number, halfHz: number): readonly number[] {
  const first = Math.floor((lowHz / halfHz) * (1 + slack)) + 1;
  const beyond = highHz / halfHz - first;
  if (beyond <= slack * first) return [];
  return beyond > 1 ? [0, halfHz] : [first % 2 === 0 ? 0 : halfHz];
}

/** Everything that is wrong with how the wanted bands are sampled, at any rate that the clock's tolerance allows. */
export function samplingFaults(channel: Channel): readonly SamplingFault[] {
  const own = channel.wanted.flatMap((band, index) => foldFault(guarded(channel, band), index, channel));
  const folds = new Set(own.filter((fault) => fault.kind === 'wanted-folds').map((fault) => fault.index));
  const whole = channel.wanted.flatMap((band, index) => (folds.has(index) ? [] : [{ band: guarded(channel, band), index }]));
  const pairs = whole.flatMap((later, position) =>
    whole
      .slice(0, position)
      .flatMap((earlier): readonly SamplingFault[] =>
        meetAfterFolding(channel, earlier.band, later.band)
          ? [{ kind: 'wanted-folds', index: later.index, onto: earlier.index, edgeHz: null }]
          : [],
      ),
  );
  return [...own, ...pairs];
}

/** Whether each wanted band stays whole and clear of the others at another rate, which is as exact as the present one. */
export function keepsWhole(channel: Channel, rateHz: number): boolean {
  const faults = samplingFaults({ ...channel, rate: { ...channel.rate, hz: rateHz } });
  return faults.every(({ kind }) => kind !== 'wanted-folds');
}

/** A wanted band with its guard on both sides. */
export function guarded(channel: Channel, band: Band): Band {
  return { lowHz: Math.max(0, band.lowHz - channel.guardHz), highHz: band.highHz + channel.guardHz };
}

/** The first multiple of half the rate, k ≥ 1, that some allowed rate puts inside the band or on its edge. */
function foldFault(band: Band, index: number, channel: Channel): readonly SamplingFault[] {
  const rates = rateRange(channel.rate);
  const fault = (kind: SamplingFault['kind'], multiple: number): readonly SamplingFault[] => [
    { kind, index, onto: null, edgeHz: (multiple * channel.rate.hz) / 2 },
  ];
  const above = Math.max(1, Math.floor(((2 * band.lowHz) / rates.high) * (1 + slack)) + 1);
  const upper = (above * rates.low) / 2;
  if (upper < band.highHz * (1 - slack)) return fault('wanted-folds', above);
  const below = above - 1;
  if (below >= 1 && (below * rates.high) / 2 >= band.lowHz * (1 - slack)) return fault('wanted-touches', below);
  return upper <= band.highHz * (1 + slack) ? fault('wanted-touches', above) : [];
}

/** Whether two bands overlap as they appear at either end of the clock's tolerance, or change places between the ends. */
function meetAfterFolding(channel: Channel, one: Band, other: Band): boolean {
  const rates = rateRange(channel.rate);
  const orders = [rates.low, channel.rate.hz, rates.high].map((rateHz) =>
    orderOf(appearance(one, rateHz), appearance(other, rateHz), slack * rateHz),
  );
  return orders.includes('overlap') || new Set(orders).size > 1;
}

function orderOf(one: Enclosure, other: Enclosure, tolerance: number): 'below' | 'above' | 'overlap' {
  if (one.high <= other.low + tolerance) return 'below';
  return one.low >= other.high - tolerance ? 'above' : 'overlap';
}
