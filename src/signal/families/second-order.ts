/** One second-order section by its natural frequency and Q. */
import type { Filter } from '../filter';
import type { Root } from '../sections';
import { checkFamily } from './low-pass';

/** What the section lets pass. */
export type SecondOrderKind = 'lowpass' | 'highpass' | 'bandpass' | 'notch' | 'allpass';

/**
 * A section over s² + s·ω₀/Q + ω₀², with the numerator ω₀² (lowpass), s² (highpass), s·ω₀/Q (bandpass), s² + ω₀² (notch) or
 * s² − s·ω₀/Q + ω₀² (allpass).
 *
 * @param frequencyHz natural frequency, > 0: the middle of a bandpass, the null of a notch.
 * @param q > 0; at ½ and below both poles are real.
 * @returns gain 1 at 0 Hz (lowpass, notch, allpass), at infinity (highpass) or in the middle (bandpass).
 * Source: common practice.
 * @example Math.exp(filterResponse(secondOrder('lowpass', 1000, 5)).logGain(1000)) // 5
 */
export function secondOrder(kind: SecondOrderKind, frequencyHz: number, q: number): Filter {
  checkFamily(2, frequencyHz);
  if (!(q > 0) || !Number.isFinite(q)) throw new RangeError(`A Q must be above 0, not ${q}.`);
  const poles = resonance(frequencyHz, q);
  return {
    poles,
    zeros: zerosOf(kind, frequencyHz, poles),
    gainAt: { frequencyHz: { lowpass: 0, notch: 0, allpass: 0, highpass: Infinity, bandpass: frequencyHz }[kind], gain: 1 },
    turnsHz: turnsOf(kind, frequencyHz, q),
  };
}

/** Of two real poles the smaller comes from their product, because subtracting would lose its digits. */
function resonance(frequencyHz: number, q: number): readonly [Root, Root] {
  const re = (-0.5 * frequencyHz) / q;
  const share = (1 - 2 * q) * (1 + 2 * q);
  if (share < 0) {
    const im = -re * Math.sqrt(-share);
    return [
      { re, im },
      { re, im: -im },
    ];
  }
  const larger = re * (1 + Math.sqrt(share));
  return [
    { re: larger, im: 0 },
    { re: (frequencyHz / larger) * frequencyHz, im: 0 },
  ];
}

function zerosOf(kind: SecondOrderKind, frequencyHz: number, poles: readonly Root[]): readonly Root[] {
  const origin: Root = { re: 0, im: 0 };
  switch (kind) {
    case 'lowpass':
      return [];
    case 'highpass':
      return [origin, origin];
    case 'bandpass':
      return [origin];
    case 'notch':
      return [
        { re: 0, im: frequencyHz },
        { re: 0, im: -frequencyHz },
      ];
    case 'allpass':
      return poles.map(({ re, im }) => ({ re: -re, im }));
  }
}

function turnsOf(kind: SecondOrderKind, frequencyHz: number, q: number): readonly number[] {
  if (kind === 'allpass') return [];
  if (kind === 'bandpass' || kind === 'notch') return [frequencyHz];
  // Only above Q = 1/√2 the section peaks, at ω₀·√(1 − 1/(2Q²)) or its mirror image.
  const square = 1 - 0.5 / (q * q);
  if (!(square > 0)) return [];
  return [kind === 'lowpass' ? frequencyHz * Math.sqrt(square) : frequencyHz / Math.sqrt(square)];
}
