/** LC ladders: the natural frequencies and the response of the tabled elements are those of our families. */
import assert from 'node:assert/strict';
import { butterworth } from '../../../src/signal/families/butterworth';
import type { OutsideDesign } from '../../reference/outside-filters';
import { readCircuits } from '../../reference/circuits';
import { filterRelative } from '../../support/tolerance';
import type { OutsideGroup, Tally } from '../group';
import { levelDb, nearestNatural, type LcLadder, type Rounding } from '../lc-ladder';
import { filterOf, gainDbOf, nameOf } from '../outside-design';
import { misprints, printedDoubly, printedSingly } from './printed-ladders';

const omegas = [0, 0.1, 0.3, 0.5, 0.7, 0.9, 1, 1.1, 1.5, 2, 3, 10];
/** dB; of a level that falls to −200 dB. */
const levelSlackDb = 1e-9;
/** The second and fourth element of order 5, 2·sin(3π/10). */
const butterworthCoil = 2 * Math.sin(0.3 * Math.PI);
const exact: Rounding = { element: 0, loadSiemens: 0 };
/** The sum of first-order moves leaves out what is of the second order in half a unit of the fourth place. */
const secondOrder = 1.01;

/** Half a unit of the fourth place; a load printed so only where it is none of 1 Ω. */
function roundingOf({ loadOhm }: LcLadder): Rounding {
  return { element: 5e-5, loadSiemens: loadOhm === 1 || loadOhm === Infinity ? 0 : 5e-5 };
}

function doubly(elements: readonly number[], loadOhm: number): LcLadder {
  return { elements, first: 'shunt', sourceOhm: 1, loadOhm };
}

/** The dual has the reciprocal load. */
function dual(ladder: LcLadder): LcLadder {
  return { ...ladder, first: 'series', loadOhm: 1 / ladder.loadOhm };
}

/** Fed through its resistor, open at the far end, so the last element is a shunt capacitor. */
function singly(elements: readonly number[]): LcLadder {
  return { elements, first: elements.length % 2 === 1 ? 'shunt' : 'series', sourceOhm: 1, loadOhm: Infinity };
}

/** The largest of a ladder's misses over what its rounding explains, over our poles. */
function worstMiss(ladder: LcLadder, design: OutsideDesign): number {
  const misses = filterOf(design).poles.map((pole) => nearestNatural(ladder, pole, roundingOf(ladder)));
  return Math.max(...misses.map(({ distance, mobility }) => distance / mobility));
}

function tallyExact(tally: Tally, ladder: LcLadder, design: OutsideDesign): void {
  const filter = filterOf(design);
  const what = `${nameOf(design)}, ${ladder.first} first`;
  assert.equal(filter.poles.length, ladder.elements.length);
  for (const pole of filter.poles) {
    const size = Math.hypot(pole.re, pole.im);
    tally.relative(size + nearestNatural(ladder, pole, exact).distance, size, filterRelative, `${what}, natural frequency`);
  }
  // Over all the power that the source has to give; where nothing is loaded, over the voltage at 0 Hz, which is all of it.
  const open = ladder.loadOhm === Infinity;
  const availableDb = open ? gainDbOf(filter, 0) : 10 * Math.log10((4 * ladder.sourceOhm) / ladder.loadOhm);
  for (const omega of omegas)
    tally.decibels(levelDb(ladder, omega) + availableDb, gainDbOf(filter, omega), levelSlackDb, `${what}, ${omega} rad/s`);
}

function tallyPrinted(tally: Tally, ladder: LcLadder, design: OutsideDesign): void {
  for (const pole of filterOf(design).poles) {
    const { distance, mobility } = nearestNatural(ladder, pole, roundingOf(ladder));
    tally.absolute(distance, 0, secondOrder * mobility, `${nameOf(design)}, natural frequency ${pole.re} + ${pole.im}j`);
  }
}

