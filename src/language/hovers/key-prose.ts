/** What the declaration says of a key: what it holds, in which units, which words, and what holds without it. */
import type { Key } from '../../spec';
import { unitsOf } from '../../units/unit-table';

/** Markdown that reads well as plain text too. */
export function keyProse(name: string | null, key: Key): string {
  const { scalar } = key.shape;
  const kinds = scalar?.quantity ?? scalar?.range ?? [];
  const words = Object.entries(scalar?.words ?? {});
  const parts = [
    name === null ? key.about : `\`${name}\`: ${key.about}`,
    key.later === true ? 'Not supported yet.' : null,
    kinds.length === 0 ? null : `Units: ${[...new Set(unitsOf(kinds).map(({ unit }) => unit))].join(', ')}.`,
    words.length === 0 ? null : words.map(([word, about]) => `- \`${word}\`: ${about}`).join('\n'),
    key.fallback === undefined ? null : `Default: ${key.fallback}.`,
  ];
  return parts.filter((part) => part !== null).join('\n\n');
}
