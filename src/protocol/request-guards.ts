/** Guards for the parameters of requests, standard and our own: the server puts them at its door. */
import { isCount, isNullOr, isPlaceName, isRecord, isText } from './guards';
import type { Position, Range } from './position';
import type { CountsParams, LocateParams, PictureParams, PlaceAtParams, ReadFileResult } from './requests';

/** Parameters of a standard request about a document. */
export function isAboutDocument(value: unknown): value is { textDocument: { uri: string } } {
  return isRecord(value) && isRecord(value['textDocument']) && isText(value['textDocument']['uri']);
}

/** Parameters of a standard request about a position in a document. */
export function isAboutPosition(value: unknown): value is { textDocument: { uri: string }; position: Position } {
  return isRecord(value) && isPosition(value['position']) && isAboutDocument(value);
}

/** Parameters of `bandkeep/picture`. */
export function isPictureParams(value: unknown): value is PictureParams {
  return isRecord(value) && isText(value['uri']) && isNullOr(value['channel'], isText) && isNullOr(value['position'], isPosition);
}

/** Parameters of `bandkeep/locate`. */
export function isLocateParams(value: unknown): value is LocateParams {
  return isRecord(value) && isText(value['uri']) && isPlaceName(value['place']);
}

/** Parameters of `bandkeep/placeAt`. */
export function isPlaceAtParams(value: unknown): value is PlaceAtParams {
  return isRecord(value) && isText(value['uri']) && isPosition(value['position']);
}

/** Parameters of `bandkeep/counts`. */
export function isCountsParams(value: unknown): value is CountsParams {
  return isRecord(value) && isText(value['uri']);
}

/** Parameters of `textDocument/codeAction`. */
export function isAboutRange(value: unknown): value is { textDocument: { uri: string }; range: Range } {
  return isRecord(value) && isRange(value['range']) && isAboutDocument(value);
}

/** The client's answer to `bandkeep/readFile`. */
export function isReadFileResult(value: unknown): value is ReadFileResult {
  return isRecord(value) && (isText(value['text']) || (isText(value['fault']) && fileFaults.has(value['fault'])));
}

const fileFaults: ReadonlySet<string> = new Set(['missing', 'unreadable', 'too-large', 'outside', 'folder', 'not-text']);

/** Whether the client has said that it answers `bandkeep/readFile`. */
export function readsFilesOf(options: unknown): boolean {
  return isRecord(options) && options['readsFiles'] === true;
}

/** The server's options as the client may hand them over. */
export function docsBaseOf(options: unknown): string | null {
  return isRecord(options) && isText(options['docsBase']) ? options['docsBase'] : null;
}

/** A point in a text. */
function isPosition(value: unknown): value is Position {
  return isRecord(value) && isCount(value['line']) && isCount(value['character']);
}

/** A stretch of a text. */
function isRange(value: unknown): value is Range {
  return isRecord(value) && isPosition(value['start']) && isPosition(value['end']);
}
