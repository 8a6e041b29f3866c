/** Filters as responses: bounds and slopes that enclose, turning points that change nothing but the effort, phase and delay that agree. */
import assert from 'node:assert/strict';
import { butterworth } from '../../src/signal/families/butterworth';
import { chebyshev } from '../../src/signal/families/chebyshev';
import { designFilter } from '../../src/signal/families/design-filter';
import { elliptic } from '../../src/signal/families/elliptic';
import { inverseChebyshev } from '../../src/signal/families/inverse-chebyshev';
import { seriesCapacitor } from '../../src/signal/families/passive-sections';
import { polesAndZeros } from '../../src/signal/families/poles-and-zeros';
import { realPole } from '../../src/signal/families/real-pole';
import { secondOrder } from '../../src/signal/families/second-order';
import { filterResponse, groupDelay, phaseRad, type Filter, type Root } from '../../src/signal/filter';
import { assertBoundsEnclose, assertSlopeEncloses } from '../support/enclosing';
import { assertClose, assertWithin, filterRelative } from '../support/tolerance';

const resonant: Filter = {
  poles: [
    { re: -0.5, im: 800 },
    { re: -0.5, im: -800 },
    { re: -20, im: 1900 },
    { re: -20, im: -1900 },
    { re: -300, im: 0 },
  ],
  zeros: [],
  gainAt: { frequencyHz: 0, gain: 1 },
  turnsHz: null,
};

const lead = polesAndZeros({
  poles: [
    { re: -5000, im: 0 },
    { re: -4, im: 0 },
    { re: -7000, im: 0 },
    { re: -30, im: 2000 },
  ],
  zeros: [
    { re: -100, im: 0 },
    { re: 25, im: 0 },
    { re: 0, im: 1600 },
  ],
  gain: 3,
  gainAtHz: 20,
});

/** More pairs of zeros than of poles, so that two real poles must stand against one. */
const wideNotch = polesAndZeros({
  poles: [-10, -90e3, -2e3].map((re) => ({ re, im: 0 })),
  zeros: [{ re: 0, im: 950 }],
  gain: 1,
  gainAtHz: 0,
});

const twoReal = polesAndZeros({
  poles: [
    { re: -40, im: 900 },
    { re: -200, im: 3000 },
  ],
  zeros: [-150, -1e3, 0].map((re) => ({ re, im: 0 })),
  gain: 1,
  gainAtHz: 900,
});

const filters: readonly (readonly [string, Filter])[] = [
  ['one real pole', realPole(1000)],
  ['a Butterworth filter of order 4', butterworth(4, 1000)],
  ['a Butterworth filter of order 20', butterworth(20, 1000)],
  ['a Chebyshev filter of order 5', chebyshev(5, 1000, 0.5, 'half-power')],
  ['a sharp Chebyshev filter of order 20', chebyshev(20, 1000, 3, 'ripple')],
  ['a filter with two sharp resonances', resonant],
  ['an inverse Chebyshev filter of order 6', inverseChebyshev(6, 1000, 50, 'stopband')],
  ['an elliptic filter of order 5', elliptic(5, 1000, 0.5, 50, 'ripple')],
  ['an elliptic filter of order 20', elliptic(20, 1000, 0.1, 90, 'half-power')],
  ['zeros of every place', lead],
  ['a notch over real poles', wideNotch],
  ['real zeros over pairs of poles', twoReal],
  ['a series capacitor', seriesCapacitor(1e3, 159e-9)],
  ...(['lowpass', 'highpass', 'bandpass', 'notch', 'allpass'] as const).flatMap((kind) =>
    [0.2, 0.5, 0.9, 40].map((q) => [`a ${kind} section of Q ${q}`, secondOrder(kind, 1000, q)] as const),
  ),
  [
    'an elliptic band-stop',
    designFilter({
      family: 'elliptic',
      order: 4,
      kind: 'bandstop',
      corners: { low: 800, high: 1300 },
      cornerAt: 'ripple',
      rippleDb: 1,
      attenuationDb: 45,
      gain: 0.5,
    }),
  ],
];

