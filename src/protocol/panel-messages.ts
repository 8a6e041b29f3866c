/** Everything that the extension and the panel's page say to each other, and the guards that each side puts at its door. */
import type { PanelPicture } from './picture';
import { isPicture } from './picture-guard';
import { isCount, isPlaceName, isRecord, isText } from './guards';
import type { PlaceName } from './position';

/** Extension → page. */
export type HostMessage =
  /** After every `ready` and whenever there is a newer picture; a page drops one whose sequence is below the last it drew. */
  | {
      readonly kind: 'show';
      readonly sequence: number;
      /** The spec's URI; the page keeps it in its state, so that a reload finds the file again. */
      readonly uri: string;
      /** Whether the panel holds this channel wherever the cursor goes. */
      readonly pinned: boolean;
      readonly picture: PanelPicture;
    }
  /** When there is no picture of the newest text: the page dims what it shows, or explains its emptiness, with this reason. */
  | { readonly kind: 'stale'; readonly sequence: number; readonly uri: string; readonly reason: string }
  /** When the cursor moves: the place it is in, null for none. The page lights the items of that place. */
  | { readonly kind: 'lit'; readonly place: PlaceName | null };

/** What the page can save, and how its data are written. */
export type SaveKind = 'png' | 'svg' | 'csv';

/** Page → extension. */
export type PageMessage =
  /** Once the page listens, at first and after each reload; the extension answers with `show` or `stale`. */
  | { readonly kind: 'ready' }
  /** After a `show` has been painted. */
  | { readonly kind: 'drawn'; readonly sequence: number; readonly sections: number; readonly items: number }
  /** When the reader follows an item to its line. */
  | { readonly kind: 'reveal'; readonly place: PlaceName }
  /** When the reader exports a plot; `name` is a proposed file name; `data` is base64 for `png`, else the text. */
  | { readonly kind: 'save'; readonly format: SaveKind; readonly name: string; readonly data: string }
  /** When the reader holds the shown channel (its name) or lets go (null). */
  | { readonly kind: 'pin'; readonly channel: string | null }
  /** When the reader asks for the newest picture. */
  | { readonly kind: 'request-refresh' }
  /** When the page could not draw, so that the fault reaches the log. */
  | { readonly kind: 'failed'; readonly message: string };

/** Longest text a page may send; larger than any picture of a screen. */
const longestData = 64 * 1024 * 1024;

/** Whether a message that reached the page is one of the extension's. */
export function isHostMessage(value: unknown): value is HostMessage {
  if (!isRecord(value)) return false;
  switch (value['kind']) {
    case 'show':
      return (
        isCount(value['sequence']) && isText(value['uri']) && typeof value['pinned'] === 'boolean' && isPicture(value['picture'])
      );
    case 'stale':
      return isCount(value['sequence']) && isText(value['uri']) && isText(value['reason']);
    case 'lit':
      return value['place'] === null || isPlaceName(value['place']);
    default:
      return false;
  }
}

/** Whether a message that reached the extension is one of the page's. */
export function isPageMessage(value: unknown): value is PageMessage {
  if (!isRecord(value)) return false;
  switch (value['kind']) {
    case 'ready':
    case 'request-refresh':
      return true;
    case 'drawn':
      return isCount(value['sequence']) && isCount(value['sections']) && isCount(value['items']);
    case 'reveal':
      return isPlaceName(value['place']);
    case 'save':
      return isSaveKind(value['format']) && isText(value['name']) && isText(value['data']) && value['data'].length <= longestData;
    case 'pin':
      return value['channel'] === null || isText(value['channel']);
    case 'failed':
      return isText(value['message']);
    default:
      return false;
  }
}

function isSaveKind(value: unknown): value is SaveKind {
  return value === 'png' || value === 'svg' || value === 'csv';
}
