/** Sources in full: harmonics and places of entrance, and their sum, each against a plain count in the test itself. */
import assert from 'node:assert/strict';
import fc from 'fast-check';
import { analyse } from '../../src/analysis';
import type { Channel, Entrance } from '../../src/spec/channel';
import {
  anything,
  band,
  butterworthForm,
  capture,
  limit,
  plusMinus,
  rate,
  rectangleSeconds,
  stage,
  tone,
  wanted,
} from '../support/channel-builder';
import { entering, falling, row, spectrum, withHarmonics } from '../support/source-builder';
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

describe('harmonics', () => {
  it('of a tone land each for itself, and the strongest of them is named', () => {
    // 13, 26 and 39 kHz land on 13, 24 and 11 kHz, outside; 4·13 = 52 kHz lands on 2 kHz.
    const alias = aliasOf(guarded({ unwanted: [withHarmonics(tone(13e3, -10, { name: 'drive' }), falling(6))] }));
    assert.deepEqual([alias.harmonic, alias.frequency, alias.fold], [4, 52e3, 1]);
    assertWithin(alias.lands ?? NaN, 2e3, 1e-6);
    assertWithin(alias.level ?? NaN, -10 - 20 * Math.log10(4) + butterworthDb(4, 52 / 14), 1e-6);
  });

  it('of any tone are those of a plain count over harmonics and folds, and so is their sum', () => {
    const cases = fc.record({
      hz: fc.double({ min: 11e3, max: 900e3, noNaN: true }),
      to: fc.integer({ min: 2, max: 60 }),
      odd: fc.boolean(),
      slopeDbPerDecade: fc.constantFrom(-40, -20, 0),
    });
    fc.assert(
      fc.property(cases, ({ hz, to, odd, slopeDbPerDecade }) => {
        const landing: { m: number; db: number }[] = [];
        for (let m = 1; m <= to; m += odd ? 2 : 1) {
          const db = -10 + slopeDbPerDecade * Math.log10(m) + butterworthDb(4, (m * hz) / 14e3);
          // What meets an edge but for rounding meets it.
          if (folded(m * hz, 50e3) <= 10e3 + 1e-9) landing.push({ m, db });
        }
        const figures = analyse(guarded({ unwanted: [withHarmonics(tone(hz, -10), { to, odd, slopeDbPerDecade })] }));
        const best = landing.reduce<{ m: number; db: number } | null>((a, b) => (a === null || b.db > a.db ? b : a), null);
        assert.equal(figures.alias?.harmonic ?? null, best?.m ?? null);
        if (best === null) return;
        assertWithin(figures.alias?.level ?? NaN, best.db, 1e-6);
        assertWithin(figures.aliasSum ?? NaN, powersDb(landing.map(({ db }) => db)), 1e-6);
      }),
      { seed: 31, numRuns: 150 },
    );
  });

  it('of a tone that may move move m times as far', () => {
    // 3·(21 kHz ± 5 %) reaches from 59.85 to 66.15 kHz and so lands on 9.85 kHz and up; 21 and 42 kHz themselves: 42 kHz lands on 8 kHz.
    const moving = tone(21e3, -10, { name: 'drive', tolerance: plusMinus(0.05) });
    const alias = aliasOf(guarded({ unwanted: [withHarmonics(moving, falling(3, { odd: true }))] }));
    assert.deepEqual([alias.harmonic, alias.nominal, alias.worstAt], [3, null, { 'drive, frequency': -0.05 }]);
    assertWithin(alias.frequency ?? NaN, 59.85e3, 1e-6);
    assertWithin(alias.level ?? NaN, -10 - 20 * Math.log10(3) + butterworthDb(4, 59.85 / 14), 0.001);
  });

  it('of a band stand anywhere in m times the band', () => {
    // 15 .. 17 kHz lands outside; so does 30 .. 34; 45 .. 51 kHz lands from 45 kHz up.
    const alias = aliasOf(guarded({ unwanted: [withHarmonics(band(15e3, 17e3, -20), falling(3))] }));
    assert.deepEqual([alias.harmonic, alias.frequency, alias.fold], [3, 45e3, 1]);
    assertWithin(alias.level ?? NaN, -20 - 20 * Math.log10(3) + butterworthDb(4, 45 / 14), 0.001);
  });

  it('inside the wanted band are an overlap, reported once for a source, and no alias', () => {
    const source = withHarmonics(tone(2e3, -10), falling(30));
    const figures = analyse(guarded({ wanted: [wanted(5e3, 10e3)], unwanted: [source] }));
    assert.deepEqual(figures.overlaps, [{ index: 0, harmonic: 3, lowHz: 6e3, highHz: 6e3 }]);
    // 5 kHz and 10 kHz touch the band, 6 and 8 kHz lie in it; 40, 42, 44 kHz land on 10, 8 and 6.
    assert.deepEqual([figures.alias?.harmonic, figures.alias?.frequency], [20, 40e3]);
  });

  it('count in headroom with their peaks, and in the jitter of unwanted sources with their own frequency', () => {
    const source = withHarmonics(tone(100e3, -20), falling(3));
    const channel = guarded({ wanted: [wanted(0, 10e3, -6)], stages: [], unwanted: [source], jitterSeconds: 1e-9, bits: 16 });
    const { headroom, noise } = analyse(channel);
    const peaks = 10 ** (-6 / 20) + 0.1 * (1 + 1 / 2 + 1 / 3);
    assertWithin(headroom ?? NaN, -20 * Math.log10(peaks), 1e-9);
    // Each harmonic falls as 1/m and jitters m times as much: three times the power of the first. 10 kHz of 25 kHz is the share in band.
    const firstDb = -20 + 20 * Math.log10(2 * Math.PI * 100e3 * 1e-9);
    assertWithin(noise.jitterUnwanted ?? NaN, firstDb + 10 * Math.log10(3) + 10 * Math.log10(10 / 25), 1e-9);
  });

  it('count as noise where the limit says so', () => {
    const source = withHarmonics(tone(55e3, -60), falling(2));
    const limits = [limit('snr', 20, { withUnwanted: true })];
    const channel = guarded({ stages: [], unwanted: [source], bits: 16, limits });
    // 55 kHz lands on 5 kHz, 110 kHz on 10 kHz; quantisation in 10 of 25 kHz.
    const quantisation = -(6.0206 * 16 + 1.7609) + 10 * Math.log10(10 / 25);
    const noise = powersDb([-60, -60 - 20 * Math.log10(2), quantisation]);
    assertWithin(analyse(channel).limits[0]?.value ?? NaN, -noise, 1e-4);
  });

  it('up to the highest number of a wide band take no more searches than can matter', () => {
    const wide = guarded({ unwanted: [withHarmonics(band(30e3, 3e6, -20), falling(1000))] });
    assert.ok(analyse(wide).evaluations < 20_000, String(analyse(wide).evaluations));
    assertWithin(aliasOf(wide).level ?? NaN, -20 + butterworthDb(4, 40 / 14), 0.001);
  });
});

