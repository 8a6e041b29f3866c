// Makes dist/: `node scripts/build.mjs` once and minified, `--watch` again at every change and readable, `--quiet` without the list of sizes.
import { chmodSync, existsSync, mkdirSync, readFileSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { build, context } from 'esbuild';
import { bundles } from './bundles.mjs';
import { noticesOf } from './notices.mjs';
import { root } from './prepare-clone.mjs';

const watch = process.argv.includes('--watch');
const quiet = process.argv.includes('--quiet');
const dist = join(root, 'dist');
const { version } = JSON.parse(readFileSync(join(root, 'package.json'), 'utf8'));

if (watch) await Promise.all(bundles.map(watchOne));
else await buildAll();

async function buildAll() {
  const results = await Promise.allSettled(bundles.map(buildOne));
  if (results.some(({ status }) => status === 'rejected')) process.exitCode = 1;
  const inputs = results.flatMap((result) => (result.status === 'fulfilled' ? Object.keys(result.value.metafile.inputs) : []));
  mkdirSync(dist, { recursive: true });
  writeFileSync(join(dist, 'NOTICES.txt'), noticesOf(inputs, root));
}

async function buildOne(bundle) {
  const result = await build(optionsOf(bundle));
  finish(bundle);
  if (!quiet) console.log(sizesOf(result.metafile).join('\n'));
  return result;
}

async function watchOne(bundle) {
  const plugin = { name: 'finish', setup: (hooks) => hooks.onEnd(() => finish(bundle)) };
  const watching = await context({ ...optionsOf(bundle), plugins: [plugin] });
  await watching.watch();
}

function optionsOf({ entry, out, options }) {
  return {
    ...options,
    entryPoints: [join(root, entry)],
    outfile: join(dist, out),
    absWorkingDir: root,
    bundle: true,
    metafile: true,
    minify: !watch,
    sourcemap: watch ? 'linked' : false,
    legalComments: 'none', // All licences stand in NOTICES.txt.
    define: { BANDKEEP_VERSION: JSON.stringify(version) },
    logLevel: 'warning',
  };
}

function finish({ out, executable = false }) {
  const file = join(dist, out);
  if (executable && existsSync(file)) chmodSync(file, 0o755);
}

function sizesOf({ outputs }) {
  return Object.entries(outputs).map(([file, { bytes }]) => `${file.padEnd(24)} ${(bytes / 1000).toFixed(1).padStart(8)} kB`);
}
