// Finds a browser for the tests in the workbench: an installed one, else one from the npm registry, else Debian's, else says what to type.
import { existsSync, mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { delimiter, join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { root } from './prepare-clone.mjs';
import { run, runNpm } from './run-command.mjs';

const version = '147.0.0';
const home = join(root, '.vscode-test', 'browser');
const names = ['chromium', 'chromium-browser', 'google-chrome', 'google-chrome-stable', 'microsoft-edge', 'chrome'];

/** What Chromium must be told so that it starts in a container and talks to nobody but us. */
export const browserArguments = [
  ...['--no-sandbox', '--disable-gpu', '--disable-quic', '--no-first-run'],
  ...['--disable-background-networking', '--disable-component-update', '--disable-sync'],
];

/** The executable and arguments of a browser; throws with the line to type where there is none. */
export async function findBrowser() {
  const installed = process.env.BANDKEEP_BROWSER ?? onPath() ?? inUsualPlaces();
  if (installed !== undefined) return { executablePath: installed, args: browserArguments };
  const packaged = process.platform === 'linux' && process.arch === 'x64' ? await fromRegistry() : null;
  if (packaged !== null) return packaged;
  if (await fromDebian()) return { executablePath: '/usr/bin/chromium', args: browserArguments };
  throw new Error(
    'The tests in the workbench need a browser. Install Chrome, Edge or Chromium (on Debian or Ubuntu: sudo apt-get install chromium), ' +
      'or set BANDKEEP_BROWSER to the path of one.',
  );
}

function onPath() {
  const folders = (process.env.PATH ?? '').split(delimiter);
  return names.flatMap((name) => folders.map((folder) => join(folder, name))).find((path) => existsSync(path));
}

function inUsualPlaces() {
  const programs = [process.env.PROGRAMFILES, process.env['PROGRAMFILES(X86)'], process.env.LOCALAPPDATA].filter(Boolean);
  return [
    '/Applications/Google Chrome.app/Contents/MacOS/Google Chrome',
    '/Applications/Microsoft Edge.app/Contents/MacOS/Microsoft Edge',
    '/Applications/Chromium.app/Contents/MacOS/Chromium',
    ...programs.map((folder) => join(folder, 'Google', 'Chrome', 'Application', 'chrome.exe')),
    ...programs.map((folder) => join(folder, 'Microsoft', 'Edge', 'Application', 'msedge.exe')),
  ].find((path) => existsSync(path));
}

async function fromRegistry() {
  const stamp = join(home, 'stamp');
  try {
    if (!existsSync(stamp) || readFileSync(stamp, 'utf8') !== version) {
      console.log(
        `Installing a browser for the tests (@sparticuz/chromium ${version}, into .vscode-test/browser; once, 66 MB) …`,
      );
      rmSync(home, { recursive: true, force: true });
      mkdirSync(home, { recursive: true });
      writeFileSync(join(home, 'package.json'), '{ "private": true }\n');
      await runNpm(['install', `@sparticuz/chromium@${version}`, '--ignore-scripts', '--no-audit', '--no-fund'], { cwd: home });
      writeFileSync(stamp, version);
    }
    const entry = createRequire(join(home, 'package.json')).resolve('@sparticuz/chromium');
    const { default: chromium } = await import(pathToFileURL(entry).href);
    const executablePath = await chromium.executablePath();
    const { code } = await run(executablePath, ['--version', '--no-sandbox'], { quiet: true });
    return code === 0
      ? { executablePath, args: [...chromium.args.filter((arg) => !arg.startsWith('--headless')), ...browserArguments] }
      : null;
  } catch (error) {
    console.log(`The browser from the registry does not run here: ${error.message}`);
    return null;
  }
}

async function fromDebian() {
  if (process.getuid?.() !== 0 || !existsSync('/usr/bin/apt-get')) return false;
  console.log('Installing Chromium (apt-get install chromium) …');
  await run('apt-get', ['update', '-qq'], { quiet: true });
  const { code } = await run('apt-get', ['install', '-y', '-qq', '--no-install-recommends', 'chromium'], { quiet: true });
  return code === 0 && existsSync('/usr/bin/chromium');
}