describe('a source that enters', () => {
  const first = stage(butterworthForm(2, 20e3), {
    name: 'one',
    label: 'one',
    cornerTolerance: plusMinus(0.1),
    gainTolerance: plusMinus(0.02),
  });
  const second = stage(butterworthForm(3, 15e3), { name: 'two', label: 'two', cornerTolerance: plusMinus(0.05) });
  const path = (parts: Partial<Channel>): Channel => guarded({ stages: [first, second], ...parts });
  const nominalTwo = butterworthDb(3, 42 / 15);
  const worstTwo = butterworthDb(3, 42 / 15 / 1.05);

  it('in front of the second stage sees only that and its tolerance', () => {
    const alias = aliasOf(path({ unwanted: [entering(tone(42e3, -10), { stage: 1 })] }));
    assertWithin(alias.nominal ?? NaN, -10 + nominalTwo, 1e-6);
    assertWithin(alias.level ?? NaN, -10 + worstTwo, 1e-6);
    assert.deepEqual(alias.worstAt, { 'two, corner': 0.05 });
  });

  it('at the sampler sees no stage, but the aperture', () => {
    const pulse = rectangleSeconds(10e-6);
    const alias = aliasOf(path({ pulse, unwanted: [entering(tone(42e3, -10), 'sampler')] }));
    const x = Math.PI * 42e3 * 10e-6;
    assertWithin(alias.level ?? NaN, -10 + 20 * Math.log10(Math.sin(x) / x), 1e-6);
    assert.equal(alias.worstAt, null);
    assert.equal(alias.nominal, alias.level);
  });

  it('in front of the first stage is one that enters at the input', () => {
    const [at, of] = [{ stage: 0 }, 'input' as const].map((enters) =>
      aliasOf(path({ unwanted: [entering(tone(42e3), enters)] })),
    );
    assert.deepEqual(at, of);
  });

  it('is held against a wanted tone that does pass the stages in front, at their least', () => {
    const referenceHz = 8e3;
    const channel = path({
      referenceHz,
      unwanted: [entering(tone(42e3, -10), { stage: 1 })],
      limits: [limit('alias', -40, { unit: 'dBc' })],
    });
    const { limits, alias } = analyse(channel);
    // By hand over a fine grid of both corners: the same second stage for both, the first for the wanted tone alone.
    let worst = -Infinity;
    let level = NaN;
    for (let i = 0; i <= 200; i += 1) {
      const two = 0.95 + (0.1 * i) / 200;
      const ratio = butterworthDb(3, 42 / 15 / two) - butterworthDb(3, 8 / 15 / two);
      const front = butterworthDb(2, 8 / 20 / 0.9) + 20 * Math.log10(0.98);
      if (ratio - front > worst) [worst, level] = [ratio - front, butterworthDb(3, 42 / 15 / two)];
    }
    assertWithin(limits[0]?.value ?? NaN, -10 + worst, 0.001);
    assertWithin(limits[0]?.nominal ?? NaN, -10 + nominalTwo - butterworthDb(3, 8 / 15) - butterworthDb(2, 8 / 20), 1e-6);
    assertWithin(alias?.level ?? NaN, -10 + level, 0.001);
    assert.deepEqual(alias?.worstAt, { 'one, corner': -0.1, 'one, gain': -0.02, 'two, corner': 0.05 });
  });

  it('has, under levels that hold at the sampler, what it would have there if it stood at the reference', () => {
    const channel = (enters: Entrance): Channel =>
      path({
        levelsAt: 'sampler',
        referenceHz: 8e3,
        stages: [stage(butterworthForm(2, 20e3)), stage(butterworthForm(3, 15e3))],
        unwanted: [entering(tone(42e3, -10), enters)],
      });
    assertWithin(aliasOf(channel({ stage: 1 })).level ?? NaN, -10 + nominalTwo - butterworthDb(3, 8 / 15), 1e-6);
    assertWithin(aliasOf(channel('sampler')).level ?? NaN, -10, 1e-9);
  });

  it('reaches the headroom and the jitter by its own way', () => {
    const stages = [stage(butterworthForm(4, 14e3))];
    const channel = guarded({
      wanted: [wanted(0, 10, -6)],
      stages,
      unwanted: [entering(tone(100e3, -20), 'sampler')],
      jitterSeconds: 1e-9,
    });
    const { headroom, noise } = analyse(channel);
    assertWithin(headroom ?? NaN, -20 * Math.log10(10 ** (-6 / 20) + 0.1), 1e-9);
    assertWithin(noise.jitterUnwanted ?? NaN, -20 + 20 * Math.log10(2 * Math.PI * 1e-4) + 10 * Math.log10(10 / 25e3), 1e-9);
  });
});

