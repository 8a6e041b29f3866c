/** Copies a piece of a text, so that keeping the piece does not keep the whole text alive. */

/** The same text without a tie to the one it was cut from: an engine keeps a slice as a view of its parent. */
export function ownText(piece: string): string {
  return piece.length === 0 ? piece : `\n${piece}`.slice(1);
}
