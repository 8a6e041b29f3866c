/** Noise that heat makes: in resistors, and frozen on sampling capacitors. */

/** Boltzmann's constant, J/K; exact since 2019. Source: the SI Brochure, 9th edition (BIPM, 2019). */
export const boltzmann = 1.380649e-23;

/** 0 °C in K. Source: the SI Brochure, 9th edition (BIPM, 2019). */
export const zeroCelsiusK = 273.15;

/** A capacitor that samples. */
export interface SamplingCapacitor {
  /** Of one side, F, > 0. */
  readonly capacitance: number;
  /** K, ≥ 0. */
  readonly temperatureK: number;
  /** Two of them sample a difference, which doubles the power. */
  readonly differential: boolean;
}

/**
 * The one-sided density of a resistor's noise voltage, squared: 4kTR in V²/Hz.
 *
 * @param resistance Ω, ≥ 0.
 * @param temperatureK K, ≥ 0.
 * @throws RangeError where either is negative or not finite.
 * Source: H. Nyquist, "Thermal agitation of electric charge in conductors", Physical Review 32 (1928) 110–113.
 * @example 1e9 * Math.sqrt(johnsonDensity(1000, 300)) // 4.07035478
 */
export function johnsonDensity(resistance: number, temperatureK: number): number {
  if (!(resistance >= 0 && resistance < Infinity)) throw new RangeError(`A resistance must be 0 Ω or more, not ${resistance}.`);
  checkTemperature(temperatureK);
  return 4 * boltzmann * temperatureK * resistance;
}

/**
 * The rms noise on a sampling capacitor: √(kT/C) in V, √(2kT/C) of a difference. The resistance it is charged through drops out.
 *
 * @throws RangeError where the capacitance is not above 0, or the temperature is negative.
 * Source: equipartition, kT/2 for each degree of freedom; common practice.
 * @example 1e6 * capacitorNoiseRms({ capacitance: 1e-12, temperatureK: 300, differential: false }) // 64.3579599
 */
export function capacitorNoiseRms({ capacitance, temperatureK, differential }: SamplingCapacitor): number {
  if (!(capacitance > 0 && capacitance < Infinity)) throw new RangeError(`A capacitance must be above 0 F, not ${capacitance}.`);
  checkTemperature(temperatureK);
  return Math.sqrt(((differential ? 2 : 1) * boltzmann * temperatureK) / capacitance);
}

function checkTemperature(temperatureK: number): void {
  if (!(temperatureK >= 0 && temperatureK < Infinity))
    throw new RangeError(`A temperature must be 0 K or more, not ${temperatureK}.`);
}
