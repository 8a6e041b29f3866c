// `npm start` on a fresh clone: builds Bandkeep and opens the examples with it, in VS Code where `code` is installed, else in a workbench in the browser.
import { randomBytes } from 'node:crypto';
import { existsSync } from 'node:fs';
import { delimiter, join } from 'node:path';
import { buildBundles, installPackages, requireNode, root } from './prepare-clone.mjs';
import { run } from './run-command.mjs';
import { scratchFolder } from './scratch-folder.mjs';
import { installWorkbench, startWorkbench, workbenchAddress } from './workbench.mjs';

const example = 'gate-bearing-broken.bandkeep.yaml';

requireNode();
const folder = scratchFolder('start');
try {
  await installPackages();
  await buildBundles();
  const code = process.argv.includes('--workbench') || process.env.CI ? null : installedCode();
  if (code === null) await serve();
  else await openDesktop(code);
} catch (error) {
  console.error(error.message);
  process.exitCode = 1;
}

function installedCode() {
  const names = process.platform === 'win32' ? ['code.cmd'] : ['code'];
  const folders = (process.env.PATH ?? '').split(delimiter);
  return folders.flatMap((path) => names.map((name) => join(path, name))).find((path) => existsSync(path)) ?? null;
}

async function openDesktop(command) {
  console.log(`Opening the examples (a fresh copy in ${folder}) in VS Code, with Bandkeep loaded from this clone.`);
  console.log('For the workbench in a browser instead: npm start -- --workbench');
  const args = [`--extensionDevelopmentPath=${root}`, folder, join(folder, example)];
  const windows = process.platform === 'win32';
  await run(windows ? `"${command}"` : command, windows ? args.map((arg) => `"${arg}"`) : args, { shell: windows });
}

async function serve() {
  await installWorkbench();
  const data = join(root, '.vscode-test', 'start-data');
  const workbench = await startWorkbench({ data, token: randomBytes(16).toString('hex') });
  const address = workbenchAddress(workbench, { folder, file: join(folder, example) });
  console.log('\nBandkeep runs in a VS Code workbench. Open this address in a browser (it works on this machine only):\n');
  console.log(`  ${address}\n`);
  console.log(`The examples are a fresh copy in ${folder}; change and save them as you like.`);
  console.log('The workbench looks nothing up on the network. Ctrl+C ends it.');
  for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.once(signal, () => void workbench.stop());
  await workbench.ended;
}
