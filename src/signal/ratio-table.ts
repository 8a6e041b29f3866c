/** Section ratios laid out in one row of numbers each, so that a product over a million frequencies is one plain loop without branches. */
import type { SectionRatio } from './section-ratio';
import type { Section } from './sections';

/** Numbers a row: five of the zero section, five of the pole section, and the norm. */
const rowLength = 11;

/** From here on squares of squares overflow. */
const highestHz = 1e70;

/** Beyond this, either way, a product may have lost digits on its way. */
const largest = 1e250;

/** Every section as (t + near)·(t·both + far) + width with t = (f − im)·(f + im); the numbers in this order. */
type Row = readonly [im: number, near: number, both: 0 | 1, far: number, width: number];

/**
 * The ratios as a table.
 *
 * @example ratioTable([]).length // 0
 */
export function ratioTable(ratios: readonly SectionRatio[]): Float64Array {
  return Float64Array.from(ratios.flatMap(({ zero, pole, norm }) => [...rowOf(zero), ...rowOf(pole), norm]));
}

/**
 * ln of the product of a table's ratios.
 *
 * @param frequencyHz f ≥ 0.
 * @returns null where the product leaves the range of a double, at a null, and where f is too high for the table, at Infinity too: each
 * ratio must then be asked by itself.
 * Source: elementary; to the last digit what the ratios themselves give.
 * @example tableLogAt(ratioTable([sectionRatio(null, singleSection(-3))]), 3) // -0.693147181
 */
export function tableLogAt(table: Float64Array, frequencyHz: number): number | null {
  let product = 1;
  for (let at = 0; at < table.length; at += rowLength) {
    const zero = sectionAt(table, at, frequencyHz);
    const pole = sectionAt(table, at + 5, frequencyHz);
    product *= (zero / pole) * (table[at + 10] ?? NaN);
  }
  return product > 1 / largest && product < largest && frequencyHz < highestHz ? Math.log(product) : null;
}

function sectionAt(table: Float64Array, at: number, frequencyHz: number): number {
  const im = table[at] ?? NaN;
  const t = (frequencyHz - im) * (frequencyHz + im);
  return (t + (table[at + 1] ?? NaN)) * (t * (table[at + 2] ?? NaN) + (table[at + 3] ?? NaN)) + (table[at + 4] ?? NaN);
}

function rowOf(section: Section | null): Row {
  switch (section?.kind) {
    case undefined:
      return [0, 0, 0, 0, 1];
    case 'single':
      return [0, section.square, 0, 1, 0];
    case 'double':
      return [0, section.near, 1, section.far, 0];
    case 'pair': {
      const square = section.re * section.re;
      return [section.im, square, 1, square, section.width];
    }
  }
}
