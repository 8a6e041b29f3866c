/** Where a source may stand: its whole range, the part outside the wanted bands that can alias, and the part inside that overlaps. */
import type { Enclosure } from '../signal/response';
import type { Channel, Source, WantedBand } from '../spec/channel';
import { arrivalsOf } from './arrivals';
import type { Overlap } from './figures';
import { intersection } from './intervals';
import { toneRange } from './tolerances';

/** Every frequency at which a source may stand, without its harmonics; `anything` stands everywhere. */
export function sourceRange(source: Source): Enclosure {
  switch (source.kind) {
    case 'tone':
      return toneRange(source);
    case 'band':
      return { low: source.lowHz, high: source.highHz };
    case 'anything':
      return { low: 0, high: Infinity };
    case 'spectrum':
      return { low: source.points[0]?.frequencyHz ?? 0, high: source.points.at(-1)?.frequencyHz ?? 0 };
  }
}

/** The wanted bands as intervals. */
export function wantedRanges(channel: Channel): readonly Enclosure[] {
  return channel.wanted.map(rangeOf);
}

/** The sources that reach into a wanted band, themselves or by a harmonic, each once with its widest stretch there. */
export function overlapsOf(channel: Channel): readonly Overlap[] {
  return channel.unwanted.flatMap((source, index) => {
    if (source.kind === 'anything') return [];
    let widest: Overlap | null = null;
    for (const { harmonic, range } of arrivalsOf(source)) {
      for (const band of channel.wanted) {
        for (const { low, high } of insideOf(range, rangeOf(band))) {
          const wider: boolean = widest === null || high - low > widest.highHz - widest.lowHz;
          if (wider) widest = { index, harmonic, lowHz: low, highHz: high };
        }
      }
    }
    return widest === null ? [] : [widest];
  });
}

/** A stretch of positive width, or a fixed tone strictly inside: touching an edge is not overlapping. */
function insideOf(range: Enclosure, wanted: Enclosure): readonly Enclosure[] {
  const common = intersection([range], [wanted]);
  return common.filter(
    (one) => one.low < one.high || (range.low === range.high && wanted.low < one.low && one.high < wanted.high),
  );
}

function rangeOf(band: WantedBand): Enclosure {
  return { low: band.lowHz, high: band.highHz };
}
