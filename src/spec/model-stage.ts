/** A stage of an analogue path as the analysis takes it: its form in plain numbers, its gain and what of it may be off. */
import type { Tolerance } from '../units/quantity';

/** The filter families. */
export type Family = 'butterworth' | 'chebyshev' | 'inverse-chebyshev' | 'elliptic' | 'bessel' | 'legendre' | 'gaussian';

/** What a family filter lets through. */
export type FilterKind = 'lowpass' | 'highpass' | 'bandpass' | 'bandstop';

/** Which frequency of the filter its corner names. */
export type CornerAt = 'half-power' | 'ripple' | 'stopband' | 'delay';

/** A filter of a family. */
export interface FamilyForm {
  readonly kind: 'family';
  readonly family: Family;
  readonly filterKind: FilterKind;
  /** Of the low-pass that it is made from: a band-pass of order 3 has six poles. */
  readonly order: number;
  /** The corner; the lower one of a band-pass or band-stop. */
  readonly cornerHz: number;
  /** The upper corner of a band-pass or band-stop; null for the others. */
  readonly upperCornerHz: number | null;
  readonly cornerAt: CornerAt;
  /** Ripple of the pass band from peak to valley; null for families without. */
  readonly rippleDb: number | null;
  /** Least loss in the stop band; null for families without. */
  readonly attenuationDb: number | null;
}

/** One section by its natural frequency and Q; a band-pass has gain 1 at its centre, the others in their pass band. */
export interface SecondOrderForm {
  readonly kind: 'second-order';
  readonly sectionKind: 'lowpass' | 'highpass' | 'bandpass' | 'notch' | 'allpass';
  readonly frequencyHz: number;
  readonly q: number;
}

/** A pole or a zero in Hz: s is 2π times it. Both of a conjugate pair are listed. */
export interface RootHz {
  readonly re: number;
  readonly im: number;
}

/** A filter by its roots. */
export interface RootsForm {
  readonly kind: 'roots';
  readonly poles: readonly RootHz[];
  readonly zeros: readonly RootHz[];
  /** The stage's gain at `gainAtHz`, linear. */
  readonly gain: number;
  readonly gainAtHz: number;
}

/** A measured response: straight in dB and unwrapped phase over frequency, between points that rise in frequency. */
export interface ResponseTable {
  readonly frequenciesHz: readonly number[];
  readonly gainsDb: readonly number[];
  /** Unwrapped; null where the table has no phase. */
  readonly phasesRad: readonly number[] | null;
}

/** A measured stage. */
export interface MeasuredForm {
  readonly kind: 'measured';
  /** The path as the spec names it. */
  readonly path: string;
  readonly table: ResponseTable;
  /** What holds below the table: its first value, or nothing that could be judged. */
  readonly below: 'hold' | 'refuse';
  /** What holds beyond it: the last value, that value falling (or rising) by a slope, or nothing that could be judged. */
  readonly beyond: 'hold' | 'refuse' | { readonly slopeDbPerDecade: number };
}

/** How a stage is given. */
export type StageForm =
  | FamilyForm
  | SecondOrderForm
  /** Series resistor, shunt capacitor. */
  | { readonly kind: 'rc'; readonly ohm: number; readonly farad: number }
  /** Series capacitor, shunt resistor. */
  | { readonly kind: 'cr'; readonly ohm: number; readonly farad: number }
  /** Series resistor and coil, shunt capacitor. */
  | { readonly kind: 'rlc'; readonly ohm: number; readonly henry: number; readonly farad: number }
  /** One real pole. */
  | { readonly kind: 'bandwidth'; readonly cornerHz: number }
  | RootsForm
  | MeasuredForm;

/** One part of a stage that is given in parts. */
export interface StagePart {
  /** Its key in the stage. */
  readonly part: 'r' | 'l' | 'c';
  /** In Ω, H or F. */
  readonly value: number;
  readonly tolerance: Tolerance;
}

/** One stage of the analogue path. */
export interface Stage {
  /** The stage's own name, or null. */
  readonly name: string | null;
  /** What messages call it: "stage 2", "pick-up guard, stage 2", or its name. */
  readonly label: string;
  readonly form: StageForm;
  /** What the form's own gain is multiplied by, linear: 1 unless `gain` stands in a family stage. */
  readonly gain: number;
  /** The parts of `rc`, `cr` and `rlc`; empty for the others. */
  readonly parts: readonly StagePart[];
  /**
   * Relative tolerance of the corner: the whole stage moves along the frequency axis. For `rc` and `cr` that of 1/(RC), so that their
   * parts need not be looked at; zero for `rlc`, whose parts each vary by themselves.
   */
  readonly cornerTolerance: Tolerance;
  /** Relative tolerance of the Q of each section; zero where none is given. */
  readonly qTolerance: Tolerance;
  /** Relative tolerance of the gain. */
  readonly gainTolerance: Tolerance;
}
