/** The polynomial in cos 2πx that passes through given values, evaluated anywhere without its coefficients. */

/**
 * Weights of the barycentric form at nodes of cos 2πx: 1/Π(cos 2πx_i − cos 2πx_j), all times the constant that makes the largest 1.
 *
 * @param nodes ascending shares within 0 … 0.5, no two alike.
 * Source: as for cosinePolynomial; by logarithms, so that hundreds of nodes do not overflow.
 * @example cosineWeights([0, 0.25])[1] // -1
 */
export function cosineWeights(nodes: readonly number[]): readonly number[] {
  const logs = nodes.map((node) =>
    nodes.reduce((sum, other) => sum - (other === node ? 0 : Math.log(Math.abs(gap(node, other)))), 0),
  );
  const most = logs.reduce((one, other) => Math.max(one, other), -Infinity);
  // Along ascending nodes the cosines fall, so that the products alternate in sign.
  return logs.map((log, index) => (index % 2 === 0 ? 1 : -1) * Math.exp(log - most));
}

/**
 * The polynomial's value at x.
 *
 * @param nodes ascending shares within 0 … 0.5.
 * @param weights of cosineWeights.
 * @param values at the nodes.
 * Source: J.-P. Berrut, L. N. Trefethen, Barycentric Lagrange interpolation (2004).
 * @example cosinePolynomial([0, 0.25], cosineWeights([0, 0.25]), [2, 1], 0.5) // 0
 */
export function cosinePolynomial(
  nodes: readonly number[],
  weights: readonly number[],
  values: readonly number[],
  x: number,
): number {
  let above = 0;
  let below = 0;
  for (let index = 0; index < nodes.length; index += 1) {
    const difference = gap(x, nodes[index] ?? 0);
    const value = values[index] ?? 0;
    if (difference === 0) return value;
    const share = (weights[index] ?? 0) / difference;
    above += share * value;
    below += share;
  }
  return above / below;
}

/** (cos 2πx − cos 2πy)/−2 as a product, which loses nothing where both are close. */
function gap(x: number, y: number): number {
  return Math.sin(Math.PI * (x + y)) * Math.sin(Math.PI * (x - y));
}
