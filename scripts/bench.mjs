// `npm run bench`: bundles the benchmarks as the product is bundled, since a loader that transforms sources would be measured too, and runs them.
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { build } from 'esbuild';
import { root } from './prepare-clone.mjs';
import { runNode } from './run-command.mjs';

const bundle = join(root, 'out', 'bench', 'index.cjs');
mkdirSync(join(bundle, '..'), { recursive: true });
await build({
  entryPoints: [join(root, 'test', 'bench', 'index.ts')],
  outfile: bundle,
  bundle: true,
  platform: 'node',
  target: 'node20',
  logLevel: 'warning',
});
const { code } = await runNode([bundle], { cwd: root });
process.exitCode = code;
