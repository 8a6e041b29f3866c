/** A command-line host with its files in memory, which records all that is written. */
import { createHash } from 'node:crypto';
import { posix } from 'node:path';
import type { Host } from '../../src/cli/host';

/** The host and what it wrote. */
export interface MemoryHost extends Host {
  readonly written: { out: string; err: string };
}

/** A host in the folder `/lagoon`; `files` maps absolute paths to texts or bytes, `input` is its standard input. */
export function memoryHost(
  args: readonly string[],
  files: Readonly<Record<string, string | Uint8Array>> = {},
  more: Partial<Pick<Host, 'env' | 'isTerminal'>> & { readonly input?: string } = {},
): MemoryHost {
  const written = { out: '', err: '' };
  const bytes = (content: string | Uint8Array) => (typeof content === 'string' ? new TextEncoder().encode(content) : content);
  const below = (folder: string) =>
    Object.keys(files).filter((path) => path.startsWith(`${folder}/`) && /\.bandkeep\.ya?ml$/.test(path));
  return {
    args,
    env: more.env ?? {},
    version: '0.0.0-test',
    isTerminal: more.isTerminal ?? false,
    cwd: '/lagoon',
    kindOf: (path) => (path in files ? 'file' : Object.keys(files).some((file) => file.startsWith(`${path}/`)) ? 'folder' : null),
    readFile: (path) => bytes(files[path] ?? ''),
    loadFile: (root, path) => {
      const full = posix.resolve(root, path);
      if (!full.startsWith(`${root}/`)) return { fault: 'outside' };
      const content = files[full];
      return content === undefined ? { fault: 'missing' } : { bytes: bytes(content) };
    },
    specsBelow: (folder) => below(folder).sort(),
    readInput: () => bytes(more.input ?? ''),
    resolve: (path) => posix.resolve('/lagoon', path),
    relative: (root, path) => posix.relative(root, path),
    sha256: (content) => createHash('sha256').update(content).digest('hex'),
    write: (text) => {
      written.out += text;
    },
    writeError: (text) => {
      written.err += text;
    },
    serveLanguage: () => Promise.resolve(0),
    written,
  };
}
