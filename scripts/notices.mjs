// The licences of the packages that are inside the bundles, as their authors ask.
import { existsSync, readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';

/** One text for all packages among the bundled files, in order of name. */
export function noticesOf(inputs, root) {
  const packages = [...new Set(inputs.map(packageOf).filter((name) => name !== null))].sort();
  const head = 'Bandkeep contains these packages, under the licences given below.\n';
  return [head, ...packages.map((name) => noticeOf(name, join(root, 'node_modules', name)))].join('\n');
}

function packageOf(input) {
  const match = /.*node_modules\/((?:@[^/]+\/)?[^/]+)\//.exec(input);
  return match === null ? null : match[1];
}

function noticeOf(name, folder) {
  const { version, license } = JSON.parse(readFileSync(join(folder, 'package.json'), 'utf8'));
  const file = existsSync(folder) ? readdirSync(folder).find((entry) => /^licen[cs]e/i.test(entry)) : undefined;
  const text = file === undefined ? '' : readFileSync(join(folder, file), 'utf8').replaceAll('\r\n', '\n').trim();
  return `${'-'.repeat(78)}\n${name} ${version} (${license})\n\n${text}\n`;
}
