/** Every form of a stage in a channel, against plain complex arithmetic on a grid. */
import assert from 'node:assert/strict';
import { analyse } from '../../src/analysis';
import { stageFilter } from '../../src/analysis/stage-filter';
import type { Family, FamilyForm, FilterKind, MeasuredForm, StageForm } from '../../src/spec/channel';
import { band, capture, family, generate, limit, plusMinus, rate, relay, stage, tone, wanted } from '../support/channel-builder';
import { inDb, inSeries, landingGain, largest, plainDelay, plainGain, spaced, type Gain } from '../support/plain-path';
import { assertClose, assertWithin } from '../support/tolerance';

/** What a grid of this density may miss of a smooth maximum. */
const gridDb = 0.01;

const rateHz = 20e3;
const wantedHz = [1e3, 4e3] as const;
const sourceHz = [9e3, 210e3] as const;
const guard = { kind: 'bandwidth', cornerHz: 60e3 } as const;
const referenceHz = 2e3;

type PlainForm = Exclude<StageForm, MeasuredForm>;

function channelOf(form: StageForm, options: Parameters<typeof stage>[1] = {}) {
  return capture({
    wanted: [wanted(...wantedHz)],
    referenceHz,
    rate: rate(rateHz),
    stages: [stage(form, options), stage(guard, { label: 'guard' })],
    unwanted: [band(...sourceHz, -20)],
    limits: [limit('alias', -60), limit('flatness', 1)],
  });
}

function gainOf(form: PlainForm, gain = 1): Gain {
  return inSeries([plainGain(stageFilter(form, gain)), plainGain(stageFilter(guard, 1))]);
}

const sampling = { rateHz, wanted: wantedHz, source: sourceHz, folds: 11 };

function departure(gain: Gain, count = 4000): number {
  const reference = gain(referenceHz);
  return largest(spaced(...wantedHz, count), (f) => Math.abs(inDb(gain(f) / reference)));
}

const corners: Readonly<Record<FilterKind, Pick<FamilyForm, 'cornerHz' | 'upperCornerHz'>>> = {
  lowpass: { cornerHz: 5e3, upperCornerHz: null },
  highpass: { cornerHz: 600, upperCornerHz: null },
  bandpass: { cornerHz: 700, upperCornerHz: 5.5e3 },
  bandstop: { cornerHz: 14e3, upperCornerHz: 19e3 },
};

const families: Readonly<Record<Family, Partial<FamilyForm>>> = {
  butterworth: {},
  chebyshev: { rippleDb: 0.5, cornerAt: 'ripple' },
  'inverse-chebyshev': { attenuationDb: 45 },
  elliptic: { rippleDb: 0.5, attenuationDb: 50 },
  bessel: {},
  legendre: {},
  gaussian: {},
};

const names = Object.keys(families) as Family[];
const kinds = Object.keys(corners) as FilterKind[];

const others: Readonly<Record<string, PlainForm>> = {
  'a second-order low-pass': { kind: 'second-order', sectionKind: 'lowpass', frequencyHz: 5e3, q: 1.3 },
  'a second-order high-pass': { kind: 'second-order', sectionKind: 'highpass', frequencyHz: 700, q: 0.9 },
  'a second-order band-pass': { kind: 'second-order', sectionKind: 'bandpass', frequencyHz: 2e3, q: 1 },
  'a notch among the folds': { kind: 'second-order', sectionKind: 'notch', frequencyHz: 18e3, q: 2 },
  'an all-pass': { kind: 'second-order', sectionKind: 'allpass', frequencyHz: 3e3, q: 1.2 },
  'a cr section': { kind: 'cr', ohm: 10e3, farad: 47e-9 },
  'an rc section': { kind: 'rc', ohm: 1e3, farad: 10e-9 },
  'an rlc section': { kind: 'rlc', ohm: 80, henry: 10e-3, farad: 100e-9 },
  'roots with zeros on and right of the axis': {
    kind: 'roots',
    poles: [
      { re: -5e3, im: 0 },
      { re: -2.5e3, im: 5e3 },
      { re: -2.5e3, im: -5e3 },
    ],
    zeros: [
      { re: 8e3, im: 0 },
      { re: 0, im: 19e3 },
      { re: 0, im: -19e3 },
    ],
    gain: 1.5,
    gainAtHz: 0,
  },
};

