/** Pictures of paths with nulls hold numbers only. */
import assert from 'node:assert/strict';
import { createJudgeStore, judge } from '../../src/findings';
import { pictureOf } from '../../src/pictures';
import { isPicture } from '../../src/protocol/picture-guard';
import { read } from '../../src/spec';

const spec = (direction: string, more: string) => `bandkeep: 1
channels:
  lock-gauge:
    direction: ${direction}
    wanted: { band: 1 kHz .. 10 kHz, level: -3 dBFS }
    reference: 2 kHz
    rate: 51.2 kHz
    filter: { second-order: { frequency: 10 kHz, q: 3, kind: notch } }
${more}`;

function pictureIn(text: string) {
  return pictureOf(judge(read(text), createJudgeStore()), 'lock-gauge');
}

describe('the picture of a path that a null silences in its band', () => {
  for (const [direction, more] of [
    ['generate', '    limits: { image: -60 dBc, flatness: 1 dB }\n'],
    [
      'capture',
      '    unwanted: { name: drive hash, band: 40 kHz .. 3 MHz, level: -20 dBFS }\n    limits: { alias: -60 dBc, flatness: 1 dB }\n',
    ],
  ] as const) {
    it(`holds no level that cannot be drawn, in ${direction}`, () => {
      const picture = pictureIn(spec(direction, more));
      assert.ok(isPicture(picture));
      const odd: string[] = [];
      JSON.stringify(picture, (key, value: unknown) => {
        if (typeof value === 'number' && !Number.isFinite(value)) odd.push(key);
        return value;
      });
      assert.deepEqual(odd, []);
    });
  }

  it('says that the limit is broken without limit, not that nothing comes near it', () => {
    const [leaving] = pictureIn(spec('generate', '    limits: { image: -60 dBc }\n')).sections;
    assert.match(leaving?.answer.text ?? '', /broken without limit$/);
  });
});