/** The group of elements to 17 digits. */
export const lcLadders: OutsideGroup = {
  title: 'LC ladders',
  source: 'continued fractions at 160 digits; Chebyshev by the classical recursion; response by chain matrices in the test',
  define: (tally) => {
    const { doublyTerminated, singlyTerminated } = readCircuits();
    for (const family of new Set(doublyTerminated.map((one) => one.family))) {
      it(`between two resistors has the poles and the response of ${family}, as its dual has`, () => {
        for (const one of doublyTerminated) {
          if (one.family !== family) continue;
          const ladder = doubly(one.elements, one.loadOhm);
          tallyExact(tally, ladder, one);
          tallyExact(tally, dual(ladder), one);
        }
      });
    }
    for (const family of new Set(singlyTerminated.map((one) => one.family))) {
      it(`behind one resistor has the poles and the response of ${family}`, () => {
        for (const one of singlyTerminated) if (one.family === family) tallyExact(tally, singly(one.elements), one);
      });
    }
  },
};

/** The group of elements to four places. */
export const printedLcLadders: OutsideGroup = {
  title: 'Printed LC ladders',
  source: "handbooks' tables of elements to four places; allowed: what half a unit of each moves a natural frequency",
  define: (tally) => {
    it('between two resistors has our poles', () => {
      for (const [design, text, loadSiemens = 1] of printedDoubly) {
        const elements = text.split(' ').map(Number);
        assert.equal(elements.length, design.order);
        tallyPrinted(tally, doubly(elements, 1 / loadSiemens), design);
      }
    });

    it('behind one resistor has our poles with the element beside the resistor first, and not with it last', () => {
      for (const [design, text] of printedSingly) {
        const elements = text.split(' ').map(Number);
        tallyPrinted(tally, singly(elements), design);
        assert.ok(worstMiss(singly(elements.toReversed()), design) > 100);
      }
    });

    for (const { what, design, printed, meant, loadOhm = 1, meantOhm = loadOhm } of misprints) {
      it(`does not have our poles where ${what}`, () => {
        const ladderOf = (text: string, ohm: number): LcLadder => doubly(text.split(' ').map(Number), ohm);
        tallyPrinted(tally, ladderOf(meant, meantOhm), design);
        assert.ok(worstMiss(ladderOf(printed, loadOhm), design) > 10);
      });
    }

    it('has no Chebyshev filter of even order between equal resistors', () => {
      for (const [design, text, loadSiemens = 1] of printedDoubly) {
        if (loadSiemens !== 1) assert.ok(worstMiss(doubly(text.split(' ').map(Number), 1), design) > 10);
      }
    });

    it('of 50 Ω and 1 MHz is as a circuit simulator has it, for which its coils were 12.87581 µH, where 12.87591 µH are right', () => {
      const ladderOf = (henry: number): LcLadder => ({
        elements: [1.967263e-9, henry, 6.366198e-9, henry, 1.967263e-9],
        first: 'shunt',
        sourceOhm: 50,
        loadOhm: 50,
      });
      // Over the source's voltage, as printed.
      for (const [frequencyHz, simulatedDb] of [
        [0, -6.0206],
        [1e6, -9.0308],
        [2e6, -36.1277],
      ] as const) {
        const omega = 2 * Math.PI * frequencyHz;
        tally.decibels(levelDb(ladderOf(12.87581e-6), omega), simulatedDb, 5e-5, `${frequencyHz} Hz, simulated`);
        // What half a unit of each element's last place, 4e-7 of the coils, may come to.
        const ours = gainDbOf(butterworth(5, 1e6), frequencyHz) - 20 * Math.log10(2);
        tally.decibels(levelDb(ladderOf(12.87591e-6), omega), ours, 2e-5, `${frequencyHz} Hz, ours`);
      }
      const henry = (butterworthCoil * 50) / (2 * Math.PI * 1e6);
      assert.equal((henry * 1e6).toFixed(5), '12.87591');
    });
  },
};
