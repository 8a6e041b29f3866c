/** Tables of levels as sources, and sources under a clock that varies, each against a plain grid in the test itself. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { analyse } from '../../src/analysis';
import type { Channel, Source } from '../../src/spec/channel';
import { band, butterworthForm, capture, plusMinus, rate, stage, wanted } from '../support/channel-builder';
import { falling, row, spectrum, withHarmonics } from '../support/source-builder';
import { assertWithin } from '../support/tolerance';

/** Gain of a Butterworth low-pass in dB, from its definition. */
const butterworthDb = (order: number, u: number): number => -10 * Math.log10(1 + u ** (2 * order));

const guarded = (parts: Partial<Channel>): Channel =>
  capture({ wanted: [wanted(0, 10e3)], rate: rate(50e3), stages: [stage(butterworthForm(4, 14e3))], ...parts });

const folded = (hz: number, rateHz: number): number => Math.abs(hz - rateHz * Math.round(hz / rateHz));

const powersDb = (levels: readonly number[]): number => 10 * Math.log10(levels.reduce((sum, db) => sum + 10 ** (db / 10), 0));

const aliasOf = (channel: Channel) => {
  const { alias } = analyse(channel);
  assert.ok(alias);
  return alias;
};

describe('a table of levels', () => {
  const points = [row(20e3, -70), row(100e3, -40), row(150e3, -45), row(1e6, -80)];
  const envelopeDb = (hz: number): number => {
    const at = points.findIndex((point, index) => hz >= point.frequencyHz && hz <= (points[index + 1]?.frequencyHz ?? NaN));
    const [low, high] = [points[at], points[at + 1]];
    assert.ok(low && high);
    return (
      low.levelDb + ((high.levelDb - low.levelDb) * Math.log(hz / low.frequencyHz)) / Math.log(high.frequencyHz / low.frequencyHz)
    );
  };

  it('is an envelope, whose worst landing may lie between its rows', () => {
    // A gentle filter, so that the rise of the envelope to 100 kHz beats the filter's fall: the landing from just beside a row wins.
    const stages = [stage(butterworthForm(1, 30e3))];
    const channel = guarded({ stages, unwanted: [spectrum(points)] });
    let [worst, from] = [-Infinity, 0];
    for (let hz = 20e3; hz <= 1e6; hz += 5) {
      if (folded(hz, 50e3) > 10e3) continue;
      const db = envelopeDb(hz) + butterworthDb(1, hz / 30e3);
      if (db > worst) [worst, from] = [db, hz];
    }
    const alias = aliasOf(channel);
    assertWithin(alias.level ?? NaN, worst, 0.001);
    assertWithin(alias.frequency ?? NaN, from, 10);
    assert.equal(alias.frequency, 100e3);
  });

  it('has its worst where the slopes of envelope and path balance, which is no row', () => {
    // From 20 to 200 kHz +30 dB a decade; Butterworth of order 2 at 60 kHz: 30 = 40·u⁴/(1 + u⁴), so u⁴ = 3.
    const rising = [row(20e3, -70), row(200e3, -40)];
    const balanceHz = 60e3 * 3 ** 0.25;
    const channel = capture({
      wanted: [wanted(0, 10e3)],
      protect: [{ lowHz: 0, highHz: 25e3 }],
      rate: rate(50e3),
      stages: [stage(butterworthForm(2, 60e3))],
      unwanted: [spectrum(rising)],
    });
    const alias = aliasOf(channel);
    const expected = -70 + 30 * Math.log10(balanceHz / 20e3) - 10 * Math.log10(4);
    assertWithin(alias.level ?? NaN, expected, 0.001);
    assertWithin(alias.frequency ?? NaN, balanceHz, 0.01 * balanceHz);
  });

  it('gives an envelope of any shape the maximum of a fine grid', () => {
    const shapes = fc.array(fc.double({ min: -90, max: -20, noNaN: true }), { minLength: 3, maxLength: 8 });
    fc.assert(
      fc.property(shapes, (levels) => {
        const table = levels.map((levelDb, index) => row(15e3 * 1.7 ** index, levelDb));
        let worst = -Infinity;
        for (let index = 1; index < table.length; index += 1) {
          const [a, b] = [table[index - 1], table[index]];
          assert.ok(a && b);
          for (let step = 0; step <= 2000; step += 1) {
            const share = step / 2000;
            const hz = a.frequencyHz * (b.frequencyHz / a.frequencyHz) ** share;
            if (folded(hz, 50e3) > 10e3) continue;
            worst = Math.max(worst, a.levelDb + share * (b.levelDb - a.levelDb) + butterworthDb(4, hz / 14e3));
          }
        }
        const { alias } = analyse(guarded({ unwanted: [spectrum(table)] }));
        if (worst === -Infinity) return;
        // Above the grid by no more than what a step of it can miss, never below it.
        const over = (alias?.level ?? NaN) - worst;
        assert.ok(over >= -1e-6 && over < 0.15, String(over));
      }),
      { seed: 7, numRuns: 60 },
    );
  });

  it('of lines has a tone in each row, and nothing between', () => {
    const table = [row(25e3, -10), row(48e3, -70), row(52e3, -60), row(60e3, -30), row(75e3, -5)];
    const figures = analyse(guarded({ stages: [], unwanted: [spectrum(table, 'lines')] }));
    assert.deepEqual([figures.alias?.frequency, figures.alias?.level], [60e3, -30]);
    assertWithin(figures.aliasSum ?? NaN, powersDb([-70, -60, -30]), 1e-9);
  });

  it('counts in headroom line by line, and an envelope once at its worst frequency', () => {
    const table = [row(60e3, -20), row(600e3, -20)];
    const parts = { wanted: [wanted(0, 10e3, -6)], stages: [stage(butterworthForm(1, 60e3))] };
    const half = 10 ** (-20 / 20) / Math.SQRT2;
    const far = 10 ** (-20 / 20) / Math.sqrt(101);
    const own = 10 ** (-6 / 20);
    assertWithin(
      analyse(guarded({ ...parts, unwanted: [spectrum(table)] })).headroom ?? NaN,
      -20 * Math.log10(own + half),
      0.001,
    );
    assertWithin(
      analyse(guarded({ ...parts, unwanted: [spectrum(table, 'lines')] })).headroom ?? NaN,
      -20 * Math.log10(own + half + far),
      1e-9,
    );
  });

  it('that reaches into the wanted band overlaps it there', () => {
    const overlaps = (lines: 'envelope' | 'lines') =>
      analyse(
        guarded({ wanted: [wanted(5e3, 10e3)], unwanted: [spectrum([row(6e3, -50), row(7e3, -50), row(90e3, -50)], lines)] }),
      ).overlaps;
    assert.deepEqual(overlaps('envelope'), [{ index: 0, harmonic: 1, lowHz: 6e3, highHz: 10e3 }]);
    assert.deepEqual(overlaps('lines'), [{ index: 0, harmonic: 1, lowHz: 6e3, highHz: 6e3 }]);
  });

  it('of many thousand rows is searched in few steps', () => {
    const many = Array.from({ length: 20_000 }, (_, index) => row(20e3 * 1.0005 ** index, -60 - (index % 7)));
    const { alias, evaluations } = analyse(guarded({ unwanted: [spectrum(many)] }));
    const best = many
      .filter(({ frequencyHz }) => folded(frequencyHz, 50e3) <= 10e3)
      .map(({ frequencyHz, levelDb }) => levelDb + butterworthDb(4, frequencyHz / 14e3));
    assert.ok((alias?.level ?? NaN) >= Math.max(...best) - 1e-6);
    assert.ok(evaluations < 5000, String(evaluations));
  });
});

