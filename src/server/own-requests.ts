/** Our own requests: the panel's picture, from a place to its line and back, and the counts of work. */
import type { CancellationToken } from 'vscode-languageserver';
import { drawable, locate, placeNameAt, type Drawable, type SpecDocument } from '../language';
import { pictureOf } from '../pictures';
import { isCountsParams, isLocateParams, isPictureParams, isPlaceAtParams } from '../protocol/request-guards';
import type {
  CountsParams,
  CountsResult,
  LocateParams,
  LocateResult,
  PictureParams,
  PictureResult,
  PlaceAtParams,
  PlaceAtResult,
} from '../protocol/requests';
import { check, refuseIfCancelled } from './answers';
import type { ServerState } from './server-state';

/** Answers from the newest version. */
export interface OwnAnswers {
  picture(params: PictureParams, token: CancellationToken): Promise<PictureResult>;
  locate(params: LocateParams): Promise<LocateResult>;
  placeAt(params: PlaceAtParams): Promise<PlaceAtResult>;
  counts(params: CountsParams): Promise<CountsResult>;
}

/** The answers of one server. */
export function ownAnswers({ specs, proofs }: ServerState): OwnAnswers {
  return {
    async picture(params, token) {
      const { uri, channel, position } = check(params, isPictureParams);
      const document = await specs.judged(uri);
      refuseIfCancelled(token);
      if (document === null) return { kind: 'none', version: 0, channel: null, reason: 'This file is not open.' };
      return pictureFor(document, drawable(document, channel, position));
    },
    async locate(params) {
      const { uri, place } = check(params, isLocateParams);
      const document = await specs.judged(uri);
      return document && locate(document, place);
    },
    async placeAt(params) {
      const { uri, position } = check(params, isPlaceAtParams);
      const document = await specs.judged(uri);
      proofs.lookAt(uri, position);
      return document && placeNameAt(document, position);
    },
    async counts(params) {
      const { uri } = check(params, isCountsParams);
      const document = await specs.judged(uri);
      const counts = specs.get(uri)?.counts ?? null;
      return document && counts && { version: document.version, ...counts };
    },
  };
}

function pictureFor({ version, judgement }: SpecDocument, drawn: Drawable): PictureResult {
  if (drawn.kind === 'none') return { ...drawn, version };
  return { kind: 'picture', version, picture: pictureOf(judgement, drawn.channel) };
}
