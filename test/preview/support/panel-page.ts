/** The built page in a real browser under its own strict policy, with a stand-in for the workbench that records what the page says. */
import { join } from 'node:path';
import { pathToFileURL } from 'node:url';
import { build } from 'esbuild';
import { chromium } from 'playwright-core';
import type { Browser, BrowserContext, Page } from 'playwright-core';
import { panelHtml } from '../../../src/protocol/panel-html';
import type { HostMessage, PageMessage } from '../../../src/protocol/panel-messages';
import type { WorkbenchTheme } from './themes';

/** Where the stand-in serves the page; the name leads nowhere. */
const origin = 'http://panel.invalid';

/** A running browser with the page's bundle. */
export interface PanelBrowser {
  readonly browser: Browser;
  readonly files: ReadonlyMap<string, string>;
}

/** One page and what it has said and done wrong so far. */
export interface PanelPage {
  readonly page: Page;
  readonly context: BrowserContext;
  /** Console errors, exceptions and violations of the policy. */
  readonly faults: readonly string[];
  say: (message: HostMessage) => Promise<void>;
  /** All that the page has said. */
  said: () => Promise<readonly PageMessage[]>;
  wear: (theme: WorkbenchTheme) => Promise<void>;
  /** What the page has kept with the workbench. */
  kept: () => Promise<unknown>;
}

/** Builds the page as the product does and starts a browser. */
export async function openBrowser(): Promise<PanelBrowser> {
  const root = join(__dirname, '..', '..', '..');
  const script = join(root, 'scripts', 'find-browser.mjs');
  const { findBrowser } = (await import(pathToFileURL(script).href)) as { findBrowser: () => Promise<object> };
  const built = await build({
    entryPoints: [join(root, 'src/preview/main.ts'), join(root, 'src/preview/panel.css')],
    bundle: true,
    minify: true,
    format: 'iife',
    target: 'es2022',
    outdir: join(root, 'out'),
    write: false,
  });
  const files = new Map(built.outputFiles.map((file) => [file.path.endsWith('.css') ? '/panel.css' : '/panel.js', file.text]));
  return { browser: await chromium.launch({ ...(await findBrowser()), headless: true }), files };
}

/** Opens a fresh page in a theme. */
export async function openPanel({ browser, files }: PanelBrowser, theme: WorkbenchTheme, width = 760): Promise<PanelPage> {
  const context = await browser.newContext({ viewport: { width, height: 900 }, deviceScaleFactor: 1.5 });
  const page = await context.newPage();
  const faults: string[] = [];
  page.on('console', (message) => {
    if (message.type() === 'error' || message.type() === 'warning') faults.push(message.text());
  });
  page.on('pageerror', (error) => faults.push(error.message));
  await context.route('**/*', (route) => route.fulfill(answer(new URL(route.request().url()).pathname, files, theme)));
  await page.goto(`${origin}/`);
  return {
    page,
    context,
    faults,
    say: (message) =>
      page.evaluate((data) => {
        window.postMessage(data, '*');
      }, message as unknown),
    said: () => page.evaluate(() => (window as unknown as { said: PageMessage[] }).said),
    wear: (next) =>
      page.evaluate((worn) => {
        (window as unknown as { dress: (theme: unknown) => void }).dress(worn);
      }, next as unknown),
    kept: () => page.evaluate(() => JSON.parse(sessionStorage.getItem('state') ?? 'null') as unknown),
  };
}

interface Answer {
  readonly status: number;
  readonly contentType: string;
  readonly body: string;
}

function answer(path: string, files: ReadonlyMap<string, string>, theme: WorkbenchTheme): Answer {
  const html = panelHtml({ cspSource: origin, nonce: 'n0nce', scriptUri: `${origin}/panel.js`, styleUri: `${origin}/panel.css` });
  const first = '<script nonce="n0nce" src="/stand-in.js"></script><script';
  if (path === '/') return { status: 200, contentType: 'text/html', body: html.replace('<script', first) };
  const body = path === '/stand-in.js' ? standIn(theme) : files.get(path);
  const contentType = path.endsWith('.css') ? 'text/css' : 'text/javascript';
  return body === undefined ? { status: 404, contentType: 'text/plain', body: '' } : { status: 200, contentType, body };
}

/** Runs in the page before its own script: the workbench's part, as text, since nothing of ours is there yet. */
function standIn(theme: WorkbenchTheme): string {
  return `
window.said = [];
document.addEventListener('securitypolicyviolation', (event) => console.error('policy violated: ' + event.violatedDirective + ' ' + event.blockedURI));
window.acquireVsCodeApi = () => ({
  postMessage: (message) => window.said.push(message),
  getState: () => JSON.parse(sessionStorage.getItem('state') ?? 'null') ?? undefined,
  setState: (state) => sessionStorage.setItem('state', JSON.stringify(state)),
});
window.dress = (theme) => {
  for (const [name, value] of Object.entries(theme.variables)) document.documentElement.style.setProperty(name, value);
  document.body.className = theme.classes.join(' ');
};
window.dress(${JSON.stringify(theme)});`;
}
