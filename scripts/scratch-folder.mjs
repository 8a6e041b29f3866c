// A fresh copy of the examples, so that trying them out never changes the clone.
import { cpSync, mkdirSync, readdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './prepare-clone.mjs';

/** Makes out/scratch/NAME anew and gives its path. */
export function scratchFolder(name) {
  const folder = join(root, 'out', 'scratch', name);
  rmSync(folder, { recursive: true, force: true });
  mkdirSync(folder, { recursive: true });
  const specs = readdirSync(join(root, 'examples'), { recursive: true }).filter((file) => file.endsWith('.bandkeep.yaml'));
  for (const file of specs) cpSync(join(root, 'examples', file), join(folder, file));
  return folder;
}
