/** What the parts of one running server share. */
import type { ClientProfile } from './client-profile';
import type { OpenSpecs } from './open-specs';
import type { Proofs } from './proofs';

/** One server's state. */
export interface ServerState {
  readonly profile: ClientProfile;
  readonly specs: OpenSpecs;
  readonly proofs: Proofs;
}
