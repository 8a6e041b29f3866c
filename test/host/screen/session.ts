/** A person's session in the workbench: an example open, the panel a click away, the theme theirs to choose. */
import { mkdirSync, rmSync } from 'node:fs';
import { join } from 'node:path';
import type { Browser, Frame, Page } from 'playwright-core';
import { browse } from '../../../scripts/browse.mjs';
import { scratchFolder } from '../../../scripts/scratch-folder.mjs';
import {
  installWorkbench,
  serveExtension,
  startWorkbench,
  workbenchAddress,
  type Workbench,
} from '../../../scripts/workbench.mjs';

const root = join(__dirname, '..', '..', '..');

/** The workbench's own themes that the panel is looked at in, by the class that each puts on the body of a panel. */
export const themes = {
  'vscode-dark': 'Dark Modern',
  'vscode-light': 'Light Modern',
  'vscode-high-contrast': 'Dark High Contrast',
  'vscode-high-contrast-light': 'Light High Contrast',
} as const;

/** A running workbench with a browser looking at it. */
export class Session {
  /** What the browser's console complained about. */
  readonly complaints: string[] = [];

  private constructor(
    private readonly workbench: Workbench,
    private readonly browser: Browser,
    private readonly host: 'node' | 'worker',
    readonly folder: string,
    readonly page: Page,
  ) {
    page.setDefaultTimeout(60_000);
    page.on('console', (message) => {
      if (message.type() === 'error') this.complaints.push(message.text());
    });
  }

  /** Starts a workbench with fresh settings and a fresh copy of the examples; the extension runs in Node or in a worker of the browser. */
  static async start(name: string, host: 'node' | 'worker' = 'node'): Promise<Session> {
    await installWorkbench();
    const data = join(root, 'out', 'scratch', `${name}-data`);
    rmSync(data, { recursive: true, force: true });
    const workbench = await startWorkbench({ data, settings });
    const browser = await browse();
    const page = await browser.newPage({ viewport: { width: 1500, height: 950 } });
    if (host === 'worker') await page.addInitScript(nameExtension, serveExtension());
    return new Session(workbench, browser, host, scratchFolder(name), page);
  }

  /** Opens a spec and waits until its channel's line is on the screen. */
  async open(file: string): Promise<void> {
    await this.page.goto(
      workbenchAddress(this.workbench, { folder: this.folder, file: join(this.folder, file), host: this.host }),
    );
    await this.page.locator('.view-lines').getByText('bandkeep', { exact: false }).first().waitFor();
  }

  /** Opens the panel by its button in the editor's title bar. */
  async clickPanelButton(): Promise<void> {
    await this.page.getByRole('button', { name: 'Show Panel to the Side' }).first().click();
  }

  /** The panel's own frame once it has drawn a plot. */
  async panel(): Promise<Frame> {
    const outer = await this.page.locator('iframe.webview.ready').last().elementHandle();
    const inner = await (await outer.contentFrame())?.waitForSelector('iframe#active-frame');
    const frame = await inner?.contentFrame();
    if (!frame) throw new Error('The panel has no page.');
    await frame.locator('canvas').first().waitFor();
    return frame;
  }

  /** Chooses a theme from the workbench's own list, as a person does, and waits until the panel wears it. */
  async choose(theme: keyof typeof themes): Promise<void> {
    await this.page.keyboard.press('Control+k');
    await this.page.keyboard.press('Control+t');
    const list = this.page.locator('.quick-input-widget');
    await list.locator('input').first().fill(themes[theme]);
    await list.locator('.monaco-list-row.focused').getByText(themes[theme], { exact: true }).first().waitFor();
    await this.page.keyboard.press('Enter');
    await list.waitFor({ state: 'hidden' });
    await (await this.panel()).locator(`body.${theme}`).waitFor();
  }

  /** Stores what is on the screen under test-results/screenshots. */
  async picture(name: string): Promise<string> {
    const folder = join(root, 'test-results', 'screenshots');
    mkdirSync(folder, { recursive: true });
    const path = join(folder, `${name}.png`);
    await this.page.screenshot({ path });
    return path;
  }

  async end(): Promise<void> {
    await this.browser.close();
    await this.workbench.stop();
  }
}

/** Runs in the page before anything else: names the served extension in the configuration that the workbench reads from its page. */
function nameExtension(path: string): void {
  const watcher = new MutationObserver(() => {
    const meta = document.getElementById('vscode-workbench-web-configuration');
    if (meta === null) return;
    watcher.disconnect();
    const configuration = JSON.parse(meta.getAttribute('data-settings') ?? '{}') as Record<string, unknown>;
    const extensions = [{ scheme: 'http', authority: location.host, path }];
    meta.setAttribute('data-settings', JSON.stringify({ ...configuration, developmentOptions: { extensions } }));
  });
  watcher.observe(document, { childList: true, subtree: true });
}

/** Nothing in the way of what is looked at. */
const settings = {
  'workbench.colorTheme': 'Default Dark Modern',
  'window.autoDetectColorScheme': false,
  'workbench.tips.enabled': false,
  'editor.minimap.enabled': false,
};
