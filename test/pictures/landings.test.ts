/** Tests of where sources land, against folding done by hand. */
import assert from 'node:assert/strict';
import { levelAt } from '../../src/drawing/level-at';
import { cutAtLimit, foldStretches, landsAt } from '../../src/pictures/fold-stretches';
import { landingAt, landingCurves } from '../../src/pictures/landings';
import type { Arriving } from '../../src/pictures/landings';
import { channelPath } from '../../src/analysis';
import { butterworthForm, capture, rate, stage, wanted } from '../support/channel-builder';

/** Four poles at 14 kHz: −10·log10(1 + (f/14 kHz)^8) dB, the family's definition. */
const channel = capture({ wanted: [wanted(5, 10_000)], rate: rate(51_200), stages: [stage(butterworthForm(4, 14_000))] });
const guardDb = (f: number): number => -10 * Math.log10(1 + (f / 14_000) ** 8);
const hash: Arriving = {
  ranges: [{ low: 40_000, high: 3e6 }],
  levelDb: -55,
  response: channelPath(channel).total,
  rateHz: 51_200,
  behind: null,
};

describe('landings', () => {
  it('takes the strongest of all folds', () => {
    // 41.2 kHz = 51.2 − 10 lands on 10 kHz, as do 61.2 kHz, 92.4 kHz and so on; the lowest is the strongest.
    const landed = landingAt(hash, 10_000);
    assert.equal(landed?.fromHz, 41_200);
    assert.ok(Math.abs(landed.levelDb - (-55 + guardDb(41_200))) < 1e-6);
  });

  it('finds nothing where no fold of the source ends', () => {
    const narrow = { ...hash, ranges: [{ low: 41_000, high: 42_000 }] };
    assert.equal(landingAt(narrow, 5000), null);
    assert.equal(landingAt(narrow, 9500)?.fromHz, 41_700);
  });

  it('leaves a source that has no end once all further folds are weaker', () => {
    const endless = { ...hash, ranges: [{ low: 40_000, high: Infinity }] };
    assert.equal(landingAt(endless, 10_000)?.fromHz, 41_200);
  });

  it('weighs each copy of a relay by its own weight, and by the output filter where it leaves', () => {
    // A gate of 40 % and one pole at 20 kHz, by hand: |c_k| = 0.4·|sinc(0.4·k)|.
    const logWeight = (copy: number): number => {
      const x = Math.PI * 0.4 * copy;
      return Math.log(0.4 * (copy === 0 ? 1 : Math.abs(Math.sin(x) / x)));
    };
    const logPole = (f: number): number => -0.5 * Math.log(1 + (f / 20_000) ** 2);
    const relayed: Arriving = {
      ...hash,
      behind: { logAt: (copy, x) => logWeight(copy) + logPole(x), boundAt: (_, x) => Math.log(0.4) + logPole(x) },
    };
    const expected = (f: number, copy: number, x: number): number =>
      -55 + guardDb(f) + (20 / Math.LN10) * (logWeight(copy) + logPole(x));
    // 41.2 kHz leaves on 10 kHz as copy 1; it is stronger than 61.2 kHz as copy −1 and all others.
    assert.equal(landingAt(relayed, 10_000)?.fromHz, 41_200);
    assert.ok(Math.abs((landingAt(relayed, 10_000)?.levelDb ?? 0) - expected(41_200, 1, 10_000)) < 1e-6);
    const [strongest] = foldStretches(relayed, [{ low: 9000, high: 10_000 }]);
    assert.ok(Math.abs((strongest?.strongestDb ?? 0) - expected(41_200, 1, 10_000)) < 1e-6);
  });

  it('draws the landing as curves that break where the source ends', () => {
    const curves = landingCurves(hash, { through: [10_000], floor: -160, tolerance: 0.05 });
    // The source begins at 40 kHz, which lands on 11.2 kHz: above it the next fold is the strongest.
    assert.ok(curves.some((points) => Math.abs((points.x[points.x.length - 1] ?? 0) - 11_200) < 1));
    const first = curves.find((points) => points.x[0] === 0)!;
    assert.ok(Math.abs(levelAt(first, 7000) - (-55 + guardDb(44_200))) < 0.06);
    assert.equal(first.from?.length, first.x.length);
  });
});

describe('fold stretches', () => {
  const stretches = foldStretches(hash, [{ low: 0, high: 10_000 }]);

  it('cuts a source at the folds of the protected range, the strongest first', () => {
    assert.deepEqual(
      [stretches[0]?.lowHz, stretches[0]?.highHz, stretches[0]?.fold, stretches[0]?.inverted],
      [41_200, 51_200, 1, true],
    );
    assert.deepEqual([stretches[1]?.lowHz, stretches[1]?.highHz, stretches[1]?.inverted], [51_200, 61_200, false]);
    assert.ok(
      stretches.every(({ strongestDb }, index) => index === 0 || strongestDb <= (stretches[index - 1]?.strongestDb ?? 0)),
    );
  });

  it('knows where each frequency of a stretch lands', () => {
    assert.equal(landsAt(stretches[0]!, 41_200, 51_200), 10_000);
    assert.equal(landsAt(stretches[1]!, 61_200, 51_200), 10_000);
  });

  it('cuts a stretch where its level crosses the limit', () => {
    // −55 + guard(f) = −96 at f = 14 kHz · (10^4.1 − 1)^(1/8).
    const crossing = 14_000 * (10 ** 4.1 - 1) ** (1 / 8);
    const parts = cutAtLimit(hash, stretches[0]!, -96);
    assert.deepEqual(
      parts.map(({ over }) => over),
      [true, false],
    );
    assert.ok(Math.abs((parts[0]?.part.highHz ?? 0) - crossing) < 0.01);
  });
});