function scaled(roots: readonly Root[], c: number): readonly Root[] {
  return roots.map(({ re, im }) => ({ re: re * c, im: im * c }));
}

/** What |H| is at infinity, from its first coefficients. */
function endOf({ poles, zeros, gainAt }: Filter): number {
  if (poles.length > zeros.length) return 0;
  if (gainAt.frequencyHz === Infinity) return gainAt.gain;
  const distance = (roots: readonly Root[]): number =>
    roots.reduce((total, { re, im }) => total * Math.hypot(re, gainAt.frequencyHz - im), 1);
  return (gainAt.gain * distance(poles)) / distance(zeros);
}

describe('filterResponse', () => {
  for (const [name, filter] of filters) {
    for (const [how, one] of [
      ['with its turning points', filter],
      ['by its sections alone', { ...filter, turnsHz: null }],
    ] as const) {
      it(`encloses the gain of ${name} at every point, ${how}`, () => {
        assertBoundsEnclose(filterResponse(one), 1000, 31);
      });

      it(`encloses the slope of ${name}, ${how}`, () => {
        assertSlopeEncloses(filterResponse(one), 1000, 32);
      });
    }

    it(`scales: ${name} at c times the corner gives the same at c times the frequency`, () => {
      for (const c of [1e-6, 3, 1e7]) {
        const moved: Filter = {
          ...filter,
          poles: scaled(filter.poles, c),
          zeros: scaled(filter.zeros, c),
          gainAt: { ...filter.gainAt, frequencyHz: filter.gainAt.frequencyHz * c },
          turnsHz: null,
        };
        for (const f of [0, 10, 700, 1234, 50e3]) {
          assertWithin(filterResponse(moved).logGain(f * c), filterResponse(filter).logGain(f), 1e-11);
        }
      }
    });
  }

  it('keeps the gain of a resonance of Q 800 against the resonance formula', () => {
    // |H|² of a pole pair by its own definition, |p|⁴/(|jf − p|²·|jf − p̄|²).
    const [p] = resonant.poles;
    const pair: Filter = { ...resonant, poles: resonant.poles.slice(0, 2) };
    for (const f of [1, 799, 799.9, 800, 800.3, 1e6]) {
      const squared = (p!.re ** 2 + p!.im ** 2) ** 2 / ((p!.re ** 2 + (f - p!.im) ** 2) * (p!.re ** 2 + (f + p!.im) ** 2));
      assertClose(Math.exp(2 * filterResponse(pair).logGain(f)), squared, filterRelative);
    }
  });

  it('has no gain left at infinity where there are more poles than zeros, else that of its first coefficients', () => {
    for (const [name, filter] of filters)
      assertClose(Math.exp(filterResponse(filter).logGain(Infinity)), endOf(filter), 1e-11, name);
  });

  it('is the product of the distances to its zeros over those to its poles', () => {
    for (const [name, filter] of filters) {
      const at = (f: number): number =>
        filter.zeros.reduce((sum, { re, im }) => sum + Math.log(Math.hypot(re, f - im)), 0) -
        filter.poles.reduce((sum, { re, im }) => sum + Math.log(Math.hypot(re, f - im)), 0);
      const response = filterResponse(filter);
      for (const f of [1, 333, 999.5, 2e3, 1e5]) {
        assertWithin(response.logGain(f) - response.logGain(77), at(f) - at(77), 1e-11, `${name} at ${f}`);
      }
    }
  });

  it('lets nothing through at a zero on the axis, and knows no slope across it', () => {
    const filter = elliptic(5, 1000, 0.5, 50, 'ripple');
    const zeros = filter.zeros.map(({ im }) => im).filter((im) => im > 0);
    assert.equal(zeros.length, 2);
    for (const zero of zeros) {
      const bySections = filterResponse({ ...filter, turnsHz: null });
      assert.equal(bySections.logGain(zero), -Infinity);
      assert.equal(bySections.bounds(zero * 0.99, zero * 1.01).low, -Infinity);
      assert.equal(bySections.slope(zero * 0.99, zero * 1.01), null);
      assert.equal(bySections.slope(zero, zero * 1.01), null);
      assert.notEqual(bySections.slope(zero * 1.001, zero * 1.01), null);
      assert.deepEqual(filterResponse(filter).slope(zero, zero * 1.001), { low: 0, high: Infinity });
    }
  });

  it('refuses more zeros than poles, and a gain given at a null', () => {
    const zero = { re: 0, im: 0 };
    assert.throws(() => filterResponse({ ...realPole(1), zeros: [zero, zero] }), RangeError);
    assert.throws(() => filterResponse({ ...realPole(1), zeros: [zero] }), RangeError);
    assert.throws(() => filterResponse({ ...realPole(1), gainAt: { frequencyHz: Infinity, gain: 1 } }), RangeError);
  });

  it('stays finite for frequencies and corners at the ends of what a spec may hold', () => {
    for (const [f, corner] of [
      [1e15, 1e-9],
      [1e-9, 1e15],
      [1e15, 1e15],
    ] as const) {
      assert.ok(Number.isFinite(filterResponse(butterworth(20, corner)).logGain(f)));
      assert.ok(Number.isFinite(filterResponse(chebyshev(20, corner, 3, 'ripple')).logGain(f)));
    }
  });

  it('refuses poles outside the left half plane and a gain of 0', () => {
    const one = realPole(1);
    for (const re of [0, 1, NaN, -Infinity]) assert.throws(() => filterResponse({ ...one, poles: [{ re, im: 0 }] }), RangeError);
    assert.throws(() => filterResponse({ ...one, gainAt: { frequencyHz: 0, gain: 0 } }), RangeError);
  });
});

