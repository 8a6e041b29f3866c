/** Hover of a clock's or a filter's name: its definition, and who uses it. */
import { formatCount } from '../../units/format';
import { spanOf, type DefinedName } from '../../spec';
import type { SpecDocument } from '../spec-document';
import type { Answer } from './answer';

/** How much of a definition is shown. */
const longestDefinition = 400;

const spaceWords: Readonly<Record<DefinedName['space'], string>> = {
  clocks: 'clock',
  filters: 'filter',
  sources: 'source',
  masks: 'mask',
};

/** A name that is defined in this file. */
export function nameHover(document: SpecDocument, defined: DefinedName): Answer {
  const { reading } = document;
  const { start, end } = spanOf(reading, defined.place);
  const kind = spaceWords[defined.space];
  const users = defined.users.map((user) => `\`${user}\``);
  return {
    headline: `${kind} \`${defined.name}\`, used by ${formatCount(users.length, 'channel')}`,
    rows: [
      ['defined as', shortened(reading.text.slice(start, end))],
      ['used by', users.length === 0 ? 'no channel' : users.join(', ')],
    ],
    formula: null,
  };
}

/** A definition on one line, without its comments. */
function shortened(definition: string): string {
  const line = definition
    .split(/\r?\n/)
    .map((part) => part.replace(/(^|\s)#.*$/, '').trim())
    .filter((part) => part !== '')
    .join(' ');
  return line.length > longestDefinition ? `${line.slice(0, longestDefinition)} …` : line;
}
