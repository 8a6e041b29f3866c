/** Numbers of four significant figures, counted: a value that may be anything is searched for, and written, on this grid. */

/** Values in each decade. */
const inDecade = 9000;

/** Where a positive number stands on the grid; a whole number for one of four figures. */
export function toGrid(value: number): number {
  const decade = Math.floor(Math.log10(value));
  const index = decade * inDecade + value / 10 ** (decade - 3) - 1000;
  return Math.abs(index - Math.round(index)) < 1e-6 ? Math.round(index) : index;
}

/** The number at a whole number of the grid. */
export function fromGrid(index: number): number {
  const decade = Math.floor(index / inDecade);
  return Number(`${index - decade * inDecade + 1000}e${decade - 3}`);
}

/** The first value of so many figures at or beyond an index, in a direction. */
export function roundedTowards(index: number, direction: 1 | -1, digits: 2 | 3): number {
  const decade = Math.floor(index / inDecade);
  const step = 10 ** (4 - digits);
  const steps = (index - decade * inDecade) / step;
  return decade * inDecade + (direction > 0 ? Math.ceil(steps) : Math.floor(steps)) * step;
}
