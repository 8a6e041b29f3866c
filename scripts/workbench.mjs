// A complete VS Code workbench from the npm registry: installed once into an ignored folder, served on loopback only.
import { spawn } from 'node:child_process';
import { existsSync, mkdirSync, readFileSync, rmSync, symlinkSync, writeFileSync } from 'node:fs';
import { createServer } from 'node:net';
import { delimiter, join } from 'node:path';
import { copyExtension, extensionFolder } from './extension-folder.mjs';
import { root } from './prepare-clone.mjs';
import { runNpm } from './run-command.mjs';

const version = '4.100.3';
const home = join(root, '.vscode-test', 'workbench');
const server = join(home, 'node_modules', 'code-server', 'lib', 'vscode');

/** Installs the workbench unless the folder's stamp says it is there: about 320 MB, half a minute. */
export async function installWorkbench() {
  const stamp = join(home, 'stamp');
  if (!existsSync(stamp) || readFileSync(stamp, 'utf8') !== version) {
    console.log(`Installing the workbench (code-server ${version}, into .vscode-test/workbench; once, about 320 MB) …`);
    rmSync(home, { recursive: true, force: true });
    mkdirSync(home, { recursive: true });
    writeFileSync(join(home, 'package.json'), '{ "private": true }\n');
    // Its own scripts would compile native parts; the server does without them.
    const common = ['--ignore-scripts', '--engine-strict=false', '--no-audit', '--no-fund'];
    await runNpm(['install', `code-server@${version}`, ...common], { cwd: home });
    await runNpm(['install', '--omit=dev', ...common], { cwd: server });
    await runNpm(['install', '--omit=dev', ...common], { cwd: join(server, 'extensions') });
    writeFileSync(stamp, version);
  }
  linkRipgrep();
}

/**
 * Starts the workbench's server and waits until it answers.
 * `data` is a folder for its settings and logs; `settings` are the user's; with a `token` every page needs it.
 */
export async function startWorkbench({ data, settings = {}, token = null, env = {} }) {
  const port = await freePort();
  writeSettings(data, settings);
  const args = [
    join(server, 'out', 'server-main.js'),
    ...['--host', '127.0.0.1', '--port', String(port)],
    ...(token === null ? ['--without-connection-token'] : ['--connection-token', token]),
    ...['--accept-server-license-terms', '--telemetry-level', 'off'],
    ...['--server-data-dir', data, '--extensions-dir', join(data, 'extensions')],
  ];
  const child = spawn(process.execPath, args, {
    // An empty gallery: the workbench looks nothing up on the network.
    env: { ...withoutNpm(process.env), EXTENSIONS_GALLERY: '{}', ...env },
    stdio: ['ignore', 'pipe', 'pipe'],
  });
  const log = collect(child);
  await untilListening(child, log);
  return { port, token, log, stop: () => stop(child), ended: new Promise((resolve) => child.once('close', resolve)) };
}

/**
 * Lays the extension among the files that the workbench's server hands out, and gives its path there: the worker
 * host takes an extension under development only from the page's own origin.
 */
export function serveExtension() {
  copyExtension(join(server, 'extension-under-test'));
  const { commit } = JSON.parse(readFileSync(join(server, 'product.json'), 'utf8'));
  return `/stable-${commit}/static/extension-under-test`;
}

/**
 * The address of the workbench with a folder open, and perhaps a file or a test suite. The extension is loaded from the
 * clone into the Node host, unless `host` is `worker`: then the page itself must name the extension that is served.
 */
export function workbenchAddress({ port, token }, { folder, file = null, tests = null, host = 'node' }) {
  const remote = (path) => `vscode-remote://127.0.0.1:${port}${urlPath(path)}`;
  const payload = [['skipWelcome', 'true']];
  if (host === 'node') payload.push(['extensionDevelopmentPath', remote(extensionFolder())]);
  if (tests !== null) payload.push(['extensionTestsPath', remote(tests)]);
  if (file !== null) payload.push(['openFile', remote(file)]);
  const query = new URLSearchParams({ folder: urlPath(folder), payload: JSON.stringify(payload) });
  if (token !== null) query.set('tkn', token);
  return `http://127.0.0.1:${port}/?${query}`;
}

/** The user's settings in a data folder; the workbench takes a change at once. */
export function writeSettings(data, settings) {
  mkdirSync(join(data, 'data', 'User'), { recursive: true });
  const quiet = {
    'security.workspace.trust.enabled': false,
    'workbench.startupEditor': 'none',
    'telemetry.telemetryLevel': 'off',
    'update.mode': 'none',
    'git.openRepositoryInParentFolders': 'never',
    // The address names a file to open; without this a reload would open only that and drop the panel.
    'window.restoreWindows': 'preserve',
  };
  writeFileSync(join(data, 'data', 'User', 'settings.json'), JSON.stringify({ ...quiet, ...settings }, null, 2));
}

/** A path as a URL has it: forward slashes and a leading one, on Windows too. */
function urlPath(path) {
  const slashed = path.replaceAll('\\', '/');
  return slashed.startsWith('/') ? slashed : `/${slashed}`;
}

// npm hands its settings on to every script; the workbench's own programs must not see them.
function withoutNpm(env) {
  return Object.fromEntries(Object.entries(env).filter(([name]) => !/^npm_/i.test(name)));
}

function linkRipgrep() {
  const link = join(server, 'node_modules', '@vscode', 'ripgrep', 'bin', 'rg');
  if (process.platform === 'win32' || existsSync(link)) return;
  const found = (process.env.PATH ?? '')
    .split(delimiter)
    .map((folder) => join(folder, 'rg'))
    .find((path) => existsSync(path));
  if (found === undefined) return;
  mkdirSync(join(link, '..'), { recursive: true });
  rmSync(link, { force: true });
  symlinkSync(found, link);
}

function freePort() {
  return new Promise((resolve, reject) => {
    const probe = createServer();
    probe.once('error', reject);
    probe.listen(0, '127.0.0.1', () => {
      const { port } = probe.address();
      probe.close(() => resolve(port));
    });
  });
}

function collect(child) {
  const log = { text: '' };
  const add = (chunk) => (log.text += chunk);
  child.stdout.on('data', add);
  child.stderr.on('data', add);
  return log;
}

function untilListening(child, log) {
  return new Promise((resolve, reject) => {
    const look = () => {
      if (log.text.includes('Extension host agent listening')) resolve();
    };
    child.stdout.on('data', look);
    child.once('error', reject);
    child.once('close', () => reject(new Error(`The workbench ended before it listened:\n${log.text}`)));
  });
}

function stop(child) {
  return new Promise((resolve) => {
    if (child.exitCode !== null || child.signalCode !== null) return resolve();
    const force = setTimeout(() => child.kill('SIGKILL'), 5000);
    child.once('close', () => {
      clearTimeout(force);
      resolve();
    });
    child.kill('SIGTERM');
  });
}
