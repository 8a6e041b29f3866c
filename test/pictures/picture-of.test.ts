/** Tests of whole pictures: every number agrees with the figures, every item has words and a line that exists. */
import assert from 'node:assert/strict';
import { levelAt } from '../../src/drawing/level-at';
import { createJudgeStore, judge } from '../../src/findings';
import type { Judgement } from '../../src/findings';
import { pictureOf } from '../../src/pictures';
import { mostPoints } from '../../src/pictures/sample-curve';
import type { Item, PanelPicture, Points } from '../../src/protocol/picture';
import { isPicture } from '../../src/protocol/picture-guard';
import { exists, read } from '../../src/spec';
import { exampleText } from '../support/examples';

/** A channel with one of everything that a picture must cope with. */
const odd = `bandkeep: 1
channels:
  undersampled:
    direction: capture
    wanted: { band: 70 MHz ± 4 MHz, level: -6 dBFS }
    unwanted:
      - anything
      - { name: radio, tone: 88 MHz, level: -20 dBFS }
    rate: 32.5 MHz
    filter: { family: chebyshev, order: 3, ripple: 0.5 dB, corner: 90 MHz }
    limits: { alias: -60 dBc, flatness: 3 dB }
  bare:
    direction: capture
    wanted: { band: 0 Hz .. 1 kHz }
    rate: 10 kHz
  staircase:
    direction: generate
    wanted: [{ band: 1 kHz .. 2 kHz }, { band: 3 kHz .. 4 kHz, level: -20 dBFS }]
    rate: 10 kHz
    limits: { image: -40 dBFS }
  upper-copy:
    direction: generate
    wanted: { band: 11 kHz .. 14 kHz }
    rate: 10 kHz
    hold: 20 %
    filter: { bandwidth: 20 kHz }
`;

/** Relay and capture channels at the edges of what there is. */
const relays = `bandkeep: 1
masks:
  far: [{ band: 50 kHz .., below: -40 dB }]
channels:
  tracked:
    direction: relay
    wanted: [{ name: low, band: 0 Hz .. 400 Hz }, { name: high, band: 1 kHz .. 1.5 kHz, level: -6 dBFS }]
    unwanted: [{ tone: 8.2 kHz ± 3 %, level: -30 dBFS, harmonics: 5 }, { name: ripple, tone: 100 Hz, level: -70 dBFS, enters: sampler }]
    levels-at: sampler
    rate: 8 kHz ± 1 %
    gate: { track: 30 % }
    input-filter: { bandwidth: 3 kHz }
    limits: { image: -30 dBFS, alias: -60 dBc, response: far, output: [{ band: 2 kHz .., below: -20 dBFS }] }
  split:
    direction: relay
    wanted: { band: 100 Hz .. 400 Hz }
    rate: 8 kHz
    hold: { shape: split, width: 50 % }
  bare-relay:
    direction: relay
    wanted: { band: 0 Hz .. 400 Hz }
    unwanted: anything
    rate: 8 kHz
  summed:
    direction: capture
    wanted: { band: 5 Hz .. 1 kHz }
    unwanted: [{ name: hum, tone: 50 Hz, level: -80 dBFS, harmonics: { to: 999, odd: true } }, { band: 7 kHz .., level: -90 dBFS, harmonics: 3 }]
    rate: 8 kHz
    aperture: { shape: exponential, width: 50 %, decay: 10 % }
    filter: { second-order: { frequency: 2 kHz, q: 5, kind: notch } }
    limits: { alias: { sum: -60 dBFS }, delay: 1 ms, through: [{ band: 0 Hz .. 1 kHz, within: -3 dB .. 1 dB }] }
  high-zone:
    direction: relay
    wanted: { band: 9 kHz .. 11 kHz }
    rate: 8 kHz
    gate: 10 %
    output-filter: { family: butterworth, kind: bandpass, order: 2, corners: 8 kHz .. 12 kHz }
    limits: { image: -10 dBc }
`;

const judged = (text: string): Judgement => judge(read(text), createJudgeStore());
const cases: readonly (readonly [string, string])[] = [
  [exampleText('gate-bearing'), 'bearing-x'],
  [exampleText('gate-bearing'), 'bearing-y'],
  [exampleText('gate-bearing-broken'), 'bearing-x'],
  [exampleText('fish-sounder'), 'sounder-drive'],
  [exampleText('echo-receiver'), 'ice-echo'],
  [exampleText('strain-link'), 'strain-link'],
  [exampleText('strain-link'), 'thrust-link'],
  ...['undersampled', 'bare', 'staircase', 'upper-copy'].map((name) => [odd, name] as const),
  ...['tracked', 'split', 'bare-relay', 'summed', 'high-zone'].map((name) => [relays, name] as const),
];

const itemsOf = (picture: PanelPicture): readonly Item[] =>
  picture.sections.flatMap(({ plots }) => plots.flatMap(({ items }) => items));
