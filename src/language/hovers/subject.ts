/** What a hover is about: a place in a whole channel, with that channel's figures. */
import type { Figures } from '../../analysis';
import type { Channel, Path } from '../../spec';
import type { SpecDocument } from '../spec-document';

/** The subject of a hover. */
export interface Subject {
  readonly document: SpecDocument;
  readonly channel: Channel;
  readonly figures: Figures;
  /** As the channel owns it. */
  readonly path: Path;
}

/** A number in a path, such as a source's or a stage's place in its list; a single one is the first of its list. */
export function indexIn(path: Path): number {
  const step = path.find((part) => typeof part === 'number');
  return typeof step === 'number' ? step : 0;
}
