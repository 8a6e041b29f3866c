// Brings a clone to the point where everything can run: packages as the lock has them, then the bundles.
import { createHash } from 'node:crypto';
import { existsSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { fileURLToPath } from 'node:url';
import { runNode, runNpm } from './run-command.mjs';

/** The project's folder. */
export const root = fileURLToPath(new URL('..', import.meta.url)).replace(/[\\/]$/, '');

/** Stops with a plain sentence where Node is too old for the tools. */
export function requireNode() {
  const [major, minor] = process.versions.node.split('.').map(Number);
  if (major > 20 || (major === 20 && minor >= 19)) return;
  console.error(`Bandkeep needs Node 20.19 or newer; this is Node ${process.versions.node}.`);
  process.exit(1);
}

/** Installs the packages of the lock when they are missing or the lock has changed. */
export async function installPackages() {
  const lock = createHash('sha256')
    .update(readFileSync(join(root, 'package-lock.json')))
    .digest('hex');
  const stamp = join(root, 'node_modules', '.bandkeep-lock');
  if (existsSync(stamp) && readFileSync(stamp, 'utf8') === lock) return;
  console.log('Installing the packages of package-lock.json (npm ci) …');
  await runNpm(['ci', '--no-audit', '--no-fund'], { cwd: root });
  writeFileSync(stamp, lock);
}

/** Builds all bundles; throws where one fails. */
export async function buildBundles() {
  const { code } = await runNode([join(root, 'scripts', 'build.mjs'), '--quiet'], { cwd: root });
  if (code !== 0) throw new Error('The build failed; its messages are above.');
}
