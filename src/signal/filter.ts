/** A rational analogue filter given by its poles and zeros, and what follows from them: magnitude with proved bounds, phase and group delay. */
import type { Response } from './response';

/** A pole or zero in Hz: s = 2π·(re + j·im); of a conjugate pair both are listed. */
export interface Root {
  readonly re: number;
  readonly im: number;
}

/** A filter by its roots and its gain at one frequency; never by polynomial coefficients. */
export interface Filter {
  readonly poles: readonly Root[];
  readonly zeros: readonly Root[];
  /** |H| at one frequency in Hz; fixes the constant. */
  readonly gainAt: { readonly frequencyHz: number; readonly gain: number };
  /** Every frequency above 0 Hz where |H| turns between rising and falling, ascending, where the family knows them; null where it does not. */
  readonly turnsHz: readonly number[] | null;
}

export function filterResponse(filter: Filter): Response {
  throw new RangeError(`not yet ${String(filter.poles.length)}`);
}
export function phaseRad(filter: Filter, frequencyHz: number): number {
  throw new RangeError(`not yet ${String(filter.poles.length)} ${String(frequencyHz)}`);
}
/** In seconds. */
export function groupDelay(filter: Filter, frequencyHz: number): number {
  throw new RangeError(`not yet ${String(filter.poles.length)} ${String(frequencyHz)}`);
}
