/** The built page in a real browser: real pictures, its own strict policy, pointer and keys, and what it tells the extension. */
import assert from 'node:assert/strict';
import { mkdirSync } from 'node:fs';
import { join } from 'node:path';
import { createJudgeStore, judge } from '../../src/findings';
import { pictureOf } from '../../src/pictures';
import type { HostMessage, PageMessage } from '../../src/protocol/panel-messages';
import type { PanelPicture } from '../../src/protocol/picture';
import type { PlaceName } from '../../src/protocol/position';
import { read } from '../../src/spec';
import { exampleText } from '../support/examples';
import { openBrowser, openPanel } from './support/panel-page';
import type { PanelBrowser, PanelPage } from './support/panel-page';
import { themes } from './support/themes';

const uri = 'file:///lagoon/gate-bearing-broken.bandkeep.yaml';
const picture = (example: string, channel: string): PanelPicture =>
  pictureOf(judge(read(exampleText(example)), createJudgeStore()), channel);
const show = (sequence: number, shown: PanelPicture): HostMessage => ({
  kind: 'show',
  sequence,
  uri,
  pinned: false,
  picture: shown,
});

describe('the panel page in a browser', function () {
  this.timeout(180_000);
  const capture = picture('gate-bearing-broken', 'bearing-x');
  const generate = picture('fish-sounder', 'sounder-drive');
  let browser: PanelBrowser;
  let panel: PanelPage;

  const drawn = async (sequence: number): Promise<void> => {
    await panel.page.waitForFunction((wanted) => {
      const { said } = window as unknown as { said: { kind: string; sequence?: number }[] };
      return said.some((message) => message.kind === 'failed' || (message.kind === 'drawn' && message.sequence === wanted));
    }, sequence);
  };
  const last = async <Kind extends PageMessage['kind']>(kind: Kind): Promise<Extract<PageMessage, { kind: Kind }>> => {
    const found = (await panel.said()).findLast((message) => message.kind === kind);
    assert.ok(found !== undefined, `the page has not said "${kind}"`);
    return found as Extract<PageMessage, { kind: Kind }>;
  };
  const draw = async (sequence: number, shown: PanelPicture): Promise<void> => {
    await panel.say(show(sequence, shown));
    await drawn(sequence);
  };
  const viewOf = async (plot: string): Promise<{ panes: Record<string, { x: unknown }>; hidden: string[] } | undefined> => {
    const kept = (await panel.kept()) as { plots: Record<string, { panes: Record<string, { x: unknown }>; hidden: string[] }> };
    return Object.entries(kept.plots).find(([key]) => key.endsWith(`\n${plot}`))?.[1];
  };
  const stage = (): ReturnType<PanelPage['page']['locator']> => panel.page.locator('.stage').first();

  before(async () => {
    browser = await openBrowser();
  });
  after(async () => {
    await browser.browser.close();
  });
  beforeEach(async () => {
    panel = await openPanel(browser, themes.light);
  });
  afterEach(async () => {
    assert.deepEqual(panel.faults, []);
    assert.deepEqual(
      (await panel.said()).filter(({ kind }) => kind === 'failed'),
      [],
    );
    await panel.context.close();
  });

  it('says that it is ready, explains its emptiness, and keeps a state so that it is revived', async () => {
    assert.deepEqual(await panel.said(), [{ kind: 'ready' }]);
    assert.equal(await panel.page.locator('#notice').textContent(), 'Waiting for the first picture.');
    assert.notEqual(await panel.kept(), null);
    await panel.say({ kind: 'stale', sequence: 1, uri, reason: 'This spec has no channel yet.' });
    await panel.page.getByText('This spec has no channel yet.').waitFor();
  });

  it('draws a capture channel and says what it has drawn', async () => {
    await draw(1, capture);
    const items = capture.sections.flatMap(({ plots }) => plots).reduce((sum, plot) => sum + plot.items.length, 0);
    assert.deepEqual(await last('drawn'), { kind: 'drawn', sequence: 1, sections: 2, items });
    assert.equal(await panel.page.locator('h1').textContent(), 'bearing-x');
    assert.equal(await panel.page.locator('.verdict').textContent(), capture.heading.verdict.text);
    assert.ok(await inked(panel, 0));
  });

  it('keeps zoom, hidden series, folds and focus over a newer picture', async () => {
    await draw(1, capture);
    const box = (await stage().boundingBox())!;
    await panel.page.mouse.move(box.x + 420, box.y + 80);
    await panel.page.mouse.down();
    await panel.page.mouse.move(box.x + 560, box.y + 90, { steps: 4 });
    await panel.page.mouse.up();
    await panel.page.getByRole('button', { name: 'noise', exact: true }).first().click();
    await panel.page.getByRole('button', { name: /Analogue path/ }).click();
    const before = await viewOf('sampling');
    assert.notEqual(before?.panes['input']?.x, null);
    assert.deepEqual(before?.hidden, ['noise']);
    const canvas = await panel.page.locator('canvas').first().elementHandle();
    const focus = await panel.page.evaluate(() => document.activeElement?.textContent);
    await draw(2, picture('gate-bearing', 'bearing-x'));
    assert.deepEqual(await viewOf('sampling'), before);
    assert.equal(await panel.page.locator('#body-path').isHidden(), true);
    assert.ok(await panel.page.evaluate((old) => old === document.querySelector('canvas'), canvas), 'the canvas is the same');
    assert.equal(await panel.page.evaluate(() => document.activeElement?.textContent.slice(0, 13)), focus?.slice(0, 13));
  });

  it('ignores a picture that is older than the one it shows', async () => {
    await draw(5, capture);
    await panel.say(show(4, generate));
    await draw(6, capture);
    assert.ok(!(await panel.said()).some((message) => message.kind === 'drawn' && message.sequence === 4));
  });

  it('keeps the last good picture, dimmed, with the reason', async () => {
    await draw(1, capture);
    await panel.say({ kind: 'stale', sequence: 2, uri, reason: '`bearing-x` has 2 faults.' });
    await panel.page.getByText(/has 2 faults/).waitFor();
    assert.equal(await panel.page.locator('body.stale').count(), 1);
    assert.ok(await inked(panel, 0));
    await draw(3, capture);
    assert.equal(await panel.page.locator('body.stale').count(), 0);
    assert.equal(await panel.page.locator('#notice').isHidden(), true);
  });

  it('drops the picture of another spec', async () => {
    await draw(1, capture);
    await panel.say({ kind: 'stale', sequence: 2, uri: 'file:///lagoon/other.bandkeep.yaml', reason: 'No channel here.' });
    await panel.page.getByText('No channel here.').waitFor();
    assert.equal(await panel.page.locator('canvas').count(), 0);
  });

  it('reads values under the pointer and lights all that is joined', async () => {
    await draw(1, capture);
    const box = (await stage().boundingBox())!;
    await panel.page.mouse.move(box.x + 150, box.y + 330);
    const tip = await panel.page.locator('.tip').first().textContent();
    assert.match(tip ?? '', /^drive hash: .* lands on .*, first fold, inverted/);
  });

  it('reads values by keyboard, tells them, and follows an item to its line', async () => {
    await draw(1, capture);
    await stage().focus();
    await panel.page.keyboard.press('ArrowUp');
    await panel.page.keyboard.press('ArrowUp');
    const words = await panel.page.locator('#announcer').textContent();
    assert.match(words ?? '', /sump-pump switcher at .* lands on 10 kHz/);
    await panel.page.keyboard.press('Enter');
    assert.deepEqual(await last('reveal'), { kind: 'reveal', place: { channel: 'bearing-x', path: ['unwanted', 0] } });
  });

  it('zooms, pans and comes back by keyboard', async () => {
    await draw(1, capture);
    await stage().focus();
    for (const key of ['+', '+', 'Shift+ArrowRight']) await panel.page.keyboard.press(key);
    assert.notEqual((await viewOf('sampling'))?.panes['input']?.x, null);
    await panel.page.keyboard.press('0');
    assert.equal((await viewOf('sampling'))?.panes['input']?.x, null);
  });

  it('zooms by the wheel once it has been clicked, and scrolls until then', async () => {
    await draw(1, capture);
    const box = (await stage().boundingBox())!;
    await panel.page.mouse.move(box.x + 300, box.y + 100);
    await panel.page.mouse.wheel(0, -100);
    assert.equal(await viewOf('sampling'), undefined);
    await panel.page.mouse.click(box.x + 300, box.y + 100);
    await panel.page.mouse.wheel(0, -100);
    await panel.page.waitForFunction(() => (sessionStorage.getItem('state') ?? '').includes('"low"'));
    await panel.page.mouse.dblclick(box.x + 300, box.y + 100);
    assert.equal((await viewOf('sampling'))?.panes['input']?.x, null);
  });

  it('shows the same data as a table by one key, with links to the lines', async () => {
    await draw(1, capture);
    await stage().focus();
    await panel.page.keyboard.press('t');
    const table = panel.page.locator('.table').first();
    assert.match((await table.locator('caption').textContent()) ?? '', /^bearing-x: what arrives/);
    assert.equal(await table.locator('tbody').first().locator('tr').count(), capture.sections[0]?.plots[0]?.table.rows.length);
    await table.getByRole('button', { name: 'drive hash', exact: true }).click();
    assert.deepEqual((await last('reveal')).place, { channel: 'bearing-x', path: ['unwanted', 1] } satisfies PlaceName);
    await table.locator('summary').first().click();
    assert.ok((await table.locator('.points tbody tr').count()) > 10);
  });

  it('exports PNG, SVG and CSV through the extension', async () => {
    await draw(1, capture);
    for (const format of ['PNG', 'SVG', 'CSV']) await panel.page.getByRole('button', { name: format }).first().click();
    const saves = (await panel.said()).filter((message) => message.kind === 'save');
    assert.deepEqual(
      saves.map(({ name }) => name),
      ['png', 'svg', 'csv'].map((ending) => `bearing-x-before-and-after-sampling.${ending}`),
    );
    const [png, svg, csv] = saves.map(({ data }) => data);
    assert.deepEqual([...Buffer.from(png ?? '', 'base64').subarray(1, 4)], [...Buffer.from('PNG')]);
    assert.match(csv ?? '', /drive hash/);
    const parsed = await panel.page.evaluate((text) => {
      const document = new DOMParser().parseFromString(text ?? '', 'image/svg+xml');
      return { root: document.documentElement.tagName, faults: document.getElementsByTagName('parsererror').length };
    }, svg);
    assert.deepEqual(parsed, { root: 'svg', faults: 0 });
  });

  it('lights the items of the line that the cursor is in', async () => {
    await draw(1, capture);
    const before = await pixels(panel);
    await panel.say({ kind: 'lit', place: { channel: 'bearing-x', path: ['unwanted', 1, 'level'] } });
    await panel.page.waitForFunction((old) => document.querySelector('canvas')?.toDataURL() !== old, before);
    await panel.say({ kind: 'lit', place: null });
    await panel.page.waitForFunction((old) => document.querySelector('canvas')?.toDataURL() === old, before);
  });

  it('lets go of what was lit while a newer picture came', async () => {
    await draw(1, capture);
    const before = await pixels(panel);
    await panel.say({ kind: 'lit', place: { channel: 'bearing-x', path: ['unwanted', 1, 'level'] } });
    await draw(2, structuredClone(capture));
    await panel.say({ kind: 'lit', place: null });
    await panel.page.waitForFunction((old) => document.querySelector('canvas')?.toDataURL() === old, before);
  });

  it('asks to hold the channel, to let it go, and for a fresh picture', async () => {
    await draw(1, capture);
    await panel.page.getByRole('button', { name: 'Hold' }).click();
    assert.deepEqual(await last('pin'), { kind: 'pin', channel: 'bearing-x' });
    await panel.page.getByRole('button', { name: 'Held' }).click();
    assert.deepEqual(await last('pin'), { kind: 'pin', channel: null });
    await panel.page.getByRole('button', { name: 'Refresh' }).click();
    await last('request-refresh');
  });

  it('comes back after a reload as it was left', async () => {
    await draw(1, capture);
    await stage().focus();
    await panel.page.keyboard.press('+');
    await panel.page.getByRole('button', { name: /Analogue path/ }).click();
    const before = await viewOf('sampling');
    await panel.page.reload();
    await draw(1, capture);
    assert.deepEqual(await viewOf('sampling'), before);
    assert.equal(await panel.page.locator('#body-path').isHidden(), true);
    assert.equal(((await panel.kept()) as { uri: string }).uri, uri);
  });

  it('draws phase and group delay when asked', async () => {
    await draw(1, capture);
    const opener = panel.page.getByRole('button', { name: /^Group delay/ });
    assert.equal(await opener.getAttribute('aria-expanded'), 'false');
    await opener.click();
    assert.equal(await opener.getAttribute('aria-expanded'), 'true');
    assert.ok(await inked(panel, 4));
  });

  it('turns from capture to generate and back without leaving a canvas behind', async () => {
    await draw(1, capture);
    await draw(2, generate);
    assert.equal(await panel.page.locator('[data-section="sampling"]').count(), 0);
    assert.equal(
      await panel.page.locator('section h2').first().textContent(),
      `What leaves${generate.sections[0]?.answer.text ?? ''}`,
    );
    const canvases = await panel.page.locator('canvas').count();
    for (let sequence = 3; sequence < 9; sequence += 1) await draw(sequence, sequence % 2 === 0 ? generate : capture);
    assert.equal(await panel.page.locator('canvas').count(), canvases);
  });

  it('keeps the sections in the order of the signal, whichever come and go', async () => {
    const relay = picture('strain-link', 'strain-link');
    const order = async (): Promise<(string | null)[]> =>
      Promise.all((await panel.page.locator('[data-section]').all()).map((section) => section.getAttribute('data-section')));
    await draw(1, relay);
    assert.deepEqual(await order(), ['sampling', 'leaving', 'path']);
    await draw(2, generate);
    assert.deepEqual(await order(), ['leaving', 'path']);
    await draw(3, relay);
    assert.deepEqual(await order(), ['sampling', 'leaving', 'path']);
  });

  it('treats every text of a spec as text', async () => {
    const evil = JSON.parse(JSON.stringify(capture).replaceAll('drive hash', '<img src=x onerror=alert(1)>')) as PanelPicture;
    await draw(1, evil);
    assert.equal(await panel.page.locator('img').count(), 0);
    assert.ok((await panel.page.getByText('<img src=x onerror=alert(1)>').count()) > 0);
  });

  it('shrugs off a message that is not for it', async () => {
    await panel.page.evaluate(() => {
      window.postMessage({ kind: 'show', sequence: 1, picture: 'none' }, '*');
      window.postMessage('hello', '*');
    });
    await draw(2, capture);
    assert.equal((await last('drawn')).sequence, 2);
  });

  it('fits a narrow panel and keeps its zoom when it is resized', async () => {
    await draw(1, capture);
    await stage().focus();
    await panel.page.keyboard.press('+');
    const before = await viewOf('sampling');
    await panel.page.setViewportSize({ width: 420, height: 800 });
    await panel.page.waitForFunction(() => (document.querySelector('canvas')?.clientWidth ?? 999) < 420);
    assert.deepEqual(await viewOf('sampling'), before);
    assert.equal(await panel.page.evaluate(() => document.documentElement.scrollWidth <= window.innerWidth), true);
  });

  for (const theme of ['light', 'dark', 'high-contrast'] as const) {
    it(`wears the ${theme} theme, and its pictures are kept to be looked at`, async () => {
      const folder = join(__dirname, '..', '..', 'test-results', 'panel');
      mkdirSync(folder, { recursive: true });
      await draw(1, capture);
      await panel.wear(themes[theme]);
      await panel.page.waitForFunction((colour) => {
        const canvas = document.querySelector('canvas');
        const [red] = canvas?.getContext('2d')?.getImageData(2, 2, 1, 1).data ?? [];
        return red === Number.parseInt(colour.slice(1, 3), 16);
      }, themes[theme].variables['--vscode-editor-background']);
      await panel.page.screenshot({ path: join(folder, `capture-${theme}.png`), fullPage: true });
      await draw(2, generate);
      await panel.page.screenshot({ path: join(folder, `generate-${theme}.png`), fullPage: true });
      assert.equal((await panel.page.locator('canvas').count()) > 0, true);
    });
  }
});

/** Whether a canvas shows more than its background. */
async function inked({ page }: PanelPage, index: number): Promise<boolean> {
  return await page.evaluate((which) => {
    const canvas = document.querySelectorAll('canvas')[which];
    const data = canvas?.getContext('2d')?.getImageData(0, 0, canvas.width, canvas.height).data ?? [];
    const colours = new Set<number>();
    for (let offset = 0; offset < data.length; offset += 4 * 97)
      colours.add(((data[offset] ?? 0) << 16) + ((data[offset + 1] ?? 0) << 8) + (data[offset + 2] ?? 0));
    return colours.size > 5;
  }, index);
}

async function pixels({ page }: PanelPage): Promise<string> {
  return await page.evaluate(() => document.querySelector('canvas')?.toDataURL() ?? '');
}
