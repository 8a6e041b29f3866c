/** A sampling capacitor that is charged from a reservoir: source resistance, reservoir, switch, capacitor, solved exactly. */

/** The network; resistances in Ω ≥ 0, capacitances in F > 0. */
export interface ReservoirNetwork {
  readonly source: number;
  readonly reservoir: number;
  readonly switchResistance: number;
  readonly capacitance: number;
}

/** What is left decays as the sum of these; the weights are above or at 0 and add up to 1. */
export interface Decay {
  readonly weight: number;
  /** s; 0 where that share is gone at once. */
  readonly timeConstant: number;
}

/**
 * The step's share that the reservoir drops by when the capacitor is connected through nothing: C/(C + C_r).
 *
 * Source: conservation of charge.
 * @example kickShare({ source: 49.9, reservoir: 560e-12, switchResistance: 200, capacitance: 30e-12 }) // 0.0508474576
 */
export function kickShare(network: ReservoirNetwork): number {
  checkNetwork(network);
  return network.capacitance / (network.capacitance + network.reservoir);
}

/**
 * The two decays of the capacitor's error, slow one first, from the start: reservoir charged, capacitor off by the whole step.
 *
 * With a = 1/(R_s·C_r), b = 1/(R_w·C_r), c = 1/(R_w·C) the rates are the roots of s² − (a + b + c)·s + a·c, both real. The smaller one
 * comes from their product, which does not cancel.
 *
 * @throws RangeError where a capacitance is not above 0 or a resistance is negative.
 * Source: nodal analysis of two capacitors, elementary.
 * @example reservoirDecays({ source: 49.9, reservoir: 560e-12, switchResistance: 200, capacitance: 30e-12 })[0].timeConstant * 1e9 // 29.818108
 */
export function reservoirDecays(network: ReservoirNetwork): readonly [slow: Decay, fast: Decay] {
  checkNetwork(network);
  const { source, reservoir, switchResistance, capacitance } = network;
  if (source === 0) return [{ weight: 1, timeConstant: switchResistance * capacitance }, gone(0)];
  if (switchResistance === 0) {
    const kick = kickShare(network);
    return [{ weight: kick, timeConstant: source * (reservoir + capacitance) }, gone(1 - kick)];
  }
  const a = 1 / (source * reservoir);
  const b = 1 / (switchResistance * reservoir);
  const c = 1 / (switchResistance * capacitance);
  const root = Math.hypot(a + b - c, 2 * Math.sqrt(b * c));
  const fastRate = 0.5 * (a + b + c + root);
  const larger = (Math.abs(a + b - c) + root) / (2 * root);
  const smaller = (b * c) / (root * root * larger);
  const [slow, fast] = a + b >= c ? [larger, smaller] : [smaller, larger];
  return [
    { weight: slow, timeConstant: fastRate / (a * c) },
    { weight: fast, timeConstant: 1 / fastRate },
  ];
}

/**
 * What is left of the capacitor's step after a time, as a share of the step.
 *
 * @param seconds ≥ 0 since the switch closed.
 * @returns 1 … 0, falling throughout.
 * Source: as `reservoirDecays`.
 * @example reservoirResidue({ source: 49.9, reservoir: 560e-12, switchResistance: 200, capacitance: 30e-12 }, 200e-9) // 0.00009464706
 */
export function reservoirResidue(network: ReservoirNetwork, seconds: number): number {
  if (!(seconds >= 0)) throw new RangeError(`A time must be 0 s or more, not ${seconds}.`);
  return reservoirDecays(network).reduce((sum, decay) => sum + remaining(decay, seconds), 0);
}

/**
 * The time after which no more than a share of the step is left, by halving.
 *
 * @param share > 0.
 * @returns s, to rounding; 0 from a share of 1.
 * Source: as `reservoirDecays`; elementary.
 * @example 1e9 * reservoirSettlingTime({ source: 49.9, reservoir: 560e-12, switchResistance: 200, capacitance: 30e-12 }, 9.464706e-5) // 200
 */
export function reservoirSettlingTime(network: ReservoirNetwork, share: number): number {
  if (!(share > 0)) throw new RangeError(`What may be left of a step must be above 0, not ${share}.`);
  const [slow, fast] = reservoirDecays(network);
  const left = (seconds: number): number => remaining(slow, seconds) + remaining(fast, seconds);
  if (left(0) <= share) return 0;
  // Were everything to fall as slowly as the slow part, this would do.
  let [early, late] = [0, Math.max(slow.timeConstant, fast.timeConstant) * Math.max(0, -Math.log(share))];
  for (;;) {
    const middle = early + 0.5 * (late - early);
    if (middle <= early || middle >= late) return late;
    if (left(middle) > share) early = middle;
    else late = middle;
  }
}

function remaining({ weight, timeConstant }: Decay, seconds: number): number {
  return timeConstant === 0 ? 0 : weight * Math.exp(-seconds / timeConstant);
}

function gone(weight: number): Decay {
  return { weight, timeConstant: 0 };
}

function checkNetwork({ source, reservoir, switchResistance, capacitance }: ReservoirNetwork): void {
  if (!(reservoir > 0 && capacitance > 0)) throw new RangeError('Both capacitances must be above 0 F.');
  if (!(source >= 0 && switchResistance >= 0)) throw new RangeError('Both resistances must be 0 Ω or more.');
}
