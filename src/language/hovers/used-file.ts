/** Hover of a path under `use`: what the other spec offers, and who takes it. */
import { namesOffered, type OfferedName, type Reading } from '../../spec';
import { formatCount } from '../../units/format';
import type { Answer, Row } from './answer';

/** The used spec, or null where it has not been read. */
export function usedFileHover(reading: Reading, written: string): Answer | null {
  const names = namesOffered(reading, written);
  if (names === null) return null;
  const taken = names.filter(({ users }) => users.length > 0).length;
  return {
    headline: `\`${written}\` offers ${formatCount(names.length, 'name')}, ${taken === 0 ? 'none of which is' : `${taken} of them`} used here`,
    rows: names.map(nameRow),
    formula: null,
  };
}

const words: Readonly<Record<OfferedName['space'], string>> = {
  clocks: 'clock',
  filters: 'filter',
  sources: 'source',
  masks: 'mask',
};

function nameRow({ space, name, users }: OfferedName): Row {
  const by = users.map((user) => `\`${user}\``).join(', ');
  return [`${words[space]} \`${name}\``, users.length === 0 ? 'not used here' : `used by ${by}`];
}
