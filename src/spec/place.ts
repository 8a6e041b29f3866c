/** How the other layers point into a spec without carrying offsets: a channel and a path below it. */

/** Keys and list indices from a channel (or from the top of the file) down to a value, e.g. ['limits', 'alias'] or ['filter', 1, 'corner']. */
export type Path = readonly (string | number)[];

/**
 * A place in a spec. With a channel, the path is that channel's own: `like` and names of filters, clocks and
 * sources are followed when it is turned into a span, so ['filter', 1, 'corner'] of a channel whose filter is a
 * name leads into `filters`. With `channel: null` the path starts at the top of the file.
 * A single stage, source or wanted band that stands where a list may stand is index 0 of that list.
 */
export interface Place {
  readonly channel: string | null;
  readonly path: Path;
  /** Which part of the pair: its value (default), its key, or both with what lies between. */
  readonly part?: 'value' | 'key' | 'pair';
}

/** A stretch of a file's text as UTF-16 offsets, end exclusive. */
export interface Span {
  readonly start: number;
  readonly end: number;
}
