// The bundles: which source makes which file, and for which of the places where our code runs.

const node = { platform: 'node', format: 'cjs', target: 'node20' };
const page = { platform: 'browser', format: 'iife', target: 'es2022' };

/** Every bundle; `out` is relative to dist/. */
export const bundles = [
  { out: 'extension.js', entry: 'src/extension/main-node.ts', options: { ...node, external: ['vscode'] } },
  { out: 'server.js', entry: 'src/server/main-node.ts', options: node },
  { out: 'panel.js', entry: 'src/preview/main.ts', options: page },
  { out: 'panel.css', entry: 'src/preview/panel.css', options: { target: 'chrome120' } },
  { out: 'bandkeep.js', entry: 'src/cli/main.ts', options: { ...node, banner: { js: '#!/usr/bin/env node' } }, executable: true },
  { out: 'library.js', entry: 'src/library.ts', options: node },
  {
    out: 'web/extension.js',
    entry: 'src/extension/main-browser.ts',
    // The workbench's worker host hands `vscode` in through require, as in Node.
    options: { ...page, format: 'cjs', external: ['vscode'] },
  },
  { out: 'web/server.js', entry: 'src/server/main-browser.ts', options: page },
];
