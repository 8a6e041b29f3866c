// The types of workbench.mjs for the tests, which are TypeScript.

/** A running workbench. */
export interface Workbench {
  readonly port: number;
  readonly token: string | null;
  readonly log: { readonly text: string };
  readonly ended: Promise<unknown>;
  stop(): Promise<void>;
}

export function installWorkbench(): Promise<void>;
export function startWorkbench(options: {
  data: string;
  settings?: Record<string, unknown>;
  token?: string | null;
  env?: Record<string, string>;
}): Promise<Workbench>;
export function workbenchAddress(
  workbench: Pick<Workbench, 'port' | 'token'>,
  what: { folder: string; file?: string | null; tests?: string | null; host?: 'node' | 'worker' },
): string;
export function serveExtension(): string;
export function writeSettings(data: string, settings: Record<string, unknown>): void;