describe('groupDelay', () => {
  it('is minus the derivative of the phase by angular frequency', () => {
    for (const [name, filter] of filters) {
      for (const f of [10, 400, 799, 1500, 20e3]) {
        const step = f * 1e-6;
        const difference = (phaseRad(filter, f + step) - phaseRad(filter, f - step)) / (4 * Math.PI * step);
        assertClose(groupDelay(filter, f), -difference, 1e-5, `${name} at ${f}`);
      }
    }
  });
});

describe('phaseRad', () => {
  it('starts at 0, or at 90° for a zero at 0 Hz, and ends at −90° for each pole and zero but +90° for a zero left of the axis or on it', () => {
    for (const [name, filter] of filters) {
      const atOrigin = filter.zeros.filter(({ re, im }) => re === 0 && im === 0).length;
      assertWithin(phaseRad(filter, 0), 0, 1e-12);
      assertWithin(phaseRad(filter, 1e-9), (Math.PI / 2) * atOrigin, 1e-9, name);
      const turns = filter.zeros.reduce((sum, { re }) => sum + (re > 0 ? -1 : 1), -filter.poles.length);
      assertWithin(phaseRad(filter, Infinity), (Math.PI / 2) * turns, 1e-12, name);
    }
  });

  it('is that of the transfer function itself, up to its sign', () => {
    for (const [name, filter] of filters) {
      for (const f of [3, 400, 1234, 2500, 20e3]) {
        const angle = (roots: readonly Root[]): number => roots.reduce((sum, { re, im }) => sum + Math.atan2(f - im, -re), 0);
        const turns = (phaseRad(filter, f) - angle(filter.zeros) + angle(filter.poles)) / Math.PI;
        assertWithin(turns, Math.round(turns), 1e-11, `${name} at ${f}`);
      }
    }
  });

  it('steps by half a turn at a zero on the axis', () => {
    const notch = secondOrder('notch', 1000, 2);
    assertWithin(phaseRad(notch, 1000 * (1 + 1e-12)) - phaseRad(notch, 1000 * (1 - 1e-12)), Math.PI, 1e-9);
  });
});
