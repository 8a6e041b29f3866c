/** Where each harmonic of a source, or each line of its table, lands by itself, for whoever explains which of them is the strongest. */
import type { Channel, Source, ToneSource } from '../spec/channel';
import { aliasesOf } from './alias';
import { arrivalsOf, type Arrival } from './arrivals';
import type { AliasFigure } from './figures';
import { limitOf } from './limits';
import { relayAliases } from './relay/aliases';

/** Tones that are looked at one by one; what lies beyond them in a longer list is not told apart. */
const mostTones = 256;

/** What of a source lands in a protected range, tone by tone, the strongest first; of a source that is one tone only that one. */
export function toneLandings(channel: Channel, source: Source): readonly AliasFigure[] {
  const arrivals = arrivalsOf(source).slice(0, mostTones);
  const alone = arrivals.map((arrival) => onlyTone(source, arrival));
  const limit = limitOf(channel, 'alias');
  const each = { ...channel, unwanted: alone };
  const { figures } = channel.direction === 'relay' ? relayAliases(each, limit) : aliasesOf(each, limit);
  return figures
    .map((figure, index) => ({ ...figure, harmonic: arrivals[index]?.harmonic ?? 1 }))
    .filter(({ level }) => level !== null)
    .sort((a, b) => (b.level ?? -Infinity) - (a.level ?? -Infinity));
}

/** The source as if it sent nothing but one of its tones. */
function onlyTone(source: Source, { harmonic, levelDb, stillHz, range }: Arrival): Source {
  switch (source.kind) {
    case 'tone':
      return { ...source, frequencyHz: harmonic * source.frequencyHz, levelDb, harmonics: null };
    case 'band':
      return { ...source, lowHz: range.low, highHz: range.high, levelDb, harmonics: null };
    case 'spectrum':
      return stillHz === null ? source : lineOf(source, stillHz, levelDb);
    case 'anything':
      return source;
  }
}

function lineOf({ name, ref, enters }: Source, frequencyHz: number, levelDb: number): ToneSource {
  return { kind: 'tone', name, ref, enters, frequencyHz, tolerance: { low: 0, high: 0 }, levelDb, harmonics: null };
}
