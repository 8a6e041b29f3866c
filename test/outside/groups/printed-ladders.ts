/** Elements of LC ladders as handbooks print them, for 1 Ω and 1 rad/s, and the misprints that copies of them have. */
import type { OutsideDesign } from '../../reference/outside-filters';

/** A design, its elements from the source on, and the load in siemens after a shunt capacitor as the first; 1 where none stands. */
type PrintedLadder = readonly [design: OutsideDesign, elements: string, loadSiemens?: number];

/** A table's entry that is wrong. */
interface Misprint {
  readonly what: string;
  readonly design: OutsideDesign;
  readonly printed: string;
  readonly meant: string;
  /** As printed and as meant; 1 where the misprint is in an element of an odd order. */
  readonly loadOhm?: number;
  readonly meantOhm?: number;
}

// Half power at 1 rad/s; of Chebyshev filters the end of the ripple. Public tables of prototype elements; Butterworth 2·sin((2k − 1)·π/2n).
export const printedDoubly: readonly PrintedLadder[] = [
  [{ family: 'butterworth', order: 2 }, '1.4142 1.4142'],
  [{ family: 'butterworth', order: 3 }, '1.0000 2.0000 1.0000'],
  [{ family: 'butterworth', order: 4 }, '0.7654 1.8478 1.8478 0.7654'],
  [{ family: 'butterworth', order: 5 }, '0.6180 1.6180 2.0000 1.6180 0.6180'],
  [{ family: 'butterworth', order: 6 }, '0.5176 1.4142 1.9319 1.9319 1.4142 0.5176'],
  [{ family: 'butterworth', order: 7 }, '0.4450 1.2470 1.8019 2.0000 1.8019 1.2470 0.4450'],
  [{ family: 'chebyshev', order: 2, ripple: 0.01 }, '0.4489 0.4078', 1.1007],
  [{ family: 'chebyshev', order: 3, ripple: 0.01 }, '0.6292 0.9703 0.6292'],
  [{ family: 'chebyshev', order: 4, ripple: 0.01 }, '0.7129 1.2004 1.3213 0.6476', 1.1007],
  [{ family: 'chebyshev', order: 5, ripple: 0.01 }, '0.7563 1.3049 1.5773 1.3049 0.7563'],
  [{ family: 'chebyshev', order: 6, ripple: 0.01 }, '0.7814 1.3600 1.6897 1.5350 1.4970 0.7098', 1.1007],
  [{ family: 'chebyshev', order: 7, ripple: 0.01 }, '0.7969 1.3924 1.7481 1.6331 1.7481 1.3924 0.7969'],
  [{ family: 'chebyshev', order: 2, ripple: 0.1 }, '0.8430 0.6220', 1.3554],
  [{ family: 'chebyshev', order: 3, ripple: 0.1 }, '1.0316 1.1474 1.0316'],
  [{ family: 'chebyshev', order: 4, ripple: 0.1 }, '1.1088 1.3062 1.7704 0.8181', 1.3554],
  [{ family: 'chebyshev', order: 5, ripple: 0.1 }, '1.1468 1.3712 1.9750 1.3712 1.1468'],
  [{ family: 'chebyshev', order: 6, ripple: 0.1 }, '1.1681 1.4040 2.0562 1.5171 1.9029 0.8618', 1.3554],
  [{ family: 'chebyshev', order: 7, ripple: 0.1 }, '1.1812 1.4228 2.0967 1.5734 2.0967 1.4228 1.1812'],
  [{ family: 'chebyshev', order: 2, ripple: 0.5 }, '1.4029 0.7071', 1.9841],
  [{ family: 'chebyshev', order: 3, ripple: 0.5 }, '1.5963 1.0967 1.5963'],
  [{ family: 'chebyshev', order: 4, ripple: 0.5 }, '1.6703 1.1926 2.3661 0.8419', 1.9841],
  [{ family: 'chebyshev', order: 5, ripple: 0.5 }, '1.7058 1.2296 2.5408 1.2296 1.7058'],
  [{ family: 'chebyshev', order: 6, ripple: 0.5 }, '1.7254 1.2479 2.6064 1.3137 2.4758 0.8696', 1.9841],
  [{ family: 'chebyshev', order: 7, ripple: 0.5 }, '1.7373 1.2582 2.6383 1.3443 2.6383 1.2582 1.7373'],
  [{ family: 'chebyshev', order: 2, ripple: 3 }, '3.1013 0.5339', 5.8089],
  [{ family: 'chebyshev', order: 3, ripple: 3 }, '3.3487 0.7117 3.3487'],
  [{ family: 'chebyshev', order: 4, ripple: 3 }, '3.4389 0.7483 4.3470 0.5920', 5.8089],
  [{ family: 'chebyshev', order: 5, ripple: 3 }, '3.4813 0.7619 4.5375 0.7619 3.4813'],
  [{ family: 'chebyshev', order: 6, ripple: 3 }, '3.5045 0.7685 4.6061 0.7929 4.4641 0.6033', 5.8089],
  [{ family: 'chebyshev', order: 7, ripple: 3 }, '3.5185 0.7722 4.6390 0.8038 4.6390 0.7722 3.5185'],
  [{ family: 'bessel', order: 2 }, '0.5755 2.1478'],
  [{ family: 'bessel', order: 3 }, '0.3374 0.9705 2.2034'],
  [{ family: 'bessel', order: 4 }, '0.2334 0.6725 1.0815 2.2404'],
  [{ family: 'bessel', order: 5 }, '0.1743 0.5072 0.8040 1.1110 2.2582'],
  [{ family: 'bessel', order: 6 }, '0.1365 0.4002 0.6392 0.8538 1.1126 2.2645'],
  [{ family: 'bessel', order: 7 }, '0.1106 0.3259 0.5249 0.7020 0.8690 1.1052 2.2659'],
  [{ family: 'legendre', order: 3 }, '1.1737 1.3538 2.1801'],
  [{ family: 'legendre', order: 4 }, '1.0827 1.4768 1.9585 1.5644'],
  [{ family: 'legendre', order: 5 }, '0.9512 1.4780 2.0673 1.5395 1.9990'],
  [{ family: 'gaussian', order: 3 }, '0.2624 0.8167 2.2262'],
  [{ family: 'gaussian', order: 4 }, '0.1772 0.5302 0.9321 2.2450'],
  [{ family: 'gaussian', order: 5 }, '0.1312 0.3896 0.6485 0.9782 2.2533'],
];

