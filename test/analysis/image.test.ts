/** Images: the hold at the output frequency, copies to infinity, zones, and parts that cancel between a copy and its own tone. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import {
  butterworthForm,
  capture,
  chebyshevForm,
  generate,
  limit,
  plusMinus,
  rate,
  rectangleShare,
  stage,
  wanted,
} from '../support/channel-builder';
import { assertWithin, provedGapDb } from '../support/tolerance';

/** |sinc| in dB, from its definition. */
function sincDb(x: number): number {
  return 20 * Math.log10(Math.abs(Math.sin(Math.PI * x) / (Math.PI * x)));
}

describe('images', () => {
  it('of a zero-order hold are weighed at the output frequency', () => {
    const { image } = analyse(generate({ wanted: [wanted(0, 20e3)], rate: rate(48e3), limits: [limit('image', -10)] }));
    assert.deepEqual([image?.copy, image?.side, image?.frequency, image?.from], [1, 'lower', 28e3, 20e3]);
    assertWithin(image?.relative ?? NaN, sincDb(28 / 48) - sincDb(20 / 48), provedGapDb);
    assertWithin(image?.level ?? NaN, sincDb(28 / 48), 2 * provedGapDb);
  });

  it('are listed for each copy and side up to the eighth', () => {
    const { images } = analyse(generate({ wanted: [wanted(1e3, 20e3)], rate: rate(48e3) }));
    assert.deepEqual(
      images.map((image) => `${String(image.copy)} ${image.side}`),
      Array.from({ length: 8 }, (_, index) => [`${String(index + 1)} lower`, `${String(index + 1)} upper`]).flat(),
    );
  });

  it('of a very narrow pulse are nearly as strong as the tone itself', () => {
    const narrow = rectangleShare(0.001);
    const channel = generate({ wanted: [wanted(45, 49)], rate: rate(100), pulse: narrow, limits: [limit('image', 1)] });
    assertWithin(analyse(channel).image?.relative ?? NaN, sincDb(0.051 * 0.01) - sincDb(0.049 * 0.01), provedGapDb);
  });

  it('of a band wanted in zone 2 include the baseband', () => {
    const channel = generate({
      wanted: [wanted(60e3, 90e3)],
      rate: rate(100e3),
      pulse: rectangleShare(0.5),
      limits: [limit('image', 0)],
    });
    const figures = analyse(channel);
    assert.ok(figures.images.every((image) => !(image.copy === 1 && image.side === 'lower')));
    assert.deepEqual(
      [figures.image?.copy, figures.image?.side, figures.image?.from, figures.image?.frequency],
      [0, 'baseband', 90e3, 10e3],
    );
    assertWithin(figures.image?.relative ?? NaN, sincDb(0.05) - sincDb(0.45), provedGapDb);
  });

  it('of a half-width pulse start 6.02 dB down', () => {
    const channel = generate({
      wanted: [wanted(0, 10e3)],
      rate: rate(100e3),
      pulse: rectangleShare(0.5),
      limits: [limit('image', -10, { unit: 'dBFS' })],
    });
    assertWithin(analyse(channel).image?.level ?? NaN, 20 * Math.log10(0.5) + sincDb(0.45), provedGapDb);
  });

  it('take the level of their own wanted band', () => {
    const channel = generate({
      wanted: [wanted(1e3, 5e3, -30), wanted(30e3, 31e3, -6)],
      rate: rate(100e3),
      limits: [limit('image', -10, { unit: 'dBFS' })],
    });
    assertWithin(analyse(channel).image?.level ?? NaN, -6 + sincDb(0.69), provedGapDb);
  });

  it('do not change against their own tone with the gain of a stage', () => {
    const parts = { wanted: [wanted(1e3, 20e3)], rate: rate(96e3), limits: [limit('image', -10)] };
    const plain = generate({ ...parts, stages: [stage(butterworthForm(3, 30e3))] });
    const loose = generate({ ...parts, stages: [stage(butterworthForm(3, 30e3), { gainTolerance: plusMinus(0.1) })] });
    assertWithin(analyse(loose).image?.relative ?? NaN, analyse(plain).image?.relative ?? NaN, 2 * provedGapDb);
  });

  it('see a part at both frequencies at once, so that what cancels is not counted twice', () => {
    const corner = 30e3;
    const channel = generate({
      wanted: [wanted(1e3, 20e3)],
      rate: rate(96e3),
      stages: [stage(butterworthForm(4, corner), { label: 'filter', cornerTolerance: plusMinus(0.05) })],
      limits: [limit('image', -10)],
    });
    const { image } = analyse(channel);
    const gain = (f: number): number => -10 * Math.log10(1 + (f / corner / 1.05) ** 8) + sincDb(f / 96e3);
    assert.deepEqual([image?.frequency, image?.worstAt], [76e3, { 'filter, corner': 0.05 }]);
    assertWithin(image?.relative ?? NaN, gain(76e3) - gain(20e3), 2 * provedGapDb);
    assertWithin(image?.level ?? NaN, gain(76e3), 2 * provedGapDb);
  });

  it('are worst inside a tolerance where a ripple makes them so', () => {
    const channel = generate({
      wanted: [wanted(1e3, 20e3)],
      rate: rate(96e3),
      stages: [stage(chebyshevForm(7, 22e3, 3, 'ripple'), { label: 'filter', cornerTolerance: plusMinus(0.12) })],
      limits: [limit('image', -10)],
    });
    const { image } = analyse(channel);
    const factor = 1 + (image?.worstAt?.['filter, corner'] ?? 0);
    const eps2 = 10 ** 0.3 - 1;
    const chebyshevDb = (u: number): number =>
      -10 * Math.log10(1 + eps2 * (u <= 1 ? Math.cos(7 * Math.acos(u)) : Math.cosh(7 * Math.acosh(u))) ** 2);
    const at = (c: number): number => {
      const ratio = (w: number): number =>
        chebyshevDb((96e3 - w) / 22e3 / c) - chebyshevDb(w / 22e3 / c) + sincDb((96e3 - w) / 96e3) - sincDb(w / 96e3);
      return Math.max(...Array.from({ length: 1901 }, (_, index) => ratio(1e3 + 10 * index)));
    };
    assertWithin(at(factor), image?.relative ?? NaN, 0.002);
    for (const other of [0.88, 0.92, 0.96, 1, 1.04, 1.08, 1.12]) assert.ok(at(other) <= (image?.relative ?? NaN) + 1e-9);
  });

  it('do not exist in capture', () => {
    assert.deepEqual(analyse(capture({ wanted: [wanted(0, 20e3)], rate: rate(48e3) })).images, []);
  });
});