describe('a source under a clock with a tolerance', () => {
  const share = 0.0005;
  const rates = Array.from({ length: 41 }, (_, index) => 50e3 * (1 - share + (2 * share * index) / 40));
  const sincDb = (hz: number, seconds: number): number => {
    const x = Math.PI * hz * seconds;
    return x === 0 ? 0 : 20 * Math.log10(Math.abs(Math.sin(x) / x));
  };
  /** The strongest landing of levels over frequency, by a grid over rates and frequencies: the aperture lasts a share of each period. */
  const byGrid = (levelAt: (hz: number) => number, lowHz: number, highHz: number, width: number): number => {
    let worst = -Infinity;
    for (const rateHz of rates) {
      for (let hz = lowHz; hz <= highHz; hz += 4) {
        if (folded(hz, rateHz) > 10e3) continue;
        worst = Math.max(worst, levelAt(hz) + butterworthDb(2, hz / 14e3) + sincDb(hz, width / rateHz));
      }
    }
    return worst;
  };
  const channel = (unwanted: Source, width: number): Channel =>
    guarded({
      rate: rate(50e3, { tolerance: plusMinus(share) }),
      pulse: { shape: 'rectangle', width: { share: width } },
      stages: [stage(butterworthForm(2, 14e3))],
      unwanted: [unwanted],
    });

  for (const width of [0.4, 1]) {
    it(`has the envelope of a table moved along, with an aperture of ${width} of the period`, () => {
      const points = [row(42e3, -60), row(70e3, -30), row(180e3, -32)];
      const levelAt = (hz: number): number =>
        hz <= 70e3 ? -60 + (30 * Math.log(hz / 42e3)) / Math.log(70 / 42) : -30 - (2 * Math.log(hz / 70e3)) / Math.log(180 / 70);
      const level = aliasOf(channel(spectrum(points), width)).level ?? NaN;
      const grid = byGrid(levelAt, 42e3, 180e3, width);
      // In periods the table and the filter each move by the clock's share at their own worst: 59 and 17 dB an e-fold, ± 0.0005.
      assert.ok(level >= grid - 1e-6 && level <= grid + 0.1, `${level} against ${grid}`);
    });

    it(`has the harmonics of a band moved along, with an aperture of ${width} of the period`, () => {
      const source = withHarmonics(band(31e3, 32e3, -20), falling(4, { slopeDbPerDecade: -6 }));
      const expected = [1, 2, 3, 4].map((m) => byGrid(() => -20 - 6 * Math.log10(m), m * 31e3, m * 32e3, width));
      const level = aliasOf(channel(source, width)).level ?? NaN;
      const grid = Math.max(...expected);
      assert.ok(level >= grid - 1e-6 && level <= grid + 0.1, `${level} against ${grid}`);
    });
  }

  it('meets each line where it stands, at any rate', () => {
    const table = [row(60.01e3, -30), row(64.9e3, -10)];
    const figure = aliasOf(channel(spectrum(table, 'lines'), 0.4));
    // 60.01 kHz lands on 10 kHz once the rate is above 50.01 kHz; the aperture is shortest, and so weakest, at the highest rate.
    assert.equal(figure.frequency, 60.01e3);
    assertWithin(figure.level ?? NaN, -30 + butterworthDb(2, 60.01 / 14) + sincDb(60.01e3, 0.4 / (50e3 * (1 + share))), 0.001);
    assert.equal(figure.nominal, null);
  });
});
