/** Runs every group of outside values and leaves the table of them where `npm test` prints it from. */
import assert from 'node:assert/strict';
import { mkdirSync, writeFileSync } from 'node:fs';
import { join } from 'node:path';
import { Tally } from './group';
import { groups } from './groups';
import { tableText, type TableLine } from './table';

const folder = join(import.meta.dirname, '..', '..', 'test-results');

describe('values from outside', () => {
  const lines: TableLine[] = [];

  for (const { title, source, define } of groups) {
    describe(`${title} (${source})`, () => {
      const tally = new Tally();
      define(tally);
      after(() => {
        assert.ok(tally.lines().length > 0, `${title} has no values`);
        lines.push(...tally.lines().map((line) => ({ title, source, ...line })));
      });
    });
  }

  after(() => {
    mkdirSync(folder, { recursive: true });
    writeFileSync(join(folder, 'outside-values.txt'), tableText(lines));
  });
});
