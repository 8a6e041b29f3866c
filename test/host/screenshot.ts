/** `npm run screenshot`: draws the picture of the README, media/editor.png, from the broken example with its panel open. */
import { copyFileSync } from 'node:fs';
import { join } from 'node:path';
import { Session } from './screen/session';

const target = join(__dirname, '..', '..', 'media', 'editor.png');

async function draw(): Promise<void> {
  const session = await Session.start('screenshot');
  try {
    await session.page.setViewportSize({ width: 1440, height: 900 });
    await session.open('gate-bearing-broken.bandkeep.yaml');
    await session.page.keyboard.press('Control+b');
    await session.clickPanelButton();
    await session.panel();
    // The cursor on the source that breaks the limit, so that its landing is lit; its end in sight.
    await session.page.locator('.view-line').getByText('drive hash').first().click();
    await session.page.locator('.squiggly-error').first().waitFor();
    copyFileSync(await session.picture('editor'), target);
  } finally {
    await session.end();
  }
}

void draw();
