/** Measured stages and tables of levels in the picture, read from files beside the spec. */
import assert from 'node:assert/strict';
import { levelAt } from '../../src/drawing/level-at';
import { createJudgeStore, judge } from '../../src/findings';
import { pictureOf } from '../../src/pictures';
import type { Item, PanelPicture, Points } from '../../src/protocol/picture';
import { isPicture } from '../../src/protocol/picture-guard';
import { read } from '../../src/spec';

const files: Readonly<Record<string, string>> = {
  'guard.csv': 'frequency (Hz), gain (dB), phase (deg)\n10, 0, 0\n1000, 0, -10\n10000, -20, -90\n100000, -60, -180\n',
  'hum.csv': 'frequency (Hz), level (dBFS)\n6000, -40\n60000, -60\n',
};

const spec = (lines: string): string => `bandkeep: 1
title: Slow tide gauge
channels:
  tide:
    direction: capture
    wanted: { band: 100 Hz .. 1 kHz, level: -3 dBFS }
    unwanted:
      - { name: hall, spectrum: hum.csv${lines} }
    rate: 8 kHz
    filter: { measured: guard.csv, below: hold, beyond: -40 dB/decade }
    limits: { alias: -90 dBFS, flatness: 1 dB }
`;

const pictureFor = (text: string): PanelPicture => {
  const source = {
    path: 'tide.bandkeep.yaml',
    content: (path: string) => {
      const found = files[path];
      return found === undefined ? null : { text: found };
    },
  };
  const reading = read(text, undefined, source);
  assert.deepEqual(reading.problems, []);
  return pictureOf(judge(reading, createJudgeStore()), 'tide');
};

const itemOf = (picture: PanelPicture, id: string): Item => {
  const found = picture.sections.flatMap(({ plots }) => plots.flatMap(({ items }) => items)).find((item) => item.id === id);
  assert.ok(found !== undefined, id);
  return found;
};

const curveOf = ({ shapes }: Item): Points => {
  const curve = shapes.find((shape) => shape.kind === 'curve');
  assert.ok(curve?.kind === 'curve');
  return curve.points;
};

describe('a picture made from tables', () => {
  const picture = pictureFor(spec(''));

  it('draws a measured stage through its rows, and on with the stated slope', () => {
    const total = curveOf(itemOf(picture, 'total'));
    for (const [hz, gain] of [
      [1000, 0],
      [10_000, -20],
      // −20 dB at 10 kHz, −60 dB at 100 kHz, straight over frequency.
      [55_000, -40],
    ] as const) {
      assert.ok(Math.abs(levelAt(total, hz) - gain) < 0.2, `${levelAt(total, hz)} at ${hz}`);
    }
    assert.ok(isPicture(JSON.parse(JSON.stringify(picture))));
  });

  it('draws an envelope as it is stated, straight in dB over log frequency', () => {
    const stated = curveOf(itemOf(picture, 'source-0'));
    assert.ok(Math.abs(levelAt(stated, Math.sqrt(6000 * 60_000)) + 50) < 0.05);
    assert.match(
      itemOf(picture, 'source-0').words,
      /^hall: at most −40 dBFS at the input, anywhere under its table over 6 kHz … 60 kHz\./,
    );
  });

  it('lands it by envelope and path together', () => {
    // 7 kHz = 8 − 1 kHz: −40 − 20·log10(7/6) under the table, −20·6/9 dB through the filter.
    const expected = -40 - 20 * Math.log10(7 / 6) - (20 * 6) / 9;
    assert.ok(Math.abs(levelAt(curveOf(itemOf(picture, 'landing-0')), 1000) - expected) < 0.1);
  });

  it('draws each row of a table of lines as a line, where it stands and where it lands', () => {
    const lined = pictureFor(spec(', lines: true'));
    const stems = (id: string): readonly (readonly [number, number])[] =>
      itemOf(lined, id).shapes.flatMap((shape) => (shape.kind === 'stem' ? [[shape.frequencyHz, shape.top] as const] : []));
    assert.deepEqual(stems('source-0'), [
      [6000, -40],
      [60_000, -60],
    ]);
    // 6 kHz lands on 2 kHz, 60 kHz on 4 kHz.
    assert.deepEqual(
      stems('landing-0').map(([hz]) => hz),
      [2000, 4000],
    );
  });
});
