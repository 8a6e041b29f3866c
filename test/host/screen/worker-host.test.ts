import assert from 'node:assert/strict';
import { Session } from './session';

describe('the extension in the browser, without Node', () => {
  let session: Session;
  before(async () => {
    session = await Session.start('worker', 'worker');
    await session.open('gate-bearing-broken.bandkeep.yaml');
  });
  afterEach(async function () {
    const test = this.currentTest;
    if (test?.state === 'failed') await session.picture(`failed-${test.title.replace(/\W+/g, '-')}`);
  });
  after(async () => {
    await session.end();
  });

  it('judges the spec and draws it, with the server in a worker', async () => {
    await session.page.locator('.squiggly-error').first().waitFor();
    await session.clickPanelButton();
    const panel = await session.panel();
    await panel.locator('h1').getByText('bearing-x').waitFor();
    assert.equal(await panel.locator('.verdict').getAttribute('data-standing'), 'over');
    await session.picture('gate-bearing-broken-worker');
  });

  it('starts a new server on demand', async () => {
    await session.page.keyboard.press('F1');
    await session.page.locator('.quick-input-widget input').first().fill('>Bandkeep: Restart Server');
    await session.page.locator('.quick-input-widget .monaco-list-row.focused').getByText('Restart Server').first().waitFor();
    await session.page.keyboard.press('Enter');
    await session.page.locator('.view-line').getByText('bits: 16').first().click();
    await session.page.keyboard.press('End');
    await session.page.keyboard.type('x');
    // Two broken limits before, one fault of the text now.
    await session.page.locator('#status\\.problems').filter({ hasText: /\b1\b/ }).waitFor();
    assert.equal(await session.page.locator('.squiggly-error').count(), 1);
  });
});
