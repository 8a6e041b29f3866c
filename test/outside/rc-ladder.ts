/** The natural frequencies of a ladder of resistors and grounded capacitors, as eigenvalues of its nodal matrix. */
export interface RcLadder {
  /** From the ideal source on; each is followed by its capacitor. */
  readonly ohms: readonly number[];
  readonly farads: readonly number[];
  /** Across the last capacitor. */
  readonly loadOhm: number | null;
}

/** In rad/s, ascending, all real and positive: what the poles are with the other sign. */
export function naturalFrequencies({ ohms, farads, loadOhm }: RcLadder): readonly number[] {
  const conductances = [...ohms.map((ohm) => 1 / ohm), loadOhm === null ? 0 : 1 / loadOhm];
  // C^(−½)·G·C^(−½): symmetric, three diagonals, the same eigenvalues as C⁻¹·G.
  const diagonal = farads.map((farad, k) => (conductances[k]! + conductances[k + 1]!) / farad);
  const squares = farads.slice(1).map((farad, k) => conductances[k + 1]! ** 2 / (farad * farads[k]!));
  const highest = 2 * Math.max(...diagonal) + 1;
  return farads.map((_, index) => {
    let [low, high] = [0, highest];
    for (let i = 0; i < 200; i += 1) {
      const middle = 0.5 * (low + high);
      if (countBelow(diagonal, squares, middle) > index) high = middle;
      else low = middle;
    }
    return high;
  });
}

/** How many eigenvalues are below a value, by the signs of the pivots (J. J. Sylvester's law of inertia). */
function countBelow(diagonal: readonly number[], squares: readonly number[], value: number): number {
  let pivot = 1;
  return diagonal.reduce((count, entry, k) => {
    pivot = entry - value - (k === 0 ? 0 : squares[k - 1]! / pivot);
    return pivot < 0 ? count + 1 : count;
  }, 0);
}
