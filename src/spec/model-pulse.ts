/** Pulses, gates and time slots as the analysis takes them. */

/** A length of time: absolute, or a share of the sampling period. */
export type PulseWidth = { readonly seconds: number } | { readonly share: number };

/** The pulse of an aperture, a hold or a gate. `zero-order` is a rectangle of share 1; `linear` a triangle of base 2T, with straight lines from sample to sample. */
export type Pulse =
  | { readonly shape: 'instant' }
  | { readonly shape: 'linear' }
  | { readonly shape: 'rectangle' | 'triangle' | 'half-sine' | 'split'; readonly width: PulseWidth }
  /** `edge`: the length of each of the two edges, within `width`. */
  | { readonly shape: 'raised-cosine' | 'trapezoid'; readonly width: PulseWidth; readonly edge: PulseWidth }
  /** `decay`: the time constant; cut off at `width`. */
  | { readonly shape: 'exponential'; readonly width: PulseWidth; readonly decay: PulseWidth };

/** How a relay channel samples while it follows its input: a pulse that scales each copy, or track and hold. */
export type Gate = { readonly kind: 'pulse'; readonly pulse: Pulse } | { readonly kind: 'track'; readonly track: PulseWidth };

/** Time slots that share a link. */
export interface Slots {
  readonly count: number;
  /** From the end of one pulse to the start of the next. */
  readonly guardSeconds: number;
  /** The corner of the first-order link. */
  readonly linkHz: number;
}
