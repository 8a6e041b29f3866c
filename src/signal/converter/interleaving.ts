/** What ways that differ leave behind when they sample in turn: copies of every tone, and lines, from one value for each way. */

/** How one way differs. */
export interface Way {
  /** g in 1 + g. */
  readonly gain: number;
  /** δ in s: how much later than it should it samples. */
  readonly skewSeconds: number;
  /** o, as a share of full scale. */
  readonly offset: number;
}

/**
 * The copies of a tone, k = 1 … M − 1, each as a share of the tone itself: |Σ_m (1 + g_m)·e^{j2πfδ_m}·e^{−j2πkm/M}| over the same sum at
 * k = 0. Copy k stands at f + k·rate/M before folding.
 *
 * @param ways at least one, in the order they sample.
 * @param frequencyHz f, the tone's frequency at the input, ≥ 0.
 * @returns exact, with copy 1 first; none from a single way.
 * Source: N. Kurosawa et al., "Explicit analysis of channel mismatch effects in time-interleaved ADC systems", IEEE Trans. CAS-I 48 (2001).
 * @example interleaveCopies([{ gain: 0.005, skewSeconds: 0, offset: 0 }, { gain: -0.005, skewSeconds: 0, offset: 0 }], 1000)[0] // 0.005
 */
export function interleaveCopies(ways: readonly Way[], frequencyHz: number): readonly number[] {
  const phasors = ways.map(({ gain, skewSeconds }) => ({ size: 1 + gain, angle: 2 * Math.PI * frequencyHz * skewSeconds }));
  const own = turnedSum(phasors, 0);
  return ways.slice(1).map((_, index) => turnedSum(phasors, index + 1) / own);
}

/**
 * The peaks of the lines that offsets make at k·rate/M, k = 1 … floor(M/2), as shares of full scale: |Σ_m o_m·e^{−j2πkm/M}|/M, twice that
 * below rate/2, where the terms k and M − k are one line. What all ways share is a constant and makes none.
 *
 * @param ways at least one, in the order they sample.
 * @returns exact, with the line at rate/M first.
 * Source: as `interleaveCopies`; the discrete Fourier transform of real values.
 * @example offsetLines([{ gain: 0, skewSeconds: 0, offset: 0.001 }, { gain: 0, skewSeconds: 0, offset: -0.001 }])[0] // 0.001
 */
export function offsetLines(ways: readonly Way[]): readonly number[] {
  const phasors = ways.map(({ offset }) => ({ size: offset, angle: 0 }));
  const lines = Math.floor(ways.length / 2);
  return Array.from({ length: lines }, (_, index) => {
    const terms = 2 * (index + 1) === ways.length ? 1 : 2;
    return (terms * turnedSum(phasors, index + 1)) / ways.length;
  });
}

interface Phasor {
  readonly size: number;
  readonly angle: number;
}

/** |Σ_m size·e^{j·angle}·e^{−j2πkm/M}|. */
function turnedSum(phasors: readonly Phasor[], k: number): number {
  let [re, im] = [0, 0];
  phasors.forEach(({ size, angle }, m) => {
    const turned = angle - (2 * Math.PI * ((k * m) % phasors.length)) / phasors.length;
    re += size * Math.cos(turned);
    im += size * Math.sin(turned);
  });
  return Math.hypot(re, im);
}
