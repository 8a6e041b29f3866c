/** The picture of a relay channel: copies by the weights of the gate, what arrives and where it leaves, all against closed forms. */
import assert from 'node:assert/strict';
import { levelAt } from '../../src/drawing/level-at';
import { createJudgeStore, judge } from '../../src/findings';
import { pictureOf } from '../../src/pictures';
import type { Item, PanelPicture, Points } from '../../src/protocol/picture';
import { isPicture } from '../../src/protocol/picture-guard';
import { read } from '../../src/spec';

const strain = (sampling: string): string => `bandkeep: 1
title: Strain on the turbine shaft
filters:
  bridge side:
    - { rc: { r: 1 kΩ, c: 22 nF }, name: bridge rc }
channels:
  strain:
    direction: relay
    wanted: { band: 0 Hz .. 400 Hz, level: -3 dBFS }
    unwanted:
      - { name: inverter, tone: 8.2 kHz, level: -30 dBFS }
      - { name: radio, band: 20 kHz .. 200 kHz, level: -40 dBFS }
    rate: 8 kHz
    ${sampling}
    input-filter: bridge side
    output-filter: { rc: { r: 10 kΩ, c: 4.7 nF } }
    limits: { image: -40 dBc, alias: -60 dBFS }
`;

const pictureFor = (text: string): PanelPicture => {
  const reading = read(text);
  assert.deepEqual(reading.problems, []);
  return pictureOf(judge(reading, createJudgeStore()), 'strain');
};

const itemsOf = (picture: PanelPicture): Item[] => picture.sections.flatMap(({ plots }) => plots.flatMap(({ items }) => items));

const itemOf = (picture: PanelPicture, id: string): Item => {
  const found = itemsOf(picture).find((item) => item.id === id);
  assert.ok(found !== undefined, `no item ${id}`);
  return found;
};

const upperOf = ({ shapes }: Item): Points => {
  const [area] = shapes;
  assert.ok(area?.kind === 'area');
  return area.upper;
};

const db = (ratio: number): number => 20 * Math.log10(Math.abs(ratio));
const sinc = (x: number): number => (x === 0 ? 1 : Math.sin(Math.PI * x) / (Math.PI * x));
const poleDb = (f: number, ohm: number, farad: number): number => -10 * Math.log10(1 + (2 * Math.PI * f * ohm * farad) ** 2);
const inputDb = (f: number): number => poleDb(f, 1e3, 22e-9);
const outputDb = (f: number): number => poleDb(f, 1e4, 4.7e-9);

describe('the picture of a relay channel', () => {
  const picture = pictureFor(strain('gate: 12 %'));

  it('shows what arrives, what leaves and the path, and survives the trip to the panel', () => {
    assert.deepEqual(
      picture.sections.map(({ id }) => id),
      ['sampling', 'leaving', 'path'],
    );
    assert.ok(isPicture(JSON.parse(JSON.stringify(picture))));
    const ids = itemsOf(picture).map(({ id }) => id);
    assert.equal(new Set(ids).size, ids.length);
  });

  it('draws a copy pale at the weight of the gate, solid behind the output filter', () => {
    // 100 Hz leaves as the lower side of copy 2 on 15.9 kHz; a natural gate weighs by |c₂| = 0.12·sinc(0.24), whatever the frequency.
    const before = -3 + inputDb(100) + db(0.12 * sinc(0.24));
    assert.ok(Math.abs(levelAt(upperOf(itemOf(picture, 'copy-0-2-lower-before')), 15_900) - before) < 0.03);
    const after = before + outputDb(15_900);
    assert.ok(Math.abs(levelAt(upperOf(itemOf(picture, 'copy-0-2-lower')), 15_900) - after) < 0.03);
    assert.deepEqual(itemOf(picture, 'copy-0-2-lower-before').place, { channel: 'strain', path: ['gate'] });
  });

  it('marks |c_k| at each multiple of the rate, on the spectrum of the gate', () => {
    for (const k of [0, 1, 2, 3]) {
      const [mark] = itemOf(picture, `weight-${k}`).shapes;
      assert.ok(mark?.kind === 'mark');
      assert.equal(mark.frequencyHz, k * 8000);
      assert.ok(Math.abs(mark.level - (-3 + db(0.12 * sinc(0.12 * k)))) < 1e-9);
    }
    assert.match(itemOf(picture, 'weight-1').words, /leaves the gate at −0\.21 dB against the wanted path\.$/);
  });

  it('draws a tone where it leaves, by input filter, weight and output filter', () => {
    // 8.2 kHz leaves on 200 Hz as copy −1.
    const [stem] = itemOf(picture, 'arrival-landing-0').shapes;
    assert.ok(stem?.kind === 'stem');
    assert.ok(Math.abs(stem.frequencyHz - 200) < 1e-9);
    assert.ok(Math.abs(stem.top - (-30 + inputDb(8200) + db(0.12 * sinc(0.12)) + outputDb(200))) < 1e-6);
    assert.equal(itemOf(picture, 'arrival-harm-0').role, 'harm');
  });

  it('links each filter to its own line, and the shared one to its definition too', () => {
    assert.deepEqual(itemOf(picture, 'stage-0').place, { channel: 'strain', path: ['input-filter', 0] });
    assert.deepEqual(itemOf(picture, 'stage-0').alsoAt, [{ channel: null, path: ['filters', 'bridge side', 0] }]);
    assert.deepEqual(itemOf(picture, 'stage-1').place, { channel: 'strain', path: ['output-filter', 0] });
  });

  it('puts the total at the own loss of the gate', () => {
    const [curve] = itemOf(picture, 'total').shapes;
    assert.ok(curve?.kind === 'curve');
    assert.ok(Math.abs(levelAt(curve.points, 0) - db(0.12)) < 1e-9);
  });

  it('gives a flat-top copy the hold at the output frequency', () => {
    const held = pictureFor(strain('hold: 50 %'));
    const before = -3 + inputDb(100) + db(0.5 * sinc(0.5 * (7900 / 8000)));
    assert.ok(Math.abs(levelAt(upperOf(itemOf(held, 'copy-0-1-lower-before')), 7900) - before) < 0.03);
    assert.equal(itemsOf(held).filter(({ id }) => id.startsWith('weight-')).length, 0);
  });

  it('draws the copies of a track and hold, which no common curve goes over', () => {
    // |d·sinc(k·d)·e^{−jπkd} + e·sinc(e·f_o·T)·e^{−jπe·f_o·T}·e^{−j2πkd}| with d = 0.3, k = 1, f_o = 7.9 kHz, in two real sums.
    const tracked = pictureFor(strain('gate: { track: 30 % }'));
    const [d, e, x] = [0.3, 0.7, 7900 / 8000];
    const [first, second] = [d * sinc(d), e * sinc(e * x)];
    const [a, b] = [Math.PI * d, Math.PI * e * x + 2 * Math.PI * d];
    const size = Math.hypot(first * Math.cos(a) + second * Math.cos(b), first * Math.sin(a) + second * Math.sin(b));
    const before = -3 + inputDb(100) + db(size);
    assert.ok(Math.abs(levelAt(upperOf(itemOf(tracked, 'copy-0-1-lower-before')), 7900) - before) < 0.05);
    assert.equal(itemsOf(tracked).filter(({ id }) => id.startsWith('envelope-hold')).length, 0);
  });
});
