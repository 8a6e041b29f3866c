/** Between the places that a picture's items name and the lines of the newest text. */
import type { Position, Range } from 'vscode-languageserver-types';
import type { PlaceName } from '../protocol/position';
import { exists, placeAt, spanOf } from '../spec';
import type { SpecDocument } from './spec-document';
import { offsetOf, rangeOf } from './text-range';

/** The place's range, or null where it no longer stands. */
export function locate(document: SpecDocument, place: PlaceName): Range | null {
  if (!exists(document.reading, place)) return null;
  return rangeOf(document.reading, spanOf(document.reading, place));
}

/** The innermost place at a position, or null between places. */
export function placeNameAt(document: SpecDocument, position: Position): PlaceName | null {
  const at = placeAt(document.reading, offsetOf(document.reading, position));
  return at && { channel: at.place.channel, path: at.place.path };
}

/** The channel whose text a position is in, or null outside all of them. */
export function channelAt(document: SpecDocument, position: Position): string | null {
  const place = placeNameAt(document, position);
  return place?.channel ?? null;
}
