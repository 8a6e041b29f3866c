/** Which parts of the paper carry ink, in coarse cells, so that labels can keep off curves. */
import type { Box, Step } from './primitive';

/** Side of a cell in pixels. */
const cell = 5;

/** Cells per row of the key; more than any paper has. */
const row = 65536;

/** The inked cells of a drawing. */
export interface Occupancy {
  /** Takes in every cell that a line passes. */
  readonly add: (steps: readonly Step[]) => void;
  /** How many inked cells a box covers. */
  readonly under: (box: Box) => number;
}

/** An empty drawing. */
export function createOccupancy(): Occupancy {
  const cells = new Set<number>();
  const mark = (x: number, y: number): void => {
    if (x >= 0 && y >= 0 && x < row) cells.add(Math.floor(y / cell) * row + Math.floor(x / cell));
  };
  return {
    add: (steps) => {
      walk(steps, mark);
    },
    under: (box) => {
      let count = 0;
      for (let y = Math.floor(box.top / cell); y * cell < box.bottom; y += 1) {
        for (let x = Math.floor(box.left / cell); x * cell < box.right; x += 1) if (cells.has(y * row + x)) count += 1;
      }
      return count;
    },
  };
}

/** Longest walk along one segment, so that a line far off the paper costs no time. */
const mostStops = 600;

function walk(steps: readonly Step[], mark: (x: number, y: number) => void): void {
  let [fromX, fromY] = [0, 0];
  for (const step of steps) {
    if (step[0] === 'Z') continue;
    const x = step[step.length - 2] as number;
    const y = step[step.length - 1] as number;
    const stops = step[0] === 'M' ? 1 : Math.min(mostStops, Math.ceil(Math.hypot(x - fromX, y - fromY) / cell) + 1);
    for (let stop = 1; stop <= stops; stop += 1) mark(fromX + ((x - fromX) * stop) / stops, fromY + ((y - fromY) * stop) / stops);
    [fromX, fromY] = [x, y];
  }
}