describe('a stage in a capture channel', () => {
  const every = [
    ...names.flatMap((name) =>
      kinds.map((filterKind): readonly [string, PlainForm] => [
        `a ${filterKind} of family ${name}`,
        family(name, 3, corners[filterKind].cornerHz, { ...families[name], ...corners[filterKind], filterKind }),
      ]),
    ),
    ...Object.entries(others),
  ];
  for (const [title, form] of every) {
    it(`lets through what the grid says: ${title}`, () => {
      const figures = analyse(channelOf(form));
      const gain = gainOf(form);
      assertWithin(figures.alias?.level ?? NaN, inDb(landingGain(gain, sampling)) - 20, gridDb, 'alias');
      assertWithin(figures.limits[1]?.value ?? NaN, departure(gain), gridDb, 'flatness');
      assertWithin(figures.droop ?? NaN, inDb(gain(referenceHz) / gain(wantedHz[1])), 1e-9, 'droop');
      const delay = plainDelay([stageFilter(form, 1), stageFilter(guard, 1)]);
      assertClose(figures.delay ?? NaN, delay(referenceHz), 1e-6, 'delay');
      const delays = spaced(...wantedHz, 2000).map(delay);
      const spread = Math.max(...delays) - Math.min(...delays);
      assertWithin(figures.delaySpread ?? NaN, spread, 2e-3 * spread + 1e-10, 'delay spread');
    });
  }

  it('stays proved to a thousandth of a decibel at order 20', () => {
    const form = family('elliptic', 20, 5e3, { rippleDb: 0.1, attenuationDb: 80 });
    const figures = analyse(channelOf(form));
    assertWithin(figures.alias?.level ?? NaN, inDb(landingGain(gainOf(form), sampling, 6000)) - 20, gridDb);
    assert.ok((figures.alias?.gap ?? 1) <= 0.001);
  });
});

describe('a stage with a null', () => {
  it('departs without limit in a wanted band that holds the null, at the null itself', () => {
    for (const options of [{}, { cornerTolerance: plusMinus(0.01) }]) {
      const figures = analyse(channelOf({ kind: 'second-order', sectionKind: 'notch', frequencyHz: 3e3, q: 3 }, options));
      assert.equal(figures.limits[1]?.value, Infinity);
      assert.equal(figures.limits[1].where?.frequency, 3e3);
    }
  });

  it('leaves no signal-to-noise ratio of a test tone that stands on it, and no number that is none', () => {
    const form: PlainForm = { kind: 'second-order', sectionKind: 'notch', frequencyHz: wantedHz[1], q: 3 };
    const common = { rate: rate(rateHz, { clockJitterSeconds: 1e-11 }), referenceHz, bits: 12, wanted: [wanted(...wantedHz)] };
    for (const build of [capture, generate, relay]) {
      const stages = [stage(form)];
      const figures = analyse(build({ ...common, ...(build === relay ? { inputStages: stages } : { stages }) }));
      assert.equal(figures.snr, -Infinity);
      assert.equal(figures.enobFullScale, null);
      assert.ok(!JSON.stringify(figures, (_, value: unknown) => (Number.isNaN(value) ? 'NaN' : value)).includes('NaN'));
    }
  });

  it('lets a source at its null count for nothing, in levels and in headroom', () => {
    const notch: PlainForm = { kind: 'second-order', sectionKind: 'notch', frequencyHz: 18e3, q: 2 };
    const channel = { ...channelOf(notch), unwanted: [tone(18e3, 0)], limits: [limit('alias', -60), limit('headroom', 1)] };
    const figures = analyse(channel);
    assert.deepEqual([figures.alias?.level, figures.limits[0]?.value, figures.limits[0]?.passes], [-Infinity, -Infinity, true]);
    assertWithin(figures.headroom ?? NaN, -inDb(largest(spaced(...wantedHz, 4000), gainOf(notch))), gridDb);
  });
});

describe('a stage in a generate channel', () => {
  for (const [title, form] of [
    [
      'a band-pass about the second zone',
      family('chebyshev', 3, 25e3, { rippleDb: 0.5, filterKind: 'bandpass', upperCornerHz: 40e3 }),
    ],
    ['a high-pass', family('bessel', 3, 15e3, { filterKind: 'highpass' })],
    [
      'a band-stop on the first zone',
      family('elliptic', 4, 2e3, { rippleDb: 0.5, attenuationDb: 50, filterKind: 'bandstop', upperCornerHz: 22e3 }),
    ],
  ] as const) {
    it(`leaves the images that the grid says: ${title}`, () => {
      const copyRate = 48e3;
      const channel = generate({
        wanted: [wanted(28e3, 36e3)],
        rate: rate(copyRate),
        stages: [stage(form), stage(guard, { label: 'guard' })],
        limits: [limit('image', -40)],
      });
      const sinc = (x: number): number => (x === 0 ? 1 : Math.abs(Math.sin(Math.PI * x) / (Math.PI * x)));
      const leaves = (f: number): number => gainOf(form)(f) * sinc(f / copyRate);
      let most = -Infinity;
      for (const x of spaced(12e3, 20e3, 800)) {
        const own = leaves(copyRate - x);
        for (const f of [x, copyRate + x, 2 * copyRate - x, 2 * copyRate + x, 3 * copyRate - x])
          most = Math.max(most, leaves(f) / own);
      }
      assertWithin(analyse(channel).limits[0]?.value ?? NaN, inDb(most), gridDb);
    });
  }
});

