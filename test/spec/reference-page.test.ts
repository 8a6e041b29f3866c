/** The reference page of the language: as stored, and without a gap. */
import assert from 'node:assert/strict';
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { referencePage } from '../../src/spec/reference-page';

const page = referencePage();

describe('the reference page of the language', () => {
  it('is stored as the declaration makes it', () => {
    const stored = readFileSync(join(__dirname, '..', '..', 'docs', 'language.md'), 'utf8').replaceAll('\r\n', '\n');
    assert.equal(stored, page, 'run `npx tsx scripts/make-docs.mjs`');
  });

  it('tells of every map once, by its own name', () => {
    const titles = [...page.matchAll(/^## (.*)$/gmu)].map(([, title]) => title);
    assert.equal(new Set(titles).size, titles.length, titles.join('\n'));
    for (const title of [
      'A spec',
      'A channel',
      'A stage',
      'A pulse',
      'A gate',
      'The time slots',
      'A mask segment',
      'The limits',
      'The harmonics',
    ]) {
      assert.ok(titles.includes(title), `${title} among ${titles.join(', ')}`);
    }
  });

  it('gives keys their units, their words and what holds without them', () => {
    assert.match(page, /^\| `enters` \| .* \| input \|$/mu);
    assert.match(page, /^\| `tone` \| .* Units: Hz\. \| – \|$/mu);
    assert.match(page, /^\| `gate` \(relay\) \| /mu);
    assert.match(page, /^- `kind`: .*`notch` – /mu);
    assert.match(page, /^\*Later\*: .*`sallen-key`/mu);
  });
});
