import assert from 'node:assert/strict';
import { readFileSync, statSync } from 'node:fs';
import { join } from 'node:path';
import type { Frame, Locator } from 'playwright-core';
import { Session, themes } from './session';

const spec = 'gate-bearing-broken.bandkeep.yaml';

/** Types at the end of a line that holds a text, as a person would: click it, go to its end, type, and come back to see the line's head. */
async function typeAtEndOf(session: Session, text: string, typed: string): Promise<void> {
  await session.page.locator('.view-line').getByText(text).first().click();
  await session.page.keyboard.press('End');
  await session.page.keyboard.type(typed);
  await session.page.keyboard.press('Home');
}

/** Notes on the panel's own body what the extension tells it: the number of pictures, and the place lit last. */
async function noteMessages(panel: Frame): Promise<void> {
  await panel.evaluate(() => {
    let pictures = 0;
    window.addEventListener('message', ({ data }: MessageEvent<{ kind?: string; place?: unknown }>) => {
      if (data.kind === 'show') pictures += 1;
      // Two frames later it is on the screen.
      requestAnimationFrame(() =>
        requestAnimationFrame(() => {
          if (data.kind === 'show') document.body.dataset['pictures'] = String(pictures);
          if (data.kind === 'lit') document.body.dataset['lit'] = JSON.stringify(data.place);
        }),
      );
    });
  });
}

/** What is seen of a plot once it has come to rest, without its outermost pixels, which belong to the ring around what has the focus. */
async function pictureOf(session: Session, canvas: Locator): Promise<Buffer> {
  let before = await snapshotOf(session, canvas);
  for (let alike = 0, left = 60; alike < 3 && left > 0; left -= 1) {
    // A key's effect reaches the screen some frames after the key has been taken, later on a busy machine.
    await session.page.waitForTimeout(100);
    const now = await snapshotOf(session, canvas);
    alike = now.equals(before) ? alike + 1 : 0;
    before = now;
  }
  return before;
}

/** Whether a plot looks like an earlier picture of it once it has come to rest; the editor's cursor may light an item a moment later. */
async function comesToLookLike(session: Session, canvas: Locator, picture: Buffer): Promise<boolean> {
  for (let left = 10; left > 0; left -= 1) if (picture.equals(await pictureOf(session, canvas))) return true;
  return false;
}

async function snapshotOf(session: Session, canvas: Locator): Promise<Buffer> {
  const box = await canvas.boundingBox();
  assert.ok(box !== null, 'the plot is not on the screen');
  const inset = 6;
  const clip = { x: box.x + inset, y: box.y + inset, width: box.width - 2 * inset, height: box.height - 2 * inset };
  return session.page.screenshot({ clip });
}

/** Takes back what was typed last. */
async function erase(session: Session, typed: string): Promise<void> {
  await session.page.keyboard.press('End');
  for (let left = typed.length; left > 0; left -= 1) await session.page.keyboard.press('Backspace');
}

describe('the panel on the screen', () => {
  let session: Session;
  let panel: Frame;
  before(async () => {
    session = await Session.start('screen');
    await session.open(spec);
  });
  afterEach(async function () {
    const test = this.currentTest;
    if (test?.state === 'failed') await session.picture(`failed-${test.title.replace(/\W+/g, '-')}`);
  });
  after(async () => {
    await session.end();
  });

  it('opens by the button in the title bar and leaves the keyboard to the editor', async () => {
    await session.page.locator('.view-line').getByText('bandkeep').first().click();
    await session.clickPanelButton();
    panel = await session.panel();
    await typeAtEndOf(session, 'bearing-x:', ' # typed');
    await session.page.locator('.view-line').getByText('# typed').first().waitFor();
    await erase(session, ' # typed');
  });

  it('names the channel and says how it stands', async () => {
    assert.equal(await panel.locator('h1').textContent(), 'bearing-x');
    assert.equal(await panel.locator('.verdict').getAttribute('data-standing'), 'over');
    assert.ok((await panel.locator('canvas').count()) >= 2);
  });

  it('runs under a strict policy that nothing of it breaks', async () => {
    const policy = await panel.locator('meta[http-equiv="Content-Security-Policy"]').getAttribute('content');
    assert.match(policy ?? '', /^default-src 'none'; script-src 'nonce-[0-9a-f]{32}'; style-src [^;]+;/);
    assert.doesNotMatch(policy ?? '', /unsafe/);
    assert.deepEqual(
      session.complaints.filter((text) => text.includes('Content Security Policy') && text.includes('panel')),
      [],
    );
  });

  for (const theme of ['vscode-light', 'vscode-high-contrast', 'vscode-high-contrast-light', 'vscode-dark'] as const) {
    it(`wears the editor's theme at once: ${themes[theme]}`, async () => {
      await session.choose(theme);
      const path = await session.picture(`gate-bearing-broken-${theme.replace('vscode-', '')}`);
      assert.ok(statSync(path).size > 20_000);
    });
  }

  it('takes the reader from an item to its line', async () => {
    await panel
      .getByRole('button', { name: /^Table/ })
      .first()
      .click();
    await panel.getByTitle('Go to the line of drive hash').first().click();
    await session.page.locator('#status\\.editor\\.selection').getByText(/Ln 31/).waitFor();
    await panel
      .getByRole('button', { name: /^Table/ })
      .first()
      .click();
  });

  it("keeps the reader's zoom over a save", async () => {
    const canvas = panel.locator('canvas').first();
    await noteMessages(panel);
    await typeAtEndOf(session, 'bits: 16', '');
    await panel.locator('body[data-lit*="bits"]').waitFor();
    // Beside the axes there is nothing to follow.
    await canvas.click({ position: { x: 4, y: 4 } });
    const whole = await pictureOf(session, canvas);
    await session.page.keyboard.press('+');
    await session.page.keyboard.press('+');
    const zoomed = await pictureOf(session, canvas);
    assert.ok(!zoomed.equals(whole), 'the keys did not zoom');
    await typeAtEndOf(session, 'bits: 16', 'x');
    await erase(session, 'x');
    await session.page.keyboard.press('Control+s');
    await panel.locator('body[data-pictures]').waitFor();
    await canvas.click({ position: { x: 4, y: 4 } });
    assert.ok(await comesToLookLike(session, canvas, zoomed), 'the save changed what is seen');
    await session.page.keyboard.press('0');
  });

  it('keeps its page over a save, and dims the last good picture while the channel is broken', async () => {
    await session.page.keyboard.press('Escape');
    await typeAtEndOf(session, 'filter: pick-up', ' x');
    await session.page.keyboard.press('Control+s');
    await panel.locator('body.stale').waitFor();
    assert.match((await panel.locator('#notice').textContent()) ?? '', /bearing-x.*line \d+/);
    await session.picture('gate-bearing-broken-stale');
    await erase(session, ' x');
    await session.page.keyboard.press('Control+s');
    await panel.locator('body:not(.stale)').waitFor();
    assert.equal(await panel.locator('#notice').isVisible(), false);
    assert.match(readFileSync(join(session.folder, spec), 'utf8'), /filter: pick-up guard\n/);
  });

  it('comes back after the window is reloaded', async () => {
    await session.page.reload();
    panel = await session.panel();
    await panel.locator('h1').getByText('bearing-x').waitFor();
  });
});
