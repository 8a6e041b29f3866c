// `npm test` on a fresh clone: installs, builds, runs every check and test, and ends with "N passed, N failed".
import { mkdirSync, readFileSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { buildBundles, installPackages, requireNode, root } from './prepare-clone.mjs';
import { runNode } from './run-command.mjs';

const passed = { passed: 1, failed: 0 };
const failed = { passed: 0, failed: 1 };

/** Every part, in order; each gives its counts. A check counts as one. */
const parts = [
  { name: 'Build', run: () => buildBundles().then(() => passed) },
  { name: 'Types', run: () => script('typecheck.mjs') },
  { name: 'Lint', run: () => script('lint.mjs') },
  { name: 'Units, properties, server, command', run: () => mocha([]) },
  { name: 'Values from outside', run: () => outsideTable() },
  { name: 'In the extension host of a real workbench', run: () => inWorkbench() },
  { name: 'On the screen of a real workbench', run: () => onScreen() },
];

const outsideValues = join(root, 'test-results', 'outside-values.txt');
rmSync(outsideValues, { force: true });

requireNode();
await installPackages();
const total = { passed: 0, failed: 0 };
for (const { name, run } of parts) {
  console.log(`\n── ${name}`);
  const counts = await run().catch(toFailure);
  total.passed += counts.passed;
  total.failed += counts.failed;
}
console.log(`\n${total.passed} passed, ${total.failed} failed`);
process.exitCode = total.failed === 0 ? 0 : 1;

function toFailure(error) {
  console.log(error.message);
  return failed;
}

/** Prints what the run before it has left of the values from outside; without it the run was not whole. */
async function outsideTable() {
  console.log(readFileSync(outsideValues, 'utf8').trimEnd());
  return passed;
}

async function script(name) {
  const { code } = await runNode([join(root, 'scripts', name)], { cwd: root });
  return code === 0 ? passed : failed;
}

async function inWorkbench() {
  const { installWorkbench } = await import('./workbench.mjs');
  const { runHostSuite } = await import('./host-suite.mjs');
  await installWorkbench();
  return runHostSuite();
}

function onScreen() {
  const own = ['--no-config', '--node-option', 'import=tsx', '--extension', 'ts', '--timeout', '120000'];
  return mocha([...own, 'test/host/screen/**/*.test.ts']);
}

/** A run of mocha; one that ends badly without counting a failure counts as one. */
async function mocha(args) {
  const counts = join(root, 'test-results', 'counts.json');
  mkdirSync(join(counts, '..'), { recursive: true });
  rmSync(counts, { force: true });
  const tool = join(root, 'node_modules', 'mocha', 'bin', 'mocha.js');
  const reporter = join(root, 'scripts', 'counting-reporter.cjs');
  const { code } = await runNode([tool, ...args, '--reporter', reporter], { cwd: root, env: { BANDKEEP_COUNTS: counts } });
  return withCode(code, readCounts(counts));
}

function readCounts(file) {
  try {
    return JSON.parse(readFileSync(file, 'utf8'));
  } catch {
    return { passed: 0, failed: 0 };
  }
}

function withCode(code, counts) {
  return code !== 0 && counts.failed === 0 ? { ...counts, failed: 1 } : counts;
}
