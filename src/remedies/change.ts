/** One change to one value of a channel: what it is called, and the edits that make it. */
import type { RemedyKind } from '../findings';
import type { Edit } from '../spec';

/** A change that may cure a finding. It touches one value, so changes of different kinds can be made together. */
export interface Change {
  readonly kind: RemedyKind;
  /** What it does, as a title begins: "Raise the rate to 64 kHz (÷384)". */
  readonly says: string;
  /** What the title calls the stage that is changed; null for the rate. */
  readonly about: string | null;
  readonly edits: readonly Edit[];
}

/** What several changes do together, as a title begins: "Raise `guard` to order 5 and lower its corner to 13 kHz". */
export function changesWords(changes: readonly Change[]): string {
  const about = changes.map((change) => change.about);
  const says = changes.map(({ says, about: stage }, index) => {
    const known = stage !== null && about.indexOf(stage) < index;
    const words = known ? says.replace(`the corner of ${stage}`, 'its corner').replace(` ${stage} `, ' it ') : says;
    return index === 0 ? words : words.charAt(0).toLowerCase() + words.slice(1);
  });
  return says.join(' and ');
}