describe('the gain of a stage', () => {
  it('multiplies every level and leaves what is relative', () => {
    const form = family('butterworth', 3, 5e3);
    const plain = analyse(channelOf(form));
    const louder = analyse(channelOf(form, { gain: 10 ** (6 / 20) }));
    assertWithin((louder.alias?.level ?? NaN) - (plain.alias?.level ?? NaN), 6, 1e-9);
    assertWithin((louder.alias?.relative ?? NaN) - (plain.alias?.relative ?? NaN), 0, 1e-9);
    assertWithin((louder.limits[1]?.value ?? NaN) - (plain.limits[1]?.value ?? NaN), 0, 1e-9);
    const hold = { wanted: [wanted(0, 5e3)], rate: rate(48e3) };
    const quiet = analyse(generate({ ...hold, stages: [stage(form)] }));
    const strong = analyse(generate({ ...hold, stages: [stage(form, { gain: 2 })] }));
    assertWithin((strong.image?.level ?? NaN) - (quiet.image?.level ?? NaN), inDb(2), 1e-9);
  });
});

describe('a stage whose corner may be off', () => {
  const loose = { cornerTolerance: plusMinus(0.06) };
  const factors = spaced(0.94, 1.06, 40);
  const stretched = (form: PlainForm, factor: number): Gain => {
    const gain = plainGain(stageFilter(form, 1));
    const still = plainGain(stageFilter(guard, 1));
    return (f) => gain(f / factor) * still(f);
  };
  for (const [title, form] of [
    ['a high-pass', family('chebyshev', 4, 700, { rippleDb: 1, filterKind: 'highpass' })],
    ['a band-pass', family('elliptic', 3, 800, { rippleDb: 0.5, attenuationDb: 40, filterKind: 'bandpass', upperCornerHz: 5e3 })],
    [
      'a band-stop beside a tone',
      family('inverse-chebyshev', 3, 17e3, { attenuationDb: 60, filterKind: 'bandstop', upperCornerHz: 23e3 }),
    ],
    ['a notch', others['a notch among the folds'] ?? guard],
    ['roots', others['roots with zeros on and right of the axis'] ?? guard],
  ] as const) {
    it(`is taken at its worst, the ends of its tolerance and between: ${title}`, () => {
      const figures = analyse(channelOf(form, loose));
      const alias = largest(factors, (factor) => landingGain(stretched(form, factor), { ...sampling, folds: 2 }, 200));
      assertWithin(figures.alias?.level ?? NaN, inDb(alias) - 20, 2 * gridDb, 'alias');
      const flat = largest(factors, (factor) => departure(stretched(form, factor), 300));
      assertWithin(figures.limits[1]?.value ?? NaN, flat, 2 * gridDb, 'flatness');
      const delays = [0.94, 1, 1.06].map((factor) => {
        const gain = plainDelay([stageFilter(form, 1)]);
        const still = plainDelay([stageFilter(guard, 1)]);
        const values = spaced(...wantedHz, 1000).map((f) => gain(f / factor) / factor + still(f));
        return Math.max(...values) - Math.min(...values);
      });
      assertWithin(figures.delaySpread ?? NaN, Math.max(...delays), 2e-3 * Math.max(...delays), 'delay spread');
    });
  }

  it('lets a tone past a notch that has moved away', () => {
    const notch = { kind: 'second-order', sectionKind: 'notch', frequencyHz: 18e3, q: 2 } as const;
    const still = analyse({ ...channelOf(notch), unwanted: [tone(18e3, -20)] });
    assert.equal(still.alias?.level, -Infinity);
    const moved = analyse({ ...channelOf(notch, { cornerTolerance: plusMinus(0.02) }), unwanted: [tone(18e3, -20)] });
    const worst = Math.max(...[0.98, 1.02].map((factor) => stretched(notch, factor)(18e3)));
    assertWithin(moved.alias?.level ?? NaN, inDb(worst) - 20, 1e-9);
  });
});

