/** What YAML has and the language does without: anchors, aliases, tags, explicit and empty keys. */
import type { Oddity } from '../yaml-tree';
import { fault } from './fault';
import { contentEnd, passed, quotes, spaces } from './diagnosis';
import type { Diagnosis } from './diagnosis';

/** The fault of an oddity. */
export function oddityFault(text: string, { kind, start, end, name }: Oddity): Diagnosis {
  switch (kind) {
    case 'alias':
      return signed(
        text,
        start,
        end,
        `\`*${name}\` is a YAML alias, which a spec does without: name a filter under \`filters\`, or take over a channel with \`like\`.`,
      );
    case 'anchor':
      return removable(
        start,
        end,
        `\`&${name}\` is a YAML anchor, which a spec does without: give a filter a name under \`filters\`, or use \`like\`.`,
      );
    case 'tag':
      return name === '!'
        ? signed(
            text,
            start,
            contentEnd(text, start),
            'A text cannot begin with `!`, which begins a tag in YAML: put it in quotes.',
          )
        : removable(start, end, `\`${name}\` is a YAML tag, which a spec does without: every value is read as it is written.`);
    case 'explicit-key':
      return passed(start, end, 'A `?` begins an explicit key, which a spec does without: write `key: value`.', null);
    case 'empty-key':
      return passed(start, end, 'A key is missing in front of this colon.', null);
    case 'odd-key':
      return passed(start, end, 'A list or a map cannot be a key: put a text with brackets in quotes.', null);
    case 'too-deep':
      return passed(start, end, 'This nests deeper than any spec does: what is inside is not read.', null);
  }
}

/** It may have been meant as text. */
function signed(text: string, start: number, end: number, message: string): Diagnosis {
  return passed(start, end, message, null, [quotes(text, start, end)]);
}

function removable(start: number, end: number, message: string): Diagnosis {
  const cure = { title: 'Delete it', mends: [{ start, end, newText: '' }] };
  return { fault: fault(start, end, message, [cure]), mends: [spaces(start, end)], certain: true };
}
