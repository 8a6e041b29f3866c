// Everything that reads the source without running it: the linter's rules, the layout of the text, and which layer may import which.
import { createHash } from 'node:crypto';
import { readdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './prepare-clone.mjs';
import { runNode } from './run-command.mjs';

const kept = join('out', 'eslint');

/**
 * Where the linter keeps what it found: under the content of everything it reads, since a rule that knows types may
 * judge a file anew when another one changes.
 */
function cacheLocation() {
  const hash = createHash('sha256');
  const configuration = ['eslint.config.mjs', 'package-lock.json', 'tsconfig.json'];
  const folders = ['src', 'test', 'scripts'].flatMap((folder) =>
    readdirSync(join(root, folder), { recursive: true, withFileTypes: true })
      .filter((entry) => entry.isFile() && /\.(ts|mts|mjs|cjs|json)$/.test(entry.name))
      .map((entry) => join(entry.parentPath, entry.name)),
  );
  for (const file of [...configuration.map((name) => join(root, name)), ...folders.sort()])
    hash.update(file).update(readFileSync(file));
  const name = hash.digest('hex');
  for (const old of oldCaches()) if (old !== name) rmSync(join(root, kept, old), { recursive: true, force: true });
  return join(kept, name);
}

function oldCaches() {
  try {
    return readdirSync(join(root, kept));
  } catch {
    return [];
  }
}

const tool = (...path) => join(root, 'node_modules', ...path);

const checks = [
  {
    name: 'rules (eslint)',
    args: [
      tool('eslint', 'bin', 'eslint.js'),
      '.',
      '--cache',
      '--cache-location',
      cacheLocation(),
      '--cache-strategy',
      'content',
    ],
  },
  { name: 'layout (prettier)', args: [tool('prettier', 'bin', 'prettier.cjs'), '--check', '.', '--log-level', 'warn'] },
  {
    name: 'layers (dependency-cruiser)',
    args: [tool('dependency-cruiser', 'bin', 'dependency-cruise.mjs'), 'src', '--config', '.dependency-cruiser.cjs'],
  },
];

const results = await Promise.all(
  checks.map(async (check) => ({ ...check, ...(await runNode(check.args, { cwd: root, quiet: true })) })),
);
for (const { name, code, output } of results)
  console.log(code === 0 ? `${name}: nothing to say` : `${name}:\n${output.trimEnd()}`);
process.exitCode = results.every(({ code }) => code === 0) ? 0 : 1;
