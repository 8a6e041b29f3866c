/** Levels that are nothing, or without limit, as a picture can draw them: at the edge of their pane. */
import type { Item, LevelAxis, Plot, Points, Section, Shape } from '../protocol/picture';

/** The section with every level a number: what a null leaves stands at the bottom of its pane, what has no limit at its top. */
export function withFiniteLevels(section: Section): Section {
  return { ...section, plots: section.plots.map(finitePlot) };
}

function finitePlot(plot: Plot): Plot {
  const axes = new Map(plot.panes.map((pane) => [pane.id, pane.y]));
  return {
    ...plot,
    items: plot.items.map((item) => {
      const axis = axes.get(item.pane);
      return axis === undefined ? item : finiteItem(item, axis);
    }),
  };
}

function finiteItem(item: Item, axis: LevelAxis): Item {
  const { label } = item;
  return {
    ...item,
    shapes: item.shapes.map((shape) => finiteShape(shape, axis)),
    label: label === null ? null : { ...label, level: finite(label.level, axis) },
  };
}

function finiteShape(shape: Shape, axis: LevelAxis): Shape {
  switch (shape.kind) {
    case 'curve':
      return { ...shape, points: finitePoints(shape.points, axis) };
    case 'area':
      return {
        ...shape,
        upper: finitePoints(shape.upper, axis),
        lower: shape.lower === null ? null : finitePoints(shape.lower, axis),
      };
    case 'block':
    case 'stem':
      return { ...shape, top: finite(shape.top, axis) };
    case 'forbidden':
      return { ...shape, boundary: finitePoints(shape.boundary, axis) };
    case 'mark':
      return { ...shape, level: finite(shape.level, axis) };
    case 'rule':
    case 'ribbon':
      return shape;
  }
}

function finitePoints(points: Points, axis: LevelAxis): Points {
  return points.y.every(Number.isFinite) ? points : { ...points, y: points.y.map((level) => finite(level, axis)) };
}

function finite(level: number, { low, high }: LevelAxis): number {
  return Number.isFinite(level) ? level : level > 0 ? high : low;
}
