/** Poles, zeros, constants and half-power points of the low-pass prototypes, orders 1 to 12 and elliptic ones to 20. */
import { groupDelay, type Filter } from '../../../src/signal/filter';
import { readOutsideFilters, type OutsidePrototype } from '../../reference/outside-filters';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup, Tally } from '../group';
import { filterOf, gainDbOf, nameOf } from '../outside-design';
import { tallyRoots } from '../roots';

/** What our poles are multiplied by: the tables have two normalisations that no corner of ours names. */
function scaleOf(filter: Filter, { norm, order }: OutsidePrototype): number {
  if (norm === 'phase') return filter.poles.reduce((product, { re, im }) => product * Math.hypot(re, im) ** (-1 / order), 1);
  return norm === 'raw' ? rawHalfPower(order) : 1;
}

/** Where Σ w^(2i)/i!, i = 1 … n, is 1: half power of the truncated exponential as it stands. */
function rawHalfPower(order: number): number {
  const sum = (w: number): number => {
    let term = 1;
    let total = 0;
    for (let i = 1; i <= order; i += 1) total += term *= (w * w) / i;
    return total;
  };
  let [low, high] = [0, 2];
  for (let i = 0; i < 60; i += 1) {
    const middle = 0.5 * (low + high);
    if (sum(middle) < 1) low = middle;
    else high = middle;
  }
  return low;
}

function tallyPrototype(tally: Tally, stored: OutsidePrototype): void {
  const what = nameOf(stored);
  const filter = filterOf(stored);
  const scale = scaleOf(filter, stored);
  const rest = { scale, allowed: filterRelative, what };
  tallyRoots(tally, filter.poles, { ...rest, expected: stored.poles });
  tallyRoots(tally, filter.zeros, { ...rest, expected: stored.zeros });
  tally.relative(10 ** (gainDbOf(filter, 0) / 20), gainAtZero(stored), filterRelative, `${what}, gain at 0 Hz`);
  if (stored.delayAtZero !== undefined)
    tally.relative((2 * Math.PI * groupDelay(filter, 0)) / scale, stored.delayAtZero, filterRelative, `${what}, delay`);
  const named = { 'half-power': stored.halfPower, stopband: stored.stopEdge };
  for (const [cornerAt, corners] of Object.entries(named)) {
    if (corners === undefined) continue;
    const { poles } = filterOf(stored, { corners, cornerAt: cornerAt as 'half-power' | 'stopband' });
    tallyRoots(tally, poles, { ...rest, expected: stored.poles, what: `${what} by ${cornerAt}` });
  }
}

/** |constant|·Π|z|/Π|p|, each root of the upper half plane counting twice. */
function gainAtZero({ poles, zeros, constant }: OutsidePrototype): number {
  const product = (roots: OutsidePrototype['poles']): number =>
    roots.reduce((size, [re, im]) => size * Math.hypot(re, im) ** (im === 0 ? 1 : 2), 1);
  return (Math.abs(constant) * product(zeros)) / product(poles);
}

/** The group. */
export const prototypes: OutsideGroup = {
  title: 'Prototypes: poles, zeros, gain, half power',
  source: 'mpmath, 50 to 160 digits',
  define: (tally) => {
    const stored = readOutsideFilters().prototypes;
    for (const family of new Set(stored.map((one) => one.family))) {
      it(`has every prototype of ${family}`, () => {
        for (const one of stored) if (one.family === family) tallyPrototype(tally, one);
      });
    }
  },
};
