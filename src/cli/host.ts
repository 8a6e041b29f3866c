/** What the command line needs of the machine; main.ts gives the real one, tests give their own. */
import type { FileFault } from '../spec';

/** A file's bytes, or why there are none. */
export type LoadedFile = { readonly bytes: Uint8Array } | { readonly fault: FileFault };

/** The outside world as the command sees it. */
export interface Host {
  /** What stands behind the command's name. */
  readonly args: readonly string[];
  readonly env: Readonly<Record<string, string | undefined>>;
  /** The program's own version. */
  readonly version: string;
  /** Whether standard output is a terminal. */
  readonly isTerminal: boolean;
  /** The folder that relative paths start from, absolute. */
  readonly cwd: string;
  /** Whether a path is a file, a folder, or nothing that can be read. */
  kindOf(path: string): 'file' | 'folder' | null;
  /** A file's bytes; throws where it cannot be read. */
  readFile(path: string): Uint8Array;
  /** A file that a spec names, by its path from the root, with `/`; never one outside of it, links followed. */
  loadFile(root: string, path: string): LoadedFile;
  /** Every spec below a folder, sorted; folders of tools and hidden ones are passed over. */
  specsBelow(folder: string): readonly string[];
  /** All of standard input. */
  readInput(): Uint8Array;
  /** Resolves against `cwd`. */
  resolve(path: string): string;
  /** Relative to the root, with `/` on every system. */
  relative(root: string, path: string): string;
  /** SHA-256 in lower-case hexadecimal. */
  sha256(bytes: Uint8Array): string;
  write(text: string): void;
  writeError(text: string): void;
  /** Runs the language server over standard input and output until it ends; gives its exit code. */
  serveLanguage(args: readonly string[]): Promise<number>;
}

/** Exit codes of the command. */
export const exitCode = { holds: 0, findings: 1, usage: 2, internal: 3 } as const;
