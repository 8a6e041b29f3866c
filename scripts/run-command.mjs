// Runs other programs: shown to the reader as they go, ended with us, and never through a shell that could misread a path.
import { spawn } from 'node:child_process';

/** npm as a command and its first arguments: the npm that runs us if one does, so that `npm test` works without npm on PATH. */
export function npmCommand() {
  const npm = process.env.npm_execpath;
  if (npm !== undefined && npm.endsWith('.js')) return { command: process.execPath, first: [npm], shell: false };
  return { command: 'npm', first: [], shell: process.platform === 'win32' };
}

/** Runs a program to its end and gives its exit code; output goes straight through unless `quiet`. */
export function run(command, args, { cwd, env, quiet = false, shell = false } = {}) {
  return new Promise((resolve) => {
    const stdio = quiet ? ['ignore', 'pipe', 'pipe'] : ['ignore', 'inherit', 'inherit'];
    const child = spawn(command, args, { cwd, env: { ...process.env, ...env }, stdio, shell });
    let output = '';
    child.stdout?.on('data', (chunk) => (output += chunk));
    child.stderr?.on('data', (chunk) => (output += chunk));
    child.once('error', (error) => resolve({ code: 127, output: `${output}${error.message}\n` }));
    child.once('close', (code) => resolve({ code: code ?? 1, output }));
  });
}

/** Runs npm; throws with npm's own words when it fails. */
export async function runNpm(args, { cwd, quiet = true } = {}) {
  const { command, first, shell } = npmCommand();
  const { code, output } = await run(command, [...first, ...args], { cwd, quiet, shell });
  if (code !== 0) throw new Error(`npm ${args.join(' ')} failed:\n${output}`);
}

/** Runs a script of ours or a tool's entry file with the Node that runs us. */
export function runNode(args, options) {
  return run(process.execPath, args, options);
}
