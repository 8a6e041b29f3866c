/** Builds items and series with as little ceremony as their meaning needs. */
import type { Item, Points, Series } from '../protocol/picture';

/** An item as its section states it; what is left out is empty. */
export type ItemParts = Pick<Item, 'id' | 'series' | 'pane' | 'role' | 'name' | 'words' | 'shapes'> &
  Partial<Pick<Item, 'place' | 'joins' | 'label'>>;

/** A whole item. */
export function item(parts: ItemParts): Item {
  return { place: null, joins: [], label: null, ...parts };
}

/** The series that some items make up, in the order in which they come; each takes the looks of its first item. */
export function seriesOf(items: readonly Item[], names: ReadonlyMap<string, string>): Series[] {
  const found = new Map<string, Series>();
  for (const { series, role, place, name } of items) {
    if (!found.has(series)) found.set(series, { id: series, name: names.get(series) ?? name, role, place });
  }
  return [...found.values()];
}

/** A level line over a stretch. */
export function flat(lowHz: number, highHz: number, level: number): Points {
  return { x: [lowHz, highHz], y: [level, level] };
}

/** The items with every join made to go both ways. */
export function joinedBothWays(items: readonly Item[]): Item[] {
  const ids = new Set(items.map(({ id }) => id));
  return items.map((one) => {
    const back = items.filter((other) => other.joins.includes(one.id)).map(({ id }) => id);
    return { ...one, joins: [...new Set([...one.joins, ...back])].filter((id) => ids.has(id) && id !== one.id) };
  });
}
