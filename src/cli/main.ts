/** The `bandkeep` command on Node: the only file of the command line that touches the process and the disk. */
import { spawn } from 'node:child_process';
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, realpathSync, statSync } from 'node:fs';
import { isAbsolute, join, relative, resolve, sep } from 'node:path';
import { largestTable } from '../spec';
import type { Host, LoadedFile } from './host';
import { run } from './run';

/** Set by the bundler from package.json. */
declare const BANDKEEP_VERSION: string;

const host: Host = {
  args: process.argv.slice(2),
  env: process.env,
  version: BANDKEEP_VERSION,
  isTerminal: process.stdout.isTTY,
  cwd: process.cwd(),
  kindOf,
  readFile: (path) => readFileSync(path),
  loadFile,
  specsBelow,
  readInput: () => readFileSync(0),
  resolve: (path) => resolve(path),
  relative: (root, path) => relative(root, path).split(sep).join('/'),
  sha256: (bytes) => createHash('sha256').update(bytes).digest('hex'),
  write: (text) => process.stdout.write(text),
  writeError: (text) => process.stderr.write(text),
  serveLanguage,
};

function kindOf(path: string): 'file' | 'folder' | null {
  const stat = statSync(path, { throwIfNoEntry: false });
  if (stat?.isFile()) return 'file';
  return stat?.isDirectory() ? 'folder' : null;
}

/** Only a plain file is opened, so that neither a pipe nor a device can hold the check up. */
function loadFile(root: string, path: string): LoadedFile {
  try {
    if (isOutside(root, resolve(root, path))) return { fault: 'outside' };
    const file = realpathSync(resolve(root, path));
    if (isOutside(realpathSync(root), file)) return { fault: 'outside' };
    const stat = statSync(file);
    if (stat.isDirectory()) return { fault: 'folder' };
    if (!stat.isFile()) return { fault: 'unreadable' };
    return stat.size > largestTable ? { fault: 'too-large' } : { bytes: readFileSync(file) };
  } catch (fault) {
    const code = fault instanceof Error && 'code' in fault ? fault.code : null;
    return { fault: code === 'ENOENT' || code === 'ENOTDIR' ? 'missing' : 'unreadable' };
  }
}

function isOutside(root: string, path: string): boolean {
  const way = relative(root, path);
  return way === '..' || way.startsWith(`..${sep}`) || isAbsolute(way);
}

/** Hidden folders and `node_modules` hold no specs of the user's own; links are not followed, so no loop can form. */
function specsBelow(folder: string): string[] {
  return readdirSync(folder, { withFileTypes: true })
    .sort((a, b) => (a.name < b.name ? -1 : 1))
    .flatMap((entry) => {
      const path = join(folder, entry.name);
      if (entry.isDirectory()) return entry.name.startsWith('.') || entry.name === 'node_modules' ? [] : specsBelow(path);
      return entry.isFile() && /\.bandkeep\.ya?ml$/.test(entry.name) ? [path] : [];
    });
}

/** The server is its own bundle beside this one; it takes over this process's input and output. */
function serveLanguage(args: readonly string[]): Promise<number> {
  const child = spawn(process.execPath, [join(__dirname, 'server.js'), ...args], { stdio: 'inherit' });
  for (const signal of ['SIGINT', 'SIGTERM'] as const) process.on(signal, () => child.kill(signal));
  return new Promise((done) => {
    child.on('error', () => {
      done(3);
    });
    child.on('exit', (code) => {
      done(code ?? 1);
    });
  });
}

// A reader such as `head` may close the pipe early; that is its right, not a fault.
process.stdout.on('error', (fault: NodeJS.ErrnoException) => {
  process.exitCode = fault.code === 'EPIPE' ? (process.exitCode ?? 0) : 3;
});

// The exit code is set, not forced, so that everything written drains first.
void run(host).then((code) => {
  process.exitCode = code;
});
