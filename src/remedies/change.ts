/** One change to one value of a channel: what it is called, and the edits that make it. */
import type { RemedyKind } from '../findings';
import type { Edit } from '../spec';

/** A change that may cure a finding. It touches one value, so changes of different kinds can be made together. */
export interface Change {
  readonly kind: RemedyKind;
  /** What it does, as a title begins: "Raise the rate to 64 kHz (÷384)". */
  readonly says: string;
  readonly edits: readonly Edit[];
}

/** What several changes do together, as a title begins. */
export function changesWords(changes: readonly Change[]): string {
  return changes.map(({ says }, index) => (index === 0 ? says : says.charAt(0).toLowerCase() + says.slice(1))).join(' and ');
}
