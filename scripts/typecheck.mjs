// Checks the types of every part against its own configuration, two at a time, keeping what the compiler learnt in an ignored folder.
import { existsSync, mkdirSync, readdirSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './prepare-clone.mjs';
import { runNode } from './run-command.mjs';

const tsc = join(root, 'node_modules', 'typescript', 'bin', 'tsc');
const kept = join(root, 'out', 'types');

/** Every tsconfig of the project: the core's, one for each part that knows more than the core, and the tests'. */
function configurations() {
  const folders = ['.', 'test', ...readdirSync(join(root, 'src')).map((name) => `src/${name}`)];
  return folders.flatMap((folder) =>
    ['tsconfig.json', 'tsconfig.browser.json'].map((name) => join(folder, name)).filter((path) => existsSync(join(root, path))),
  );
}

async function check(configuration) {
  const record = join(kept, `${configuration.replaceAll(/[\\/]/g, '-')}.tsbuildinfo`);
  const args = [tsc, '-p', configuration, '--incremental', '--tsBuildInfoFile', record, '--pretty', 'false'];
  const { code, output } = await runNode(args, { cwd: root, quiet: true });
  if (code !== 0) console.log(`${configuration}:\n${output.trimEnd()}`);
  return code === 0;
}

mkdirSync(kept, { recursive: true });
const queue = configurations();
const checked = queue.length;
let broken = 0;
const worker = async () => {
  for (let next = queue.shift(); next !== undefined; next = queue.shift()) if (!(await check(next))) broken += 1;
};
await Promise.all([worker(), worker()]);
console.log(broken === 0 ? `Types hold in all ${checked} parts.` : `Types do not hold in ${broken} of ${checked} parts.`);
process.exitCode = broken === 0 ? 0 : 1;
