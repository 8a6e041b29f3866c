// `npm run package`: builds afresh and packs what the allow-list lets in as bandkeep-VERSION.vsix.
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { buildBundles, installPackages, requireNode, root } from './prepare-clone.mjs';
import { runNode } from './run-command.mjs';

requireNode();
await installPackages();
rmSync(join(root, 'dist'), { recursive: true, force: true });
await buildBundles();
const vsce = join(root, 'node_modules', '@vscode', 'vsce', 'vsce');
const { code } = await runNode(
  [vsce, 'package', '--no-dependencies', '--no-rewrite-relative-links', '--allow-missing-repository', ...process.argv.slice(2)],
  { cwd: root },
);
process.exitCode = code;
