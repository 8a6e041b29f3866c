/** What the server needs from the machine it runs on; each entry hands in its own. */

/** The build's version, a clock, and a way to let waiting messages through. */
export interface Platform {
  readonly version: string;
  /** Milliseconds, never running backwards. */
  now(): number;
  /** Settles after the messages that are waiting have had their turn. No timer, no delay. */
  yieldControl(): Promise<void>;
}
