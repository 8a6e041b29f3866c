// Everything that reads the source without running it: the linter's rules, the layout of the text, which layer may import which, and what nobody uses.
import { join } from 'node:path';
import { root } from './prepare-clone.mjs';
import { runNode } from './run-command.mjs';

const tool = (...path) => join(root, 'node_modules', ...path);

const checks = [
  {
    name: 'rules (eslint)',
    args: [tool('eslint', 'bin', 'eslint.js'), '.', '--cache', '--cache-location', 'out/eslint/', '--cache-strategy', 'content'],
  },
  { name: 'layout (prettier)', args: [tool('prettier', 'bin', 'prettier.cjs'), '--check', '.', '--log-level', 'warn'] },
  {
    name: 'layers (dependency-cruiser)',
    args: [tool('dependency-cruiser', 'bin', 'dependency-cruise.mjs'), 'src', '--config', '.dependency-cruiser.cjs'],
  },
  {
    name: 'nothing unused (knip)',
    // Types are exported with the functions that speak of them, whether or not another file names them yet.
    args: [tool('knip', 'bin', 'knip.js'), '--include', 'files,dependencies,unlisted,unresolved,exports,duplicates'],
  },
];

const results = await Promise.all(
  checks.map(async (check) => ({ ...check, ...(await runNode(check.args, { cwd: root, quiet: true })) })),
);
for (const { name, code, output } of results)
  console.log(code === 0 ? `${name}: nothing to say` : `${name}:\n${output.trimEnd()}`);
process.exitCode = results.every(({ code }) => code === 0) ? 0 : 1;
