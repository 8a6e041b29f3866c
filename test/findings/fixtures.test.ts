import assert from 'node:assert/strict';
import { readdirSync, readFileSync } from 'node:fs';
import { join } from 'node:path';
import { createJudgeStore, judge, spanOfFinding, codes } from '../../src/findings';
import { read, type FileSource } from '../../src/spec';
import { findingLine, markerLines, readMarkers } from '../support/markers';

const folder = join(__dirname, '..', 'fixtures', 'findings');
const names = readdirSync(folder);
const textOf = (name: string): string => readFileSync(join(folder, name), 'utf8').replaceAll('\r\n', '\n');

/** The tables that a marked spec names, from the folder of all fixtures. */
const filesOf = (name: string): FileSource => ({
  path: `findings/${name}`,
  content: (path) => ({ text: readFileSync(join(folder, '..', path), 'utf8') }),
});

describe('the findings of the marked specs', () => {
  for (const name of names) {
    const text = textOf(name);

    it(`are those that ${name} marks, each at its place, and no others`, () => {
      const { reading, findings } = judge(read(text, undefined, filesOf(name)), createJudgeStore());
      const open = findings.filter((finding) => finding.accepted === null);
      const lines = open.map((finding) => findingLine(text, { code: finding.code, ...spanOfFinding(reading, finding) }));
      assert.deepEqual(lines.sort(), markerLines(text), findings.map(({ message }) => message).join('\n'));
    });

    it(`say in ${name} what the marks say`, () => {
      const { findings } = judge(read(text, undefined, filesOf(name)), createJudgeStore());
      for (const { code, words } of readMarkers(text)) {
        const said = findings.filter((finding) => finding.code === code).map(({ message }) => message);
        assert.ok(
          said.some((message) => message.includes(words)),
          `none says “${words}”: ${said.join(' | ')}`,
        );
      }
    });
  }

  it('leave out no code that follows from figures', () => {
    const marked = new Set(names.flatMap((name) => readMarkers(textOf(name)).map(({ code }) => code)));
    const missing = codes.filter(({ group, code }) => group !== 'the text' && !marked.has(code));
    assert.deepEqual(
      missing.map(({ code }) => code),
      [],
    );
  });
});
