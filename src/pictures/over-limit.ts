/** The parts of a curve that stand above a limit within a range, cut where the straight pieces between its points cross. */
import type { Enclosure } from '../analysis';
import type { Points } from '../protocol/picture';

/** Each connected part, from crossing to crossing, with the limit along it. */
export function overLimit(
  points: Points,
  limitAt: (x: number) => number,
  range: Enclosure,
): { readonly upper: Points; readonly lower: Points }[] {
  const inside = points.x.flatMap((x, index): Excess[] =>
    x >= range.low && x <= range.high ? [{ x, y: points.y[index] ?? 0, over: (points.y[index] ?? 0) - limitAt(x) }] : [],
  );
  const withCrossings = inside.flatMap((point, index): Excess[] => {
    const before = inside[index - 1];
    return before === undefined || before.over > 0 === point.over > 0 ? [point] : [crossing(before, point), point];
  });
  const parts: Excess[][] = [];
  let open: Excess[] = [];
  for (const point of withCrossings) {
    if (point.over < 0) open = [];
    else {
      if (open.length === 0) parts.push(open);
      open.push(point);
    }
  }
  return parts.filter(isVisible).map((part) => ({
    upper: { x: part.map(({ x }) => x), y: part.map(({ y }) => y) },
    lower: { x: part.map(({ x }) => x), y: part.map(({ y, over }) => y - over) },
  }));
}

interface Excess {
  readonly x: number;
  readonly y: number;
  readonly over: number;
}

function crossing(a: Excess, b: Excess): Excess {
  const share = a.over / (a.over - b.over);
  return { x: a.x + share * (b.x - a.x), y: a.y + share * (b.y - a.y), over: 0 };
}

function isVisible(part: readonly Excess[]): boolean {
  return part.some(({ over }) => over > 0) && (part[part.length - 1]?.x ?? 0) > (part[0]?.x ?? 0);
}
