/** Positions as both ends of every channel see them: zero-based lines and UTF-16 characters. */

/** A point in a text. */
export interface Position {
  readonly line: number;
  readonly character: number;
}

/** A stretch of a text, end exclusive. */
export interface Range {
  readonly start: Position;
  readonly end: Position;
}

/** A place in a spec by channel and path, as the spec layer names it. */
export interface PlaceName {
  readonly channel: string | null;
  readonly path: readonly (string | number)[];
}
