/** The least order that meets two losses: the filter of that order does, the one below does not. */
import { readFileSync } from 'node:fs';
import { join } from 'node:path';
import { butterworth } from '../../../src/signal/families/butterworth';
import { designFilter } from '../../../src/signal/families/design-filter';
import type { Filter } from '../../../src/signal/filter';
import { largestOverBands } from '../../../src/signal/search';
import { filterResponse } from '../../../src/signal/filter';
import type { OutsideGroup } from '../group';
import { gainDbOf } from '../outside-design';

interface OrderCase {
  readonly pass_dB: number;
  readonly stop_dB: number;
  readonly wp: number;
  readonly ws: number;
  readonly order: Readonly<Record<'butterworth' | 'chebyshev1' | 'chebyshev2' | 'elliptic', number>> & {
    readonly bessel_bruteforce_max25: number | null;
  };
}

interface Trap {
  readonly pass_dB_exact: string;
  readonly stop_dB_exact: string;
  readonly ws_over_wp: number;
  readonly order: number;
}

const path = join(import.meta.dirname, '../../reference/order-selection.json');
const { cases, equality_traps: traps } = JSON.parse(readFileSync(path, 'utf8')) as {
  readonly cases: readonly OrderCase[];
  readonly equality_traps: readonly Trap[];
};

/** dB by which an equality may be missed: rounding of levels of a hundred dB. */
const slackDb = 1e-9;
const epsilonOf = (db: number): number => Math.sqrt(Math.expm1((db * Math.LN10) / 10));

const pass = { family: 'chebyshev', kind: 'lowpass', attenuationDb: null, rippleDb: null, gain: 1 } as const;

/** A low-pass of an order that just keeps the loss in the passband; an inverse Chebyshev one just keeps that in the stop band. */
const makers: Readonly<
  Record<'butterworth' | 'chebyshev1' | 'chebyshev2' | 'elliptic', (order: number, one: OrderCase) => Filter>
> = {
  butterworth: (order, { pass_dB, wp }) => butterworth(order, wp * epsilonOf(pass_dB) ** (-1 / order)),
  chebyshev1: (order, { pass_dB, wp }) => designFilter({ ...pass, order, corners: wp, cornerAt: 'ripple', rippleDb: pass_dB }),
  chebyshev2: (order, { stop_dB, ws }) =>
    designFilter({ ...pass, family: 'inverse-chebyshev', order, corners: ws, cornerAt: 'stopband', attenuationDb: stop_dB }),
  elliptic: (order, { pass_dB, stop_dB, wp }) =>
    designFilter({
      ...pass,
      family: 'elliptic',
      order,
      corners: wp,
      cornerAt: 'ripple',
      rippleDb: pass_dB,
      attenuationDb: stop_dB,
    }),
};

/** Whether the loss is at most `pass_dB` up to wp and at least `stop_dB` from ws on, proved over both bands. */
function meets(filter: Filter, { pass_dB, stop_dB, wp, ws }: OrderCase): boolean {
  const response = filterResponse(filter);
  const stop = largestOverBands(response, [{ low: ws, high: Infinity }]);
  return gainDbOf(filter, wp) >= -pass_dB - slackDb && (20 / Math.LN10) * (stop?.logGain ?? NaN) <= -stop_dB + slackDb;
}

/** The least Bessel order up to 20 whose half-power corner can be set so that both losses are met; null where none can. */
function besselOrder({ pass_dB, stop_dB, wp, ws }: OrderCase): number | null {
  for (let order = 1; order <= 20; order += 1) {
    const bessel = designFilter({ ...pass, family: 'bessel', order, corners: 1, cornerAt: 'half-power' });
    let [low, high] = [1e-3, 1e3];
    // Where the loss is that of the passband's edge; the loss of a Bessel filter only grows with frequency.
    for (let i = 0; i < 100; i += 1) {
      const middle = Math.sqrt(low * high);
      if (gainDbOf(bessel, middle) >= -pass_dB) low = middle;
      else high = middle;
    }
    if (gainDbOf(bessel, (low * ws) / wp) <= -stop_dB) return order;
  }
  return null;
}

/** The group. */
export const orders: OutsideGroup = {
  title: 'Least orders',
  source: "the handbooks' closed forms at 40 digits; Bessel by trial; the same as scipy's *ord",
  define: (tally) => {
    for (const one of cases) {
      const name = `${one.pass_dB} dB to ${one.wp}, ${one.stop_dB} dB from ${one.ws}`;
      it(`are enough, and one less is not: ${name}`, () => {
        for (const family of ['butterworth', 'chebyshev1', 'chebyshev2', 'elliptic'] as const) {
          const least = one.order[family];
          // The language ends at order 20; only Butterworth has a closed form here that goes on.
          if (least > 20 && family !== 'butterworth') continue;
          const found = [least - 1, least].map((order) => meets(makers[family](order, one), one));
          tally.exact(found, [false, true], `${family}, orders ${least - 1} and ${least}`);
        }
        tally.exact(besselOrder(one), one.order.bessel_bruteforce_max25, `bessel, ${name}`);
      });
    }

    it('meet a loss that they have exactly', () => {
      for (const trap of traps) {
        const one = { pass_dB: Number(trap.pass_dB_exact), stop_dB: Number(trap.stop_dB_exact), wp: 1, ws: trap.ws_over_wp };
        tally.decibels(-gainDbOf(butterworth(trap.order, 1), one.ws), one.stop_dB, slackDb, `order ${trap.order}`);
        const met = [trap.order - 1, trap.order].map(
          (order) => order > 0 && gainDbOf(butterworth(order, 1), one.ws) <= -one.stop_dB + slackDb,
        );
        tally.exact(met, [false, true], `order ${trap.order} as the least`);
      }
    });
  },
};
