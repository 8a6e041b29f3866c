/** Section ratios laid out in one row of numbers each, so that a product over a million frequencies is one plain loop without branches. */
import type { SectionRatio } from './section-ratio';
import type { Section } from './sections';

/** Numbers a row: five of the zero section, five of the pole section, and the norm. */
const rowLength = 11;

/** From here on squares of squares overflow. */
const highestHz = 1e70;

/** Beyond this, either way, a product may have lost digits on its way. */
const largest = 1e250;

/**
 * The ratios as a table.
 *
 * @example ratioTable([]).length // 0
 */
export function ratioTable(ratios: readonly SectionRatio[]): Float64Array {
  const table = new Float64Array(ratios.length * rowLength);
  ratios.forEach(({ zero, pole, norm }, index) => {
    fill(table, index * rowLength, zero);
    fill(table, index * rowLength + 5, pole);
    table[index * rowLength + 10] = norm;
  });
  return table;
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

/** A section as (t + near)·(t·both + far) + width with t = (f − im)·(f + im): im, near, both, far, width, those that are 0 left alone. */
function fill(table: Float64Array, at: number, section: Section | null): void {
  switch (section?.kind) {
    case undefined:
      table[at + 4] = 1;
      return;
    case 'single':
      table[at + 1] = section.square;
      table[at + 3] = 1;
      return;
    case 'double':
      table[at + 1] = section.near;
      table[at + 2] = 1;
      table[at + 3] = section.far;
      return;
    case 'pair':
      table[at] = section.im;
      table[at + 1] = section.re * section.re;
      table[at + 2] = 1;
      table[at + 3] = section.re * section.re;
      table[at + 4] = section.width;
  }
}
