// Draws media/icon.png from media/icon.svg; run it by hand after a change of the SVG.
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { browse } from './browse.mjs';
import { root } from './prepare-clone.mjs';

const side = 256;
const browser = await browse();
const page = await browser.newPage({ viewport: { width: side, height: side } });
const svg = readFileSync(join(root, 'media', 'icon.svg'), 'utf8');
await page.setContent(`<style>body { margin: 0 } svg { display: block; width: ${side}px }</style>${svg}`);
await page.screenshot({ path: join(root, 'media', 'icon.png'), omitBackground: true });
await browser.close();
