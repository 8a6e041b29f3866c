/** The specs of published masks: each passes without a finding, and a filter one order lower breaks its mask. */
import assert from 'node:assert/strict';
import { readdirSync } from 'node:fs';
import { join } from 'node:path';
import { createJudgeStore, judge, type Judgement } from '../../src/findings';
import { read } from '../../src/spec';
import { exampleText } from '../support/examples';

const files = readdirSync(join(import.meta.dirname, '../../examples/standards')).map((file) =>
  file.replace('.bandkeep.yaml', ''),
);
const judged = (text: string): Judgement => judge(read(text), createJudgeStore());
const weaker = (text: string): string => text.replaceAll(/order: (\d+)/g, (_, order: string) => `order: ${Number(order) - 1}`);

describe('the masks of published standards', () => {
  it('are three files', () => {
    assert.deepEqual(files.sort(), ['aes17-measurement', 'bt601-video', 'g712-speech']);
  });

  for (const file of files) {
    const text = exampleText(`standards/${file}`);

    it(`${file}: every channel passes, without a finding`, () => {
      const { findings, channels } = judged(text);
      assert.deepEqual(
        findings.map(({ message }) => message),
        [],
      );
      for (const { figures, passes } of channels) {
        assert.equal(passes, true);
        assert.ok(figures !== null && figures.masks.length > 1);
        assert.ok(figures.masks.every(({ margin }) => margin > 0));
      }
    });

    it(`${file}: a filter one order lower breaks the mask of every channel`, () => {
      const { channels } = judged(weaker(text));
      for (const { figures } of channels) assert.ok(figures?.masks.some(({ margin }) => margin < -0.5));
    });

    it(`${file}: says of every value where it is from`, () => {
      assert.match(text, /from memory/i);
      assert.match(text, /Look (them|it) up before/);
    });
  }
});