describe('an alias limit for the sum', () => {
  const sources = [
    tone(42e3, -50, { name: 'a' }),
    withHarmonics(tone(55e3, -60, { name: 'b' }), falling(2)),
    tone(65e3, 0, { name: 'outside' }),
  ];

  it('holds every landing of every source together, at the worst of each', () => {
    const stages = [stage(butterworthForm(4, 14e3), { label: 'guard', cornerTolerance: plusMinus(0.04) })];
    const channel = guarded({ stages, unwanted: sources, limits: [limit('alias', -80, { sum: true })] });
    const at = (corner: number): number =>
      powersDb([
        -50 + butterworthDb(4, 42 / corner),
        -60 + butterworthDb(4, 55 / corner),
        -60 - 20 * Math.log10(2) + butterworthDb(4, 110 / corner),
      ]);
    const { limits, aliases, aliasSum } = analyse(channel);
    const [figure] = limits;
    assertWithin(figure?.value ?? NaN, at(14 * 1.04), 1e-6);
    assertWithin(figure?.nominal ?? NaN, at(14), 1e-6);
    assertWithin(figure?.margin ?? NaN, -80 - at(14 * 1.04), 1e-6);
    assert.equal(aliasSum, figure?.value);
    assert.deepEqual([figure?.where?.source, figure?.worstAt, figure?.passes], ['a', { 'guard, corner': 0.04 }, true]);
    // No single source has a margin against it.
    assert.deepEqual(
      aliases.map(({ margin }) => margin),
      [null, null, null],
    );
  });

  it('may be told against the wanted tone', () => {
    const channel = guarded({
      wanted: [wanted(0, 10e3, -6)],
      stages: [],
      unwanted: sources,
      limits: [limit('alias', -30, { unit: 'dBc', sum: true })],
    });
    assertWithin(analyse(channel).limits[0]?.value ?? NaN, powersDb([-50, -60, -60 - 20 * Math.log10(2)]) + 6, 1e-9);
  });

  it('counts a band, an envelope and anything each by its one strongest tone', () => {
    const channel = guarded({
      stages: [],
      unwanted: [band(30e3, 1e6, -50), spectrum([row(40e3, -60), row(1e6, -60)]), anything(-70)],
      limits: [limit('alias', -30, { sum: true })],
    });
    assertWithin(analyse(channel).limits[0]?.value ?? NaN, powersDb([-50, -60, -70]), 0.002);
  });

  it('is met where nothing lands', () => {
    const [figure] = analyse(guarded({ unwanted: [tone(65e3)], limits: [limit('alias', -90, { sum: true })] })).limits;
    assert.deepEqual([figure?.value, figure?.judged, figure?.passes], [-Infinity, true, true]);
  });
});
