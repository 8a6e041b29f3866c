/** Where a shared definition, or a part of it, stands in a channel that uses it. */
import { spanOf, type Channel, type DefinedName, type Path, type Reading } from '../../spec';

/** The keys under which a channel may name a filter. */
const filterKeys = ['filter', 'input-filter', 'output-filter'] as const;

/** The channel's path to what it names; null where it has no answer of its own there. */
export function pathForUser(reading: Reading, channel: Channel, defined: DefinedName, rest: Path): Path | null {
  switch (defined.space) {
    case 'filters': {
      const key = filterKeys.find((candidate) => isNamedAt(reading, channel, [candidate], defined.name));
      return [key ?? (channel.direction === 'relay' ? 'input-filter' : 'filter'), ...rest];
    }
    case 'sources': {
      const index = channel.unwanted.findIndex(
        (source, at) => source.name === defined.name || isNamedAt(reading, channel, ['unwanted', at], defined.name),
      );
      return index < 0 ? null : ['unwanted', index, ...rest];
    }
    case 'masks': {
      const limit = channel.masks.find(({ mask }) => mask === defined.name);
      return limit === undefined ? null : ['limits', limit.key, ...rest];
    }
    case 'clocks':
      return rest[0] === 'jitter' ? ['jitter'] : null;
  }
}

/** Whether just this name stands at a place of the channel. */
function isNamedAt(reading: Reading, channel: Channel, path: Path, name: string): boolean {
  const { start, end } = spanOf(reading, { channel: channel.name, path });
  return reading.text.slice(start, end).replace(/^(["'])(.*)\1$/u, '$2') === name;
}
