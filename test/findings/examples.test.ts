import assert from 'node:assert/strict';
import { codes, createJudgeStore, judge, type Example } from '../../src/findings';
import { read } from '../../src/spec';

const codesIn = (text: string): readonly string[] => judge(read(text), createJudgeStore()).findings.map(({ code }) => code);
const cured = ({ spec, from, to }: Example): string => spec.replace(from, () => to);

describe('the example of a finding code', () => {
  for (const { code, help } of codes) {
    const { example } = help;
    if (example === null) continue;

    it(`has ${code}, and has it no more once it is cured as the page says`, () => {
      assert.equal(example.spec.split(example.from).length, 2, 'the part to replace stands once');
      assert.ok(codesIn(example.spec).includes(code), codesIn(example.spec).join());
      assert.ok(!codesIn(cured(example)).includes(code));
    });

    it(`brings nothing into the page of ${code} that is no part of it`, () => {
      const others = codesIn(cured(example));
      assert.deepEqual(others, []);
    });
  }

  it('is left out only where no short spec can show the finding', () => {
    const without = codes.filter(({ help }) => help.example === null).map(({ code }) => code);
    assert.deepEqual(without, ['file-not-read', 'too-large', 'beyond-data']);
  });
});
