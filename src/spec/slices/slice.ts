/** A stretch of a spec that is parsed alone: a key at the top of the file with all that belongs to it, or one channel. */

/** One slice. Slices follow each other without overlap; what stands before the first is only comments. */
export interface Slice {
  readonly kind: 'top' | 'channel';
  /** Offset in the file at which the slice's text starts. */
  readonly start: number;
  /** The text, in which faulty lines that are to be passed over have been turned to spaces. */
  readonly text: string;
  /** What is put in front of the text for the parser, so that it sees the same parent. */
  readonly lead: string;
  /** A fault found while cutting stands in it, so that it cannot be whole. */
  readonly doubtful: boolean;
}

/** What the parser of every channel slice sees above it. */
export const channelsLine = 'channels:\n';
