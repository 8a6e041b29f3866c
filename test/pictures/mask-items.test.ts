/** Masks in the pictures: forbidden ground where the spec puts it, marks where the figures are, a link from each segment to its line. */
import assert from 'node:assert/strict';
import { levelAt } from '../../src/drawing/level-at';
import { createJudgeStore, judge, type Judgement } from '../../src/findings';
import { pictureOf } from '../../src/pictures';
import type { Item, PanelPicture, Shape } from '../../src/protocol/picture';
import { read } from '../../src/spec';

const camera = (limits: string): string => `bandkeep: 1
title: Camera over the fish pass
masks:
  video:
    - { band: 0 Hz .. 5.5 MHz, within: ± 0.3 dB }
    - { band: 8 MHz .. 13 MHz, below: -12 dB, to: -40 dB }
    - { band: 13 MHz .. 20 MHz, below: -40 dB, to: -46 dB, along: log }
channels:
  camera:
    direction: capture
    wanted: { band: 0 Hz .. 5.5 MHz, level: -3 dBFS }
    unwanted: anything
    rate: 27 MHz
    aperture: 10 ns
    filter: { family: butterworth, order: 3, corner: 7 MHz, gain: 6 dB }
    limits:
${limits}
`;

const judged = (text: string): Judgement => {
  const reading = read(text);
  assert.deepEqual(reading.problems, []);
  return judge(reading, createJudgeStore());
};

const itemOf = (picture: PanelPicture, id: string): Item => {
  const all = picture.sections.flatMap(({ plots }) => plots.flatMap(({ items }) => items));
  const found = all.find((item) => item.id === id);
  assert.ok(found !== undefined, `no item ${id} among ${all.map((one) => one.id).join(' ')}`);
  return found;
};

const forbidden = ({ shapes }: Item): Extract<Shape, { kind: 'forbidden' }>[] =>
  shapes.flatMap((shape) => (shape.kind === 'forbidden' ? [shape] : []));

/** Third-order Butterworth, 10·log10(1 + (f/7 MHz)^6), by its definition. */
const lossDb = (f: number): number => 10 * Math.log10(1 + (f / 7e6) ** 6);

describe('a response mask in the picture', () => {
  const judgement = judged(camera('      response: video'));
  const picture = pictureOf(judgement, 'camera');
  const figures = judgement.channels[0]?.figures;

  it('stands as far above the bounds as the gain at the reference', () => {
    const [above, below] = forbidden(itemOf(picture, 'magnitude-mask-response-0'));
    assert.deepEqual([above?.side, below?.side], ['above', 'below']);
    // The reference is 0 Hz, where the stage has its gain of 6 dB.
    assert.ok(Math.abs((above?.boundary.y[0] ?? 0) - 6.3) < 1e-9);
    assert.ok(Math.abs((below?.boundary.y[0] ?? 0) - 5.7) < 1e-9);
    assert.deepEqual([above?.boundary.x[0], above?.boundary.x.at(-1)], [0, 5.5e6]);
  });

  it('slopes in its own way along: over frequency, or over its logarithm', () => {
    const [linear] = forbidden(itemOf(picture, 'magnitude-mask-response-1'));
    assert.ok(linear && Math.abs(levelAt(linear.boundary, 10.5e6) - (6 - 26)) < 0.03);
    const [log] = forbidden(itemOf(picture, 'magnitude-mask-response-2'));
    const middle = Math.sqrt(13e6 * 20e6);
    assert.ok(log && Math.abs(levelAt(log.boundary, middle) - (6 - 43)) < 0.03);
  });

  it('is marked where it is passed furthest, with the words of the figures', () => {
    // The order is too low: at 8 MHz the loss is 5.1 dB where the mask asks for 12, at 20 MHz 27.4 of 46.
    const worst = figures?.masks.reduce((a, b) => (b.margin < a.margin ? b : a));
    const excess = Math.max(lossDbShort(8e6, 12), lossDbShort(13e6, 40), lossDbShort(20e6, 46));
    assert.ok(worst && Math.abs(-worst.margin - excess) < 2e-3, `${worst?.margin} ${excess}`);
    const mark = itemOf(picture, 'magnitude-mask-response-worst');
    assert.equal(mark.role, 'harm');
    const [shape] = mark.shapes;
    assert.ok(shape?.kind === 'mark' && shape.mark === 'over');
    assert.ok(Math.abs(shape.level - (6 - lossDb(shape.frequencyHz))) < 2e-3);
    assert.match(mark.words, /^response mask video is passed: .* outside at /);
  });

  it('leads from each segment to its line in the mask, and lights from there', () => {
    const segment = itemOf(picture, 'magnitude-mask-response-1');
    assert.deepEqual(segment.place, { channel: 'camera', path: ['limits', 'response', 'at', 1] });
    assert.deepEqual(segment.alsoAt, [{ channel: null, path: ['masks', 'video', 1] }]);
  });

  it('shows the curve that it speaks of where the aperture sets it apart from the total', () => {
    const [curve] = itemOf(picture, 'filters').shapes;
    assert.ok(curve?.kind === 'curve');
    assert.ok(Math.abs(levelAt(curve.points, 20e6) - (6 - lossDb(20e6))) < 0.05);
  });

  it('has room on the axis for all its bounds', () => {
    const plot = picture.sections.flatMap(({ plots }) => plots).find(({ id }) => id === 'magnitude');
    assert.ok(plot?.panes[0] && plot.panes[0].y.low <= -46 && plot.panes[0].x.highHz > 20e6);
    assert.deepEqual(
      plot.series.filter(({ id }) => id === 'mask-response').map(({ name }) => name),
      ['response mask video'],
    );
  });
});

