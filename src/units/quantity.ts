/** What a physical value in a spec is made of, once it has been read: a number in the base unit of its kind, and the unit it was written in. */

/** The kinds of quantity that a place in a spec may ask for. */
export type Kind =
  | 'frequency'
  /** A frequency that counts samples: Hz or S/s. */
  | 'sample-rate'
  | 'time'
  | 'voltage'
  /** A level against full scale, or one that full scale (and an impedance) turns into it: dBFS, volts, dBV, dBu, dBm. */
  | 'level'
  /** dBFS alone. */
  | 'full-scale-level'
  /** dBc alone. */
  | 'relative-level'
  /** dB alone. */
  | 'decibel'
  | 'ratio'
  /** % or ppm alone. */
  | 'share'
  | 'density'
  /** How a level falls with frequency: dB/decade. */
  | 'slope'
  | 'code'
  | 'resistance'
  | 'capacitance'
  | 'inductance'
  | 'angle'
  | 'temperature';

/** Units without their SI prefix, as `Quantity.unit` names them; `V` alone is not yet rms or peak-to-peak: the key decides. */
export type Unit =
  | 'Hz'
  | 'S/s'
  | 's'
  | 'V'
  | 'Vrms'
  | 'Vpk'
  | 'Vpp'
  | 'dBFS'
  | 'dBc'
  | 'dBV'
  | 'dBu'
  | 'dBm'
  | 'dB'
  | 'V/V'
  | '%'
  | 'ppm'
  | 'V/√Hz'
  | 'dBFS/√Hz'
  | 'dBm/Hz'
  | 'dB/decade'
  | 'LSB'
  | 'Ω'
  | 'F'
  | 'H'
  | 'deg'
  | '°C';

/** A tolerance as relative deviations: ± 5 % is { low: −0.05, high: 0.05 }. */
export interface Tolerance {
  /** Relative, ≤ 0. */
  readonly low: number;
  /** Relative, ≥ 0. */
  readonly high: number;
  /** Relative change per kelvin, either way; absent where none was written. */
  readonly perKelvin?: number;
}

/** One physical value. */
export interface Quantity {
  /** In the base unit named by `unit`: Hz, s, V, Ω, F, H; dB units in dB; % and ppm as a plain ratio (5 % is 0.05). */
  readonly value: number;
  readonly unit: Unit;
  readonly tolerance?: Tolerance;
}

/** LOW .. HIGH, ends inclusive; an end that was left out is −Infinity or +Infinity. */
export interface QuantityRange {
  readonly low: Quantity;
  readonly high: Quantity;
}
