/** The preferred values E12 and E24 of IEC 60063, and the neighbours of a value among them. */

/**
 * E24 in whole numbers from 10 to 91; E12 is every second of it. Eight of them are not the rounded powers of 10^(1/24).
 * Source: IEC 60063, "Preferred number series for resistors and capacitors", from memory.
 */
const e24: readonly number[] = [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91];
const e12: readonly number[] = e24.filter((_, index) => index % 2 === 0);

/** The values of one decade. */
export type Series = readonly number[];

/** E24 for a value that only E24 has, else E12, whose parts are the easier to find. */
export function seriesOf(value: number): Series {
  const mantissa = decadeOf(value).mantissa;
  const has = (series: Series): boolean => series.some((member) => Math.abs(member - mantissa) < 1e-6 * member);
  return has(e24) && !has(e12) ? e24 : e12;
}

/** The preferred value so many steps above a value, or below it for negative steps; the value itself need not be preferred. */
export function neighbour(series: Series, value: number, steps: number): number {
  const { mantissa, exponent } = decadeOf(value);
  const isBelow = (member: number): boolean => member < mantissa * (1 - 1e-6);
  const isAbove = (member: number): boolean => member > mantissa * (1 + 1e-6);
  const start = steps > 0 ? firstOr(series.findIndex(isAbove), series.length) - 1 : series.filter(isBelow).length;
  const index = start + steps;
  const decade = Math.floor(index / series.length);
  return Number(`${series[index - decade * series.length] ?? 10}e${exponent + decade}`);
}

function firstOr(index: number, otherwise: number): number {
  return index < 0 ? otherwise : index;
}

/** A positive value as a number from 10 to just below 100 and a power of ten. */
function decadeOf(value: number): { readonly mantissa: number; readonly exponent: number } {
  const exponent = Math.floor(Math.log10(value) + 1e-9) - 1;
  return { mantissa: value / 10 ** exponent, exponent };
}