const itemOf = (picture: PanelPicture, id: string): Item => {
  const found = itemsOf(picture).find((item) => item.id === id);
  assert.ok(found !== undefined, `no item ${id}`);
  return found;
};
const curveOf = (item: Item): Points => {
  const shape = item.shapes.find(({ kind }) => kind === 'curve');
  assert.ok(shape?.kind === 'curve');
  return shape.points;
};

for (const [text, name] of cases) {
  describe(`the picture of ${name}`, () => {
    const judgement = judged(text);
    const picture = pictureOf(judgement, name);
    const items = itemsOf(picture);

    it('passes the guard after its way through JSON, which has no infinities', () => {
      assert.ok(isPicture(JSON.parse(JSON.stringify(picture))));
      assert.deepEqual(JSON.parse(JSON.stringify(picture)), picture);
    });

    it('has an id of its own for every item, and joins only such', () => {
      const ids = items.map(({ id }) => id);
      assert.deepEqual(
        ids.filter((id, index) => ids.indexOf(id) !== index),
        [],
      );
      assert.deepEqual(
        items.flatMap(({ joins }) => joins).filter((id) => !ids.includes(id)),
        [],
      );
    });

    it('says every item in a sentence', () => {
      for (const item of items) assert.match(item.words, /^\S.*[.!?]$/, item.id);
      assert.doesNotMatch(JSON.stringify(picture), /NaN|undefined|Infinity|-\d+(\.\d+)? dB/);
    });

    it('leads every item that has a place to a line that exists', () => {
      const places = items.flatMap(({ place, alsoAt }) => [...(place === null ? [] : [place]), ...(alsoAt ?? [])]);
      assert.ok(places.length > 0);
      assert.deepEqual(
        places.filter((place) => !exists(judgement.reading, place)),
        [],
      );
    });

    it('lists every series of its items once', () => {
      for (const plot of picture.sections.flatMap(({ plots }) => plots)) {
        const listed = plot.series.map(({ id }) => id);
        assert.deepEqual([...new Set(plot.items.map(({ series }) => series))].sort(), [...listed].sort());
      }
    });

    it('has few enough points on every curve, from left to right', () => {
      for (const item of items) {
        for (const shape of item.shapes) {
          const points = shape.kind === 'curve' ? shape.points : shape.kind === 'area' ? shape.upper : null;
          if (points === null) continue;
          assert.ok(points.x.length <= mostPoints, item.id);
          assert.ok(
            points.x.every((x, index) => index === 0 || x >= (points.x[index - 1] ?? 0)),
            item.id,
          );
        }
      }
    });

    it('fills its tables to the last cell', () => {
      for (const { table, items: own } of picture.sections.flatMap(({ plots }) => plots)) {
        assert.ok(
          table.rows.every((row) => row.cells.length === table.columns.length),
          table.caption,
        );
        assert.deepEqual(
          table.rows.filter(({ item }) => item !== null && !own.some(({ id }) => id === item)),
          [],
        );
      }
    });
  });
}

