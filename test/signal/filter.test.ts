/** Filters as responses: bounds and slopes that enclose, turning points that change nothing but the effort, phase and delay that agree. */
import assert from 'node:assert/strict';
import { butterworth } from '../../src/signal/families/butterworth';
import { chebyshev } from '../../src/signal/families/chebyshev';
import { realPole } from '../../src/signal/families/real-pole';
import { filterResponse, groupDelay, phaseRad, type Filter } from '../../src/signal/filter';
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

const filters: readonly (readonly [string, Filter])[] = [
  ['one real pole', realPole(1000)],
  ['a Butterworth filter of order 4', butterworth(4, 1000)],
  ['a Butterworth filter of order 20', butterworth(20, 1000)],
  ['a Chebyshev filter of order 5', chebyshev(5, 1000, 0.5, 'half-power')],
  ['a sharp Chebyshev filter of order 20', chebyshev(20, 1000, 3, 'ripple')],
  ['a filter with two sharp resonances', resonant],
];

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
        const moved: Filter = { ...filter, poles: filter.poles.map(({ re, im }) => ({ re: re * c, im: im * c })), turnsHz: null };
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

  it('has no gain left at infinity', () => {
    for (const [, filter] of filters) assert.equal(filterResponse(filter).logGain(Infinity), -Infinity);
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
  it('starts at 0 and ends at −90° a pole', () => {
    for (const [, filter] of filters) {
      assertWithin(phaseRad(filter, 0), 0, 1e-12);
      assertClose(phaseRad(filter, Infinity), (-Math.PI / 2) * filter.poles.length, 1e-12);
    }
  });
});
