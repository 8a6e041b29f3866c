/** The custom requests and notifications between the extension and the language server; everything else is plain LSP. */
import type { Range, Position, PlaceName } from './position';
import type { PanelPicture } from './picture';

/** Extension → server, when the panel must draw: after a save, a cursor move into another channel, or on opening. */
export const pictureRequest = 'bandkeep/picture';

/** Which channel to draw: by name where the panel is pinned, else the one at the cursor, else the first. */
export interface PictureParams {
  readonly uri: string;
  readonly channel: string | null;
  readonly position: Position | null;
}

/** The picture, or why there is none ("`bearing-x` has 2 faults; the first is on line 12: …"). */
export type PictureResult =
  | { readonly kind: 'picture'; readonly version: number; readonly picture: PanelPicture }
  | { readonly kind: 'none'; readonly version: number; readonly channel: string | null; readonly reason: string };

/** Extension → server, when an item of the panel is followed to its line. */
export const locateRequest = 'bandkeep/locate';

/** Parameters of `bandkeep/locate`. */
export interface LocateParams {
  readonly uri: string;
  readonly place: PlaceName;
}

/** The place's range in the newest text, or null where it no longer stands. */
export type LocateResult = Range | null;

/** Extension → server, when the cursor moves while a panel is open: which place the cursor is in. */
export const placeAtRequest = 'bandkeep/placeAt';

/** Parameters of `bandkeep/placeAt`. */
export interface PlaceAtParams {
  readonly uri: string;
  readonly position: Position;
}

/** The innermost place at the cursor, or null. */
export type PlaceAtResult = PlaceName | null;

/** Test or benchmark → server: how much work the newest version of a spec was. */
export const countsRequest = 'bandkeep/counts';

/** Parameters of `bandkeep/counts`. */
export interface CountsParams {
  readonly uri: string;
}

/** The counts of the newest judged version, or null where the spec is not open. One edit is one slice and one channel. */
export type CountsResult = {
  readonly version: number;
  readonly slices: number;
  readonly slicesRead: number;
  readonly channels: number;
  readonly channelsResolved: number;
  readonly channelsAnalysed: number;
} | null;

/** Server → extension, when a spec names a file that the server cannot reach itself: in a browser, or in a workspace that is on no disk. */
export const readFileRequest = 'bandkeep/readFile';

/** Files with more bytes than this are not sent; no table that large is read. */
export const largestFile = 64 * 1024 * 1024;

/** Parameters of `bandkeep/readFile`. */
export interface ReadFileParams {
  readonly uri: string;
}

/** The file's text, or why there is none. */
export type ReadFileResult =
  { readonly text: string } | { readonly fault: 'missing' | 'unreadable' | 'too-large' | 'outside' | 'folder' | 'not-text' };

/** Server → extension, when a file that open specs lean on has changed on the disk: the panel may have to draw again. */
export const leaningNotification = 'bandkeep/leaningSpecs';

/** Parameters of `bandkeep/leaningSpecs`: the open specs that are judged anew. */
export interface LeaningParams {
  readonly uris: readonly string[];
}

/** What the extension hands the server in `initializationOptions`. */
export interface ServerOptions {
  /** URI of the folder that holds a page for every finding code; null: no links. */
  readonly docsBase: string | null;
  /** Whether it answers `bandkeep/readFile` and listens to `bandkeep/leaningSpecs`. */
  readonly readsFiles: boolean;
}
