// Runs test/host/suite inside the extension host of a real workbench and reads what it found.
import { existsSync, mkdirSync, readFileSync, readdirSync, rmSync, watch } from 'node:fs';
import { join } from 'node:path';
import { browse } from './browse.mjs';
import { root } from './prepare-clone.mjs';
import { scratchFolder } from './scratch-folder.mjs';
import { startWorkbench, workbenchAddress } from './workbench.mjs';

const built = join(root, 'out', 'test', 'host');

/** Where the suite leaves its results. */
export const resultsFile = join(root, 'test-results', 'host-suite.json');

/** The module that the workbench is told to run. */
export const suiteEntry = join(built, 'index.js');

/** Bundles each file of the suite, since the extension host knows no TypeScript. */
export async function buildSuite() {
  const { build } = await import('esbuild');
  const source = join(root, 'test', 'host', 'suite');
  rmSync(built, { recursive: true, force: true });
  await build({
    entryPoints: readdirSync(source)
      .filter((name) => name === 'index.ts' || name.endsWith('.test.ts'))
      .map((name) => join(source, name)),
    outdir: built,
    ...{ bundle: true, platform: 'node', format: 'cjs', target: 'node20', sourcemap: 'inline', logLevel: 'warning' },
    external: ['vscode', 'mocha'],
  });
}

/** The whole run in the npm workbench: the suite's results as counts, printed test by test. */
export async function runHostSuite() {
  await buildSuite();
  rmSync(resultsFile, { force: true });
  mkdirSync(join(root, 'test-results'), { recursive: true });
  const data = join(root, 'out', 'scratch', 'host-data');
  rmSync(data, { recursive: true, force: true });
  const workbench = await startWorkbench({ data, env: { BANDKEEP_HOST_RESULTS: resultsFile } });
  const browser = await browse();
  try {
    const page = await browser.newPage();
    const results = arrival(resultsFile, 600_000);
    await page.goto(workbenchAddress(workbench, { folder: scratchFolder('host'), tests: suiteEntry }));
    await results;
  } finally {
    await browser.close();
    await workbench.stop();
  }
  return printResults();
}

/** Prints the results as a list and gives the counts; no results at all count as one failure. */
export function printResults() {
  if (!existsSync(resultsFile)) {
    console.log('The suite in the workbench left no results.');
    return { passed: 0, failed: 1 };
  }
  const { passes, failures, stats } = JSON.parse(readFileSync(resultsFile, 'utf8'));
  for (const { fullTitle } of passes) console.log(`    ✔ ${fullTitle}`);
  for (const { fullTitle, err } of failures)
    console.log(`    ✘ ${fullTitle}\n${(err.stack ?? err.message ?? '').replace(/^/gm, '        ')}`);
  return { passed: stats.passes, failed: stats.failures };
}

/** Settles when a file has been written whole, or when the time is up. */
function arrival(file, limit) {
  return new Promise((resolve) => {
    const done = () => {
      clearTimeout(timer);
      watcher.close();
      resolve();
    };
    const timer = setTimeout(done, limit);
    const watcher = watch(join(file, '..'), () => {
      if (isWhole(file)) done();
    });
  });
}

function isWhole(file) {
  try {
    JSON.parse(readFileSync(file, 'utf8'));
    return true;
  } catch {
    return false;
  }
}
