/** What the workbench calls under test: runs the suite inside the extension host and leaves its results in a file. */
import { mkdirSync, readdirSync } from 'node:fs';
import { dirname, join } from 'node:path';
import Mocha from 'mocha';

/** Runs every test beside this file; rejects when one fails, which is how a desktop workbench learns of it. */
export async function run(): Promise<void> {
  const output = process.env['BANDKEEP_HOST_RESULTS'];
  if (output === undefined) throw new Error('BANDKEEP_HOST_RESULTS must name the file for the results.');
  mkdirSync(dirname(output), { recursive: true });
  const mocha = new Mocha({ ui: 'bdd', timeout: 30_000, reporter: 'json', reporterOptions: { output } });
  for (const file of readdirSync(__dirname).sort()) if (file.endsWith('.test.js')) mocha.addFile(join(__dirname, file));
  const failures = await new Promise<number>((resolve) => mocha.run(resolve));
  if (failures > 0) throw new Error(`${failures} tests failed.`);
}
