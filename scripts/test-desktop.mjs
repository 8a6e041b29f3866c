// `npm run test:desktop`: the suite of test/host/suite in a desktop VS Code, downloaded, or the one that VSCODE_EXECUTABLE or the first argument names.
import { rmSync } from 'node:fs';
import { join } from 'node:path';
import { buildBundles, installPackages, requireNode, root } from './prepare-clone.mjs';

requireNode();
await installPackages();
await buildBundles();
const { buildSuite, printResults, resultsFile, suiteEntry } = await import('./host-suite.mjs');
const { scratchFolder } = await import('./scratch-folder.mjs');
const { runTests } = await import('@vscode/test-electron');

const executable = process.argv[2] ?? process.env.VSCODE_EXECUTABLE;
await buildSuite();
rmSync(resultsFile, { force: true });
try {
  await runTests({
    ...(executable === undefined ? { version: 'stable' } : { vscodeExecutablePath: executable }),
    extensionDevelopmentPath: root,
    extensionTestsPath: suiteEntry,
    extensionTestsEnv: { BANDKEEP_HOST_RESULTS: resultsFile },
    launchArgs: [
      scratchFolder('desktop'),
      ...['--disable-extensions', '--disable-workspace-trust', '--skip-welcome', '--skip-release-notes'],
      `--user-data-dir=${join(root, 'out', 'scratch', 'desktop-data')}`,
    ],
  });
} catch (error) {
  console.log(`VS Code ended with: ${error.message}`);
  if (executable === undefined) console.log('Without a network, name an installed one: npm run test:desktop -- PATH');
}
const { passed, failed } = printResults();
console.log(`\n${passed} passed, ${failed} failed`);
process.exitCode = failed === 0 ? 0 : 1;
