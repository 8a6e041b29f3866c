/** Our own requests: the panel's picture, from a place to its line and back, and the counts of work. */
import type { CancellationToken, Connection } from 'vscode-languageserver';
import { drawable, locate, placeNameAt, type Drawable, type SpecDocument } from '../language';
import { pictureOf } from '../pictures';
import { isCountsParams, isLocateParams, isPictureParams, isPlaceAtParams } from '../protocol/request-guards';
import {
  countsRequest,
  locateRequest,
  pictureRequest,
  placeAtRequest,
  type CountsParams,
  type CountsResult,
  type LocateParams,
  type LocateResult,
  type PictureParams,
  type PictureResult,
  type PlaceAtParams,
  type PlaceAtResult,
} from '../protocol/requests';
import { check, refuseIfCancelled } from './answers';
import type { ServerState } from './server-state';

/** Answers them from the newest version. */
export function answerOwn(connection: Connection, state: ServerState): void {
  const { specs, proofs } = state;
  connection.onRequest(pictureRequest, async (params: PictureParams, token: CancellationToken): Promise<PictureResult> => {
    const { uri, channel, position } = check(params, isPictureParams);
    const document = await specs.judged(uri);
    refuseIfCancelled(token);
    if (document === null) return { kind: 'none', version: 0, channel: null, reason: 'This file is not open.' };
    return pictureFor(document, drawable(document, channel, position));
  });
  connection.onRequest(locateRequest, async (params: LocateParams): Promise<LocateResult> => {
    const { uri, place } = check(params, isLocateParams);
    const document = await specs.judged(uri);
    return document && locate(document, place);
  });
  connection.onRequest(placeAtRequest, async (params: PlaceAtParams): Promise<PlaceAtResult> => {
    const { uri, position } = check(params, isPlaceAtParams);
    const document = await specs.judged(uri);
    proofs.lookAt(uri, position);
    return document && placeNameAt(document, position);
  });
  connection.onRequest(countsRequest, async (params: CountsParams): Promise<CountsResult> => {
    const { uri } = check(params, isCountsParams);
    const document = await specs.judged(uri);
    const counts = specs.get(uri)?.counts ?? null;
    return document && counts && { version: document.version, ...counts };
  });
}

function pictureFor({ version, judgement }: SpecDocument, drawn: Drawable): PictureResult {
  if (drawn.kind === 'none') return { ...drawn, version };
  return { kind: 'picture', version, picture: pictureOf(judgement, drawn.channel) };
}
