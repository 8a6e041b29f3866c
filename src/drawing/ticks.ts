/** Where the marks of an axis stand and what they say: round numbers, few enough to stay apart. */
import type { AxisScale } from './axis-scale';
import { toPixel } from './axis-scale';

/** A mark of an axis; one without text is minor. */
export interface Tick {
  readonly value: number;
  readonly text: string;
}

/** Marks of a frequency axis: decades (with 2 and 5, or the minor ones between, as room allows), or round linear steps. */
export function frequencyTicks(scale: AxisScale): Tick[] {
  const decades = Math.log10(scale.high / scale.low);
  if (scale.kind === 'linear' || decades < 0.7)
    return linearTicks(scale, 92).map((value) => ({ value, text: frequencyText(value) }));
  return logarithmicTicks(scale, decades);
}

/** Marks of a level axis. */
export function levelTicks(scale: AxisScale): Tick[] {
  const values = linearTicks(scale, 34, levelFactors);
  const step = values.length > 1 ? (values[1] ?? 0) - (values[0] ?? 0) : 1;
  const decimals = Math.max(0, Math.ceil(-Math.log10(Math.abs(step)) - 1e-9));
  return values.map((value) => ({ value, text: signedText(value, decimals) }));
}

/** A frequency as short as a tick allows: "10 k", "1.5 M", with a space that does not break. */
export function frequencyText(hz: number): string {
  const [divisor, prefix] = prefixes.find(([least]) => Math.abs(hz) >= least * 0.9999) ?? [1, ''];
  const digits = Number((hz / divisor).toPrecision(6))
    .toString()
    .replace('-', '−');
  return prefix === '' ? digits : `${digits}\u00a0${prefix}`;
}

const prefixes: readonly (readonly [number, string])[] = [
  [1e9, 'G'],
  [1e6, 'M'],
  [1e3, 'k'],
];

function signedText(value: number, decimals: number): string {
  const rounded = Number(value.toFixed(decimals));
  return `${rounded < 0 ? '−' : ''}${Math.abs(rounded).toFixed(decimals)}`;
}

/** Decibels are read in steps of 1, 2, 4 (20, 40 …) or 5; frequencies in 1, 2 and 5. */
const levelFactors = [1, 2, 4, 5, 10];
const plainFactors = [1, 2, 5, 10];

function linearTicks(scale: AxisScale, pixelsApart: number, factors: readonly number[] = plainFactors): number[] {
  const room = Math.max(1, Math.abs(scale.to - scale.from) / pixelsApart);
  const step = roundStep((scale.high - scale.low) / room, factors);
  const first = Math.ceil(scale.low / step - 1e-9);
  const last = Math.floor(scale.high / step + 1e-9);
  return Array.from({ length: Math.max(0, last - first + 1) }, (_, index) => (first + index) * step);
}

/** The next step, a factor times a power of ten, that is not below the given one. */
function roundStep(least: number, factors: readonly number[]): number {
  const power = 10 ** Math.floor(Math.log10(least));
  const factor = factors.find((candidate) => candidate * power >= least * (1 - 1e-9)) ?? 10;
  return factor * power;
}

function logarithmicTicks(scale: AxisScale, decades: number): Tick[] {
  const pixelsADecade = Math.abs(scale.to - scale.from) / decades;
  const every = Math.max(1, Math.ceil(52 / pixelsADecade));
  const spoken = pixelsADecade > 210 ? [1, 2, 5] : [1];
  const ticks: Tick[] = [];
  for (let power = Math.floor(Math.log10(scale.low)); power <= Math.ceil(Math.log10(scale.high)); power += 1) {
    for (let digit = 1; digit <= 9; digit += 1) {
      const value = digit * 10 ** power;
      if (value < scale.low * (1 - 1e-9) || value > scale.high * (1 + 1e-9)) continue;
      const named = spoken.includes(digit) && power % every === 0;
      if (named || pixelsADecade > 40) ticks.push({ value, text: named ? frequencyText(value) : '' });
    }
  }
  return ticks;
}

/** The ticks whose texts do not touch, given the width of a text. */
export function withoutCollisions(ticks: readonly Tick[], scale: AxisScale, widthOf: (text: string) => number): Tick[] {
  let free = -Infinity;
  return ticks.map((tick) => {
    const half = widthOf(tick.text) / 2;
    const middle = toPixel(scale, tick.value);
    if (tick.text === '' || middle - half < free) return { value: tick.value, text: '' };
    free = middle + half + 8;
    return tick;
  });
}