/** Ideal source behind the resistor, the element beside the resistor first. */
export const printedSingly: readonly PrintedLadder[] = [
  [{ family: 'butterworth', order: 3 }, '0.5000 1.3333 1.5000'],
  [{ family: 'butterworth', order: 4 }, '0.3827 1.0824 1.5772 1.5307'],
  [{ family: 'butterworth', order: 5 }, '0.3090 0.8944 1.3820 1.6944 1.5451'],
];

/** What copied tables have. */
export const misprints: readonly Misprint[] = [
  {
    what: '0.7653 is printed for 0.7563',
    design: { family: 'chebyshev', order: 5, ripple: 0.01 },
    printed: '0.7653 1.3049 1.5773 1.3049 0.7563',
    meant: '0.7563 1.3049 1.5773 1.3049 0.7563',
  },
  {
    what: '.07814 is printed for 0.7814',
    design: { family: 'chebyshev', order: 6, ripple: 0.01 },
    printed: '.07814 1.3600 1.6897 1.5350 1.4970 0.7098',
    meant: '0.7814 1.3600 1.6897 1.5350 1.4970 0.7098',
    loadOhm: 1 / 1.1007,
  },
  ...[
    ['0.8430 0.6220', 2],
    ['1.1088 1.3062 1.7704 0.8181', 4],
    ['1.1681 1.4040 2.0562 1.5171 1.9029 0.8618', 6],
  ].map(([elements, order]) => ({
    what: `a load of .07378 is printed for 0.7378, order ${order}`,
    design: { family: 'chebyshev', order: Number(order), ripple: 0.1 } as const,
    printed: String(elements),
    meant: String(elements),
    loadOhm: 0.07378,
    meantOhm: 0.7378,
  })),
  {
    what: '1.5374 is printed for 1.5734',
    design: { family: 'chebyshev', order: 7, ripple: 0.1 },
    printed: '1.1812 1.4228 2.0967 1.5374 2.0967 1.4228 1.1812',
    meant: '1.1812 1.4228 2.0967 1.5734 2.0967 1.4228 1.1812',
  },
];
