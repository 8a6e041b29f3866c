/** Adaptive quadrature by nested Gauss–Kronrod rules, with the difference of the two rules as the error bound. */

/** An integral and what it may be off by. */
export interface Integral {
  readonly value: number;
  readonly errorBound: number;
}

// Nodes and weights of the 7-point Gauss and 15-point Kronrod rules on [−1, 1], from the middle outwards; the Gauss nodes are every
// second one. Source: R. Piessens et al., QUADPACK (1983), routine QK15.
const nodes = [
  0, 0.2077849550078985, 0.4058451513773972, 0.5860872354676911, 0.7415311855993945, 0.8648644233597691, 0.9491079123427585,
  0.9914553711208126,
] as const;
const kronrodWeights = [
  0.20948214108472782, 0.20443294007529889, 0.19035057806478542, 0.1690047266392679, 0.14065325971552592, 0.10479001032225019,
  0.06309209262997856, 0.022935322010529224,
] as const;
const gaussWeights = [0.4179591836734694, 0, 0.3818300505051189, 0, 0.27970539148927664, 0, 0.1294849661688697, 0] as const;

/** More panels than this are not opened; the error bound then says how far it got. */
const panelLimit = 2000;

/** Rounding of a sum of products, relative. */
const rounding = 1e-14;

/**
 * Integrates a smooth function over a finite interval, splitting the worst panel first.
 *
 * @param integrand finite everywhere in between; the ends themselves are never asked for.
 * @param relative where to stop, against the value; after 2000 panels the error bound says how far it got.
 * Source: R. Piessens et al., QUADPACK (1983).
 * @example integrate((x) => x * x, 0, 3, 1e-9).value // 9
 */
export function integrate(integrand: (x: number) => number, low: number, high: number, relative: number): Integral {
  const panels = [panelOf(integrand, low, high)];
  for (;;) {
    const value = panels.reduce((sum, panel) => sum + panel.value, 0);
    const errorBound = panels.reduce((sum, panel) => sum + panel.error, 0);
    const worst = panels.reduce((one, other) => (other.error > one.error ? other : one));
    const middle = 0.5 * (worst.low + worst.high);
    const done =
      errorBound <= relative * Math.abs(value) || panels.length >= panelLimit || middle <= worst.low || middle >= worst.high;
    if (done) return { value, errorBound };
    panels[panels.indexOf(worst)] = panelOf(integrand, worst.low, middle);
    panels.push(panelOf(integrand, middle, worst.high));
  }
}

interface Panel {
  readonly low: number;
  readonly high: number;
  readonly value: number;
  readonly error: number;
}

function panelOf(integrand: (x: number) => number, low: number, high: number): Panel {
  const middle = 0.5 * (low + high);
  const half = 0.5 * (high - low);
  let kronrod = 0;
  let gauss = 0;
  nodes.forEach((node, index) => {
    const sum = node === 0 ? integrand(middle) : integrand(middle - half * node) + integrand(middle + half * node);
    kronrod += (kronrodWeights[index] ?? 0) * sum;
    gauss += (gaussWeights[index] ?? 0) * sum;
  });
  return { low, high, value: kronrod * half, error: Math.abs(kronrod - gauss) * half + rounding * Math.abs(kronrod * half) };
}
