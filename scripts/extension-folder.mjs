// The extension as the workbench loads it from the clone: a folder of links, beside the workbench and not around it.
// (A workbench inside the extension's own folder takes every built-in theme for the one under development, and forces it.)
import { copyFileSync, cpSync, mkdirSync, rmSync, symlinkSync } from 'node:fs';
import { join } from 'node:path';
import { root } from './prepare-clone.mjs';

const folders = ['dist', 'syntaxes', 'snippets', 'media', 'examples', 'docs'];
const files = ['package.json', 'package.nls.json', 'language-configuration.json', 'README.md', 'CHANGELOG.md', 'LICENSE'];

/** Makes the folder anew and gives its path. */
export function extensionFolder() {
  const home = join(root, '.vscode-test', 'extension');
  rmSync(home, { recursive: true, force: true });
  mkdirSync(home, { recursive: true });
  // Windows lets anybody make junctions, but not links to files.
  for (const name of folders) symlinkSync(join(root, name), join(home, name), 'junction');
  for (const name of files) copyFileSync(join(root, name), join(home, name));
  return home;
}

/** Copies the extension to a place from which a web server can hand it out. */
export function copyExtension(home) {
  rmSync(home, { recursive: true, force: true });
  mkdirSync(home, { recursive: true });
  for (const name of [...folders, ...files]) cpSync(join(root, name), join(home, name), { recursive: true });
}
