/** What the server needs from the machine it runs on; each entry hands in its own. */

import type { LoadFile } from './workspace-files';

/** The build's version, a clock, and a way to let waiting messages through. */
export interface Platform {
  readonly version: string;
  /** Milliseconds, never running backwards. */
  now(): number;
  /** Settles after the messages that are waiting have had their turn. No timer, no delay. */
  yieldControl(): Promise<void>;
  /** Loads a file from the disk by `file:` URIs of it and of the root that it must lie in; null where there is no disk. */
  readonly loadFile: LoadFile | null;
}