describe('a stage whose parts or Qs may be off', () => {
  it('takes an rlc at the worst values of its parts, and names them', () => {
    const form = { kind: 'rlc', ohm: 80, henry: 10e-3, farad: 100e-9 } as const;
    const parts = [
      { part: 'r', value: 80, tolerance: plusMinus(0.05) },
      { part: 'l', value: 10e-3, tolerance: plusMinus(0.1) },
      { part: 'c', value: 100e-9, tolerance: { low: -0.2, high: 0.1 } },
    ] as const;
    const figures = analyse(channelOf(form, { label: 'trap', parts }));
    let [alias, flat] = [-Infinity, -Infinity];
    for (const r of [0.95, 1.05]) {
      for (const l of spaced(0.9, 1.1, 20)) {
        for (const c of spaced(0.8, 1.1, 20)) {
          const gain = gainOf({ kind: 'rlc', ohm: 80 * r, henry: 10e-3 * l, farad: 100e-9 * c });
          alias = Math.max(alias, landingGain(gain, { ...sampling, folds: 1 }, 60));
          flat = Math.max(flat, departure(gain, 150));
        }
      }
    }
    assertWithin(figures.alias?.level ?? NaN, inDb(alias) - 20, 2 * gridDb, 'alias');
    assertWithin(figures.limits[1]?.value ?? NaN, flat, 2 * gridDb, 'flatness');
    const { worstAt } = figures.alias ?? {};
    assert.deepEqual(Object.keys(worstAt ?? {}), ['trap, r', 'trap, l', 'trap, c']);
    assert.equal(worstAt?.['trap, r'], -0.05);
  });

  it('takes each section at the worst end of its Q', () => {
    const form = family('chebyshev', 4, 4.5e3, { rippleDb: 0.5 });
    const figures = analyse(channelOf(form, { qTolerance: plusMinus(0.1), label: 'guard' }));
    const plain = stageFilter(form, 1);
    let [alias, flat] = [-Infinity, -Infinity];
    const qs = spaced(0.9, 1.1, 8);
    for (const one of qs) {
      for (const other of qs) {
        const gain = inSeries([withSections(plain.poles, [one, other], plain.gainAt.gain), plainGain(stageFilter(guard, 1))]);
        alias = Math.max(alias, landingGain(gain, { ...sampling, folds: 1 }, 300));
        flat = Math.max(flat, departure(gain, 150));
      }
    }
    assertWithin(figures.alias?.level ?? NaN, inDb(alias) - 20, gridDb, 'alias');
    assertWithin(figures.limits[1]?.value ?? NaN, flat, gridDb, 'flatness');
    assert.deepEqual(Object.keys(figures.alias?.worstAt ?? {}), ['guard, q of section 1', 'guard, q of section 2']);
  });

  it('judges images of a generate channel against the tone behind the same parts', () => {
    const form = { kind: 'rlc', ohm: 200, henry: 10e-3, farad: 100e-9 } as const;
    const parts = [
      { part: 'r', value: 200, tolerance: plusMinus(0.05) },
      { part: 'l', value: 10e-3, tolerance: plusMinus(0.1) },
      { part: 'c', value: 100e-9, tolerance: plusMinus(0.1) },
    ] as const;
    const channel = generate({
      wanted: [wanted(0, 4e3)],
      rate: rate(rateHz),
      stages: [stage(form, { parts })],
      limits: [limit('image', -40)],
    });
    const sinc = (x: number): number => (x === 0 ? 1 : Math.abs(Math.sin(Math.PI * x) / (Math.PI * x)));
    let most = -Infinity;
    for (const r of [0.95, 1.05]) {
      for (const l of spaced(0.9, 1.1, 16)) {
        for (const c of spaced(0.9, 1.1, 16)) {
          const gain = plainGain(stageFilter({ kind: 'rlc', ohm: 200 * r, henry: 10e-3 * l, farad: 100e-9 * c }, 1));
          const copy = (x: number): number => gain(rateHz - x) * sinc((rateHz - x) / rateHz);
          most = Math.max(
            most,
            largest(spaced(1, 4e3, 200), (x) => copy(x) / (gain(x) * sinc(x / rateHz))),
          );
        }
      }
    }
    assertWithin(analyse(channel).limits[0]?.value ?? NaN, inDb(most), 2 * gridDb);
  });
});

/** The gain of pole pairs, gain 1 at 0 Hz but for a constant, each with its real part over a factor on its Q. */
function withSections(
  poles: readonly { readonly re: number; readonly im: number }[],
  factors: readonly number[],
  gain: number,
): Gain {
  const upper = poles.filter(({ im }) => im > 0);
  return (f) =>
    upper.reduce((product, { re, im }, index) => {
      const square = re * re + im * im;
      const damping = (2 * re) / (factors[index] ?? 1);
      return product * (square / Math.hypot(square - f * f, damping * f));
    }, gain);
}
