/** DEVELOPERS.md shows the layer table as it is enforced. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { createRequire } from 'node:module';
import { join } from 'node:path';

const root = join(__dirname, '..', '..');
const { layers } = createRequire(__filename)(join(root, '.dependency-cruiser.cjs')) as { layers: Record<string, string[]> };

describe('DEVELOPERS.md', () => {
  it('shows the same layer table that the dependency checker enforces', () => {
    const page = readFileSync(join(root, 'DEVELOPERS.md'), 'utf8').replaceAll('\r\n', '\n');
    const shown = /<!-- layers -->\n([\s\S]*?)<!-- \/layers -->/.exec(page)?.[1] ?? '';
    const rows = Object.entries(layers).map(
      ([name, allowed]) => `| \`${name}\` | ${allowed.map((other) => `\`${other}\``).join(', ') || '–'} |`,
    );
    assert.equal(shown, ['| folder | may import |', '|---|---|', ...rows, ''].join('\n'));
  });
});
