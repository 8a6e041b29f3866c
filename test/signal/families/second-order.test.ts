/** Second-order sections against the modulus of their transfer functions, written out. */
import assert from 'node:assert/strict';
import { secondOrder, type SecondOrderKind } from '../../../src/signal/families/second-order';
import { filterResponse, groupDelay } from '../../../src/signal/filter';
import { assertClose, assertWithin, filterRelative, roundingRelative } from '../../support/tolerance';

/** |numerator| over u = f/f₀; the denominator is 1 − u² + ju/Q. */
const numerators: Readonly<Record<SecondOrderKind, (u: number, q: number) => number>> = {
  lowpass: () => 1,
  highpass: (u) => u * u,
  bandpass: (u, q) => u / q,
  notch: (u) => Math.abs(1 - u * u),
  allpass: (u, q) => Math.hypot(1 - u * u, u / q),
};
const kinds = Object.keys(numerators) as SecondOrderKind[];
const qs = [1e-4, 0.1, 0.49999, 0.5, 0.50001, Math.SQRT1_2, 1, 30, 1e4];

describe('secondOrder', () => {
  for (const kind of kinds) {
    it(`has the gain of its transfer function: ${kind}`, () => {
      for (const q of qs) {
        const response = filterResponse(secondOrder(kind, 1234, q));
        for (const u of [0.001, 0.3, 0.97, 1.02, 2, 1000]) {
          const expected = numerators[kind](u, q) / Math.hypot(1 - u * u, u / q);
          assertClose(Math.exp(response.logGain(u * 1234)), expected, filterRelative, `Q ${q} at ${u}`);
        }
      }
    });

    it(`peaks or dips where its list says and nowhere else: ${kind}`, () => {
      for (const q of qs) {
        const filter = secondOrder(kind, 1, q);
        const response = filterResponse(filter);
        const turns = [0, ...(filter.turnsHz ?? []), 50];
        turns.slice(1).forEach((to, index) => {
          const from = turns[index]!;
          const gains = Array.from({ length: 101 }, (_, step) => response.logGain(from + ((to - from) * step) / 100));
          const direction = Math.sign(gains[100]! - gains[0]!);
          gains.slice(1).forEach((gain, step) => {
            assert.ok(direction * (gain - gains[step]!) >= -1e-12, `Q ${q} from ${from}`);
          });
        });
      }
    });
  }

  it('has gain Q at its frequency as a low-pass and a high-pass, 1 as a band-pass and none as a notch', () => {
    for (const q of [0.4, 1, 50]) {
      assertClose(Math.exp(filterResponse(secondOrder('lowpass', 1e6, q)).logGain(1e6)), q, roundingRelative * 10);
      assertClose(Math.exp(filterResponse(secondOrder('highpass', 1e6, q)).logGain(1e6)), q, roundingRelative * 10);
      assertClose(Math.exp(filterResponse(secondOrder('bandpass', 1e6, q)).logGain(1e6)), 1, roundingRelative);
      assert.equal(filterResponse(secondOrder('notch', 1e6, q)).logGain(1e6), -Infinity);
      assertClose(Math.exp(filterResponse(secondOrder('notch', 1e6, q)).logGain(Infinity)), 1, roundingRelative);
    }
  });

  it('takes half the power of a notch at both edges of a band as wide as f₀/Q', () => {
    // Half power of a notch stands at f₀·(√(1 + 1/4Q²) ± 1/2Q): closed form.
    for (const q of [0.3, 2, 100]) {
      for (const sign of [1, -1]) {
        const edge = Math.hypot(1, 0.5 / q) + (sign * 0.5) / q;
        assertClose(Math.exp(2 * filterResponse(secondOrder('notch', 1, q)).logGain(edge)), 0.5, filterRelative);
      }
    }
  });

  it('delays as an all-pass twice as much as as a low-pass, and by 4Q/ω₀ at its frequency', () => {
    for (const q of [0.3, 0.5, 3]) {
      for (const f of [0, 200, 1000, 4000]) {
        assertClose(groupDelay(secondOrder('allpass', 1000, q), f), 2 * groupDelay(secondOrder('lowpass', 1000, q), f), 1e-11);
      }
      assertClose(groupDelay(secondOrder('allpass', 1000, q), 1000), (4 * q) / (2000 * Math.PI), 1e-11);
      assertWithin(filterResponse(secondOrder('allpass', 1000, q)).logGain(777), 0, 1e-12);
    }
  });

  it('refuses a Q and a frequency that are not above 0', () => {
    for (const wrong of [0, -1, NaN, Infinity]) {
      assert.throws(() => secondOrder('notch', 1000, wrong), RangeError);
      assert.throws(() => secondOrder('notch', wrong, 1), RangeError);
    }
  });
});
