/** What follows a key when it is completed: a choice of its words, the fields it cannot do without, or nothing where it may be more than one form. */
import type { Key } from '../spec';

/** The snippet behind `key: `; null where there is nothing to fill in. */
export function snippetAfter(key: Key): string | null {
  const { scalar, map } = key.shape;
  if (map !== undefined && 'fields' in map) {
    if (scalar !== undefined) return null;
    const needed = Object.entries(map.fields).filter(([, field]) => field.required === true && field.with === undefined);
    return needed.length === 0 ? null : `{ ${needed.map(([name], index) => `${name}: $${index + 1}`).join(', ')} }$0`;
  }
  const words = Object.keys(scalar?.words ?? {});
  const { quantity, range, name, text } = scalar ?? {};
  const onlyWords = quantity === undefined && range === undefined && name === undefined && text === undefined;
  return onlyWords && words.length > 1 ? `\${1|${words.join(',')}|}$0` : null;
}

/** Text that stands for itself in a snippet. */
export function plainInSnippet(text: string): string {
  return text.replace(/[\\$}]/g, '\\$&');
}