/** How many dB the filter lacks of a loss. */
function lossDbShort(f: number, wantedDb: number): number {
  return wantedDb - lossDb(f);
}

describe('a through mask in the picture', () => {
  const text = camera('      through: { at: [{ band: 0 Hz .. 5 MHz, within: -1 dB .. 0.2 dB }], ref: R7 }');
  const picture = pictureOf(judged(text), 'camera');

  it('stands in the close-up, which counts from the reference itself', () => {
    const [above, below] = forbidden(itemOf(picture, 'close-up-mask-through-0'));
    assert.deepEqual([above?.boundary.y[0], below?.boundary.y[0]], [0.2, -1]);
  });

  it('leads to its line in the long form too', () => {
    assert.deepEqual(itemOf(picture, 'close-up-mask-through-0').place, {
      channel: 'camera',
      path: ['limits', 'through', 'at', 0],
    });
  });
});

describe('an output mask in the picture', () => {
  const text = `bandkeep: 1
title: Strain on the turbine shaft
channels:
  strain:
    direction: relay
    wanted: { band: 0 Hz .. 400 Hz, level: -3 dBFS }
    rate: 8 kHz
    gate: 60 %
    output-filter: { rc: { r: 10 kΩ, c: 4.7 nF } }
    limits:
      output:
        - { band: 6 kHz .. 20 kHz, below: -40 dBFS }
        - { band: 20 kHz .., below: -60 dBFS }
`;
  const judgement = judged(text);
  const picture = pictureOf(judgement, 'strain');

  it('stands at its own level, to the end of the axis where it is endless', () => {
    const [first] = forbidden(itemOf(picture, 'leaving-mask-output-0'));
    assert.deepEqual([first?.side, first?.boundary.y[0], first?.boundary.x[0]], ['above', -40, 6000]);
    const [second] = forbidden(itemOf(picture, 'leaving-mask-output-1'));
    const axis = picture.sections[0]?.plots[0]?.panes[0]?.x;
    assert.equal(second?.boundary.x.at(-1), axis?.highHz);
  });

  it('is told in the heading of its section, which leads to it', () => {
    // Of copy 1 the lower side leaves strongest: −3 + 20·log10(0.6·sinc(0.6)) − 10·log10(1 + (7.6/3.386)²) dBFS at 7.6 kHz.
    const x = 0.6 * Math.PI;
    const level = -3 + 20 * Math.log10(0.6 * (Math.sin(x) / x)) - 10 * Math.log10(1 + (2 * Math.PI * 7600 * 47e-6) ** 2);
    const section = picture.sections[0]!;
    assert.ok(section.answer.text.endsWith(`, output mask ${Number((level + 40).toFixed(1))} dB outside`), section.answer.text);
    assert.equal(section.answer.standing, 'over');
    assert.deepEqual(section.place, { channel: 'strain', path: ['limits', 'output'] });
  });
});
