import assert from 'node:assert/strict';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { kinds } from '../../src/findings/kinds';
import { explain, indexPage, pageName, pageOf } from '../../src/findings/page';

const folder = join(__dirname, '..', '..', 'docs', 'findings');
const stored = (name: string): string => readFileSync(join(folder, name), 'utf8').replaceAll('\r\n', '\n');
const remedy = 'run `npx tsx scripts/make-docs.mjs`';

describe('the pages of the findings', () => {
  for (const kind of kinds) {
    it(`show the help of ${kind.code} as it stands in the code`, () => {
      assert.equal(stored(pageName(kind)), pageOf(kind), remedy);
    });
  }

  it('have an index of all codes, and no page besides', () => {
    assert.equal(stored('README.md'), indexPage(), remedy);
    assert.deepEqual(readdirSync(folder).sort(), ['README.md', ...kinds.map(pageName)].sort(), remedy);
  });

  it('are what `explain` gives, and nothing is given for a code that is none', () => {
    assert.match(explain('alias-over-limit') ?? '', /^# alias-over-limit\n/);
    assert.equal(explain('alais-over-limit'), null);
  });

  it('say of every code what it means, why it matters and how to cure it, in sentences', () => {
    for (const { code, help } of kinds) {
      for (const text of [help.summary, help.means, help.matters, help.cure]) assert.match(text, /[.)]$/, code);
    }
  });

  it('differ in their codes', () => {
    assert.equal(new Set(kinds.map(({ code }) => code)).size, kinds.length);
  });
});
