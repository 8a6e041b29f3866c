/** One thing that could be written at the cursor. */
import type { Span } from '../place';
import type { Key } from '../shape';

/** A key, a word or a name, with what it means and what to write for it. */
export interface Completion {
  readonly label: string;
  readonly kind: 'key' | 'word' | 'name';
  /** What it means, from the declaration. */
  readonly about: string;
  /** The text to write in place of `span`. */
  readonly newText: string;
  /** What stands there already, in offsets of the file. */
  readonly span: Span;
  /** What the declaration has for a key; null for words and names. */
  readonly key: Key | null;
  /** Whether its map cannot do without it. */
  readonly required: boolean;
}