describe('the picture of a capture channel', () => {
  const judgement = judged(exampleText('gate-bearing-broken'));
  const picture = pictureOf(judgement, 'bearing-x');
  const figures = judgement.channels[0]!.figures!;
  const hash = figures.aliases.find(({ source }) => source === 'drive hash')!;

  it('puts the worst landing on the landing curve, at the level of the figures', () => {
    const landing = levelAt(curveOf(itemOf(picture, 'landing-1')), hash.lands!);
    // The curve is drawn at the nominal rate; the clock's 25 ppm move a level by far less than this.
    assert.ok(Math.abs(landing - hash.level!) < 0.05, `${landing} ${hash.level}`);
    const mark = itemOf(picture, 'worst-1').shapes[0]!;
    assert.deepEqual(mark, { kind: 'mark', frequencyHz: hash.lands, level: hash.level, mark: 'over' });
  });

  it('puts the source behind the path at the same level where it arrives', () => {
    const arrives = levelAt(curveOf(itemOf(picture, 'arrives-1')), hash.frequency!);
    assert.ok(Math.abs(arrives - hash.level!) < 0.05);
  });

  it('joins the harmful stretch with where it lands by a ribbon of harm', () => {
    const harm = itemsOf(picture).filter((item) => item.role === 'harm' && item.shapes[0]?.kind === 'ribbon');
    assert.equal(harm.length, 1);
    const [ribbon] = harm[0]!.shapes;
    assert.ok(ribbon?.kind === 'ribbon');
    assert.ok(Math.abs(ribbon.lowHz - 41_200) < 1e-6 && ribbon.inverted);
    assert.ok(Math.abs(ribbon.landsHighHz - 10_000) < 1e-6);
    assert.deepEqual(ribbon.landsLowHz, 51_200 - ribbon.highHz);
    assert.match(harm[0]!.words, /first fold, inverted\. At most .* over the limit\.$/);
  });

  it('lights a source with its ribbon and its landing, and the other way round', () => {
    assert.ok(itemOf(picture, 'source-1').joins.includes('landing-1'));
    assert.ok(itemOf(picture, 'landing-1').joins.includes('source-1'));
    const ribbon = itemsOf(picture).find((item) => item.id.startsWith('ribbon-1-'))!;
    assert.ok(itemOf(picture, 'source-1').joins.includes(ribbon.id));
  });

  it('answers each section in one line and the whole in the heading', () => {
    assert.deepEqual(
      picture.sections.map(({ id }) => id),
      ['sampling', 'path'],
    );
    assert.match(picture.sections[0]!.answer.text, /^worst alias −\d+(\.\d)? dBFS at 10 kHz, \d+(\.\d+)? dB over$/);
    assert.match(picture.sections[1]!.answer.text, /^half power 12\.\d+ kHz, flat to 0\.\d+ dB of 0\.8 dB$/);
    assert.equal(picture.heading.summary, 'capture · 51.2 kHz · 16 bits');
    assert.deepEqual(picture.heading.verdict.standing, 'over');
  });

  it('draws the limit where the spec has it, over the protected range', () => {
    assert.deepEqual(curveOf(itemOf(picture, 'limit-alias')), { x: [5, 10_000], y: [-96, -96] });
  });

  it('draws all noise as the one level of the figures', () => {
    assert.deepEqual(new Set(curveOf(itemOf(picture, 'noise')).y), new Set([figures.noise.total]));
  });

  it('shows the close-up through the largest departure, in the envelope of the tolerance', () => {
    const flatness = figures.limits.find(({ limit }) => limit === 'flatness')!;
    const smallest = curveOf(itemOf(picture, 'close-up-envelope'));
    assert.ok(Math.abs(levelAt(smallest, flatness.where!.frequency) + flatness.value!) < 0.005);
    const nominal = levelAt(curveOf(itemOf(picture, 'close-up-total')), 10_000);
    assert.ok(Math.abs(nominal + flatness.nominal!) < 0.005);
    assert.ok(Math.abs(levelAt(curveOf(itemOf(picture, 'close-up-total')), figures.reference)) < 1e-9);
  });

  it('lights a stage by the filter definition that it comes from', () => {
    const stage = itemOf(picture, 'stage-1');
    assert.deepEqual(stage.place, { channel: 'bearing-x', path: ['filter', 1] });
    assert.deepEqual(stage.alsoAt, [{ channel: null, path: ['filters', 'pick-up guard', 1] }]);
  });
});

describe('the picture of a generate channel', () => {
  const judgement = judged(exampleText('fish-sounder'));
  const picture = pictureOf(judgement, 'sounder-drive');
  const figures = judgement.channels[0]!.figures!;

  it('draws every copy twice, pale as the hold leaves it and solid as the path leaves it', () => {
    const before = itemOf(picture, 'copy-0-1-lower-before');
    const after = itemOf(picture, 'copy-0-1-lower');
    assert.deepEqual(
      [before.shapes[0]?.kind === 'area' && before.shapes[0].tone, after.shapes[0]?.kind === 'area' && after.shapes[0].tone],
      ['pale', 'solid'],
    );
    assert.ok(before.joins.includes(after.id) && after.joins.includes(before.id));
  });

  it('gives a copy before the path the level of a zero-order hold', () => {
    // The wanted level · |sinc(440/500)|: the closed form of the hold at the output frequency.
    const x = (Math.PI * 440) / 500;
    const exact = figures.wanted[0]!.level + 20 * Math.log10(Math.sin(x) / x);
    const [area] = itemOf(picture, 'copy-0-1-lower-before').shapes;
    assert.ok(area?.kind === 'area');
    assert.ok(Math.abs(levelAt(area.upper, 440e3) - exact) < 0.05);
    assert.equal(area.upper.from?.[area.upper.x.indexOf(440e3)], 60e3);
  });

  it('puts the worst image on its copy', () => {
    const image = figures.image!;
    const solid = levelAt(curveOf(itemOf(picture, 'copy-0-1-lower')), image.frequency);
    assert.ok(Math.abs(solid - image.level) < 0.2, `${solid} ${image.level}`);
  });

  it('draws a limit in dBc as far below the wanted output of the same tone', () => {
    const image = figures.image!;
    const limit = levelAt(curveOf(itemOf(picture, 'limit-image')), image.frequency);
    const margin = limit - levelAt(curveOf(itemOf(picture, 'copy-0-1-lower')), image.frequency);
    assert.ok(Math.abs(margin - image.margin!) < 0.3, `${margin} ${image.margin}`);
  });
});

describe('a picture', () => {
  it('is refused for a channel that is not whole', () => {
    const judgement = judged('bandkeep: 1\nchannels:\n  a: { direction: capture }\n');
    assert.throws(() => pictureOf(judgement, 'a'), RangeError);
    assert.throws(() => pictureOf(judgement, 'b'), RangeError);
  });

  it('is the same for the same text', () => {
    assert.deepEqual(pictureOf(judged(odd), 'undersampled'), pictureOf(judged(odd), 'undersampled'));
  });
});
