/** The words of the language that telling a slip from a name needs, collected from the declaration. */
import { declaration } from './declaration/top-level';
import type { Shape } from './shape';

/** Keys by where they may stand. */
export interface Vocabulary {
  /** Keys at the top of a file. */
  readonly top: ReadonlySet<string>;
  /** Keys of a channel. */
  readonly channel: ReadonlySet<string>;
  /** Every key anywhere. */
  readonly all: ReadonlySet<string>;
}

/** The language's own vocabulary. */
export const vocabulary: Vocabulary = vocabularyOf(declaration);

function vocabularyOf(file: Shape<unknown>): Vocabulary {
  const all = new Set<string>();
  collect(file, all, new Set());
  const top = keysOf(file);
  const channels = file.map !== undefined && 'fields' in file.map ? file.map.fields['channels']?.shape.map : undefined;
  const channel = channels !== undefined && 'each' in channels ? keysOf(channels.each) : new Set<string>();
  return { top, channel, all };
}

function keysOf(shape: Shape<unknown>): Set<string> {
  return new Set(shape.map !== undefined && 'fields' in shape.map ? Object.keys(shape.map.fields) : []);
}

function collect(shape: Shape<unknown>, all: Set<string>, seen: Set<Shape<unknown>>): void {
  if (seen.has(shape)) return;
  seen.add(shape);
  if (shape.list !== undefined) collect(shape.list.each, all, seen);
  if (shape.map === undefined) return;
  if ('each' in shape.map) {
    collect(shape.map.each, all, seen);
    return;
  }
  for (const [key, { shape: below }] of Object.entries(shape.map.fields)) {
    all.add(key);
    collect(below, all, seen);
  }
}
