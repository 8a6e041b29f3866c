/** Which items belong to the line that the cursor is in. */
import type { Item } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';

/** The ids of the items whose place is the cursor's own, the nearest around it, or else below it. */
export function itemsAt(items: readonly Item[], place: PlaceName | null): readonly string[] {
  if (place === null) return [];
  const placed = items.flatMap((item) =>
    placesOf(item).flatMap(({ channel, path }) => (channel === place.channel ? [{ id: item.id, path }] : [])),
  );
  const around = placed.filter(({ path }) => path.length > 0 && startsWith(place.path, path));
  const deepest = Math.max(0, ...around.map(({ path }) => path.length));
  if (deepest > 0) return around.filter(({ path }) => path.length === deepest).map(({ id }) => id);
  return place.path.length === 0 ? [] : placed.filter(({ path }) => startsWith(path, place.path)).map(({ id }) => id);
}

function placesOf(item: Item): readonly PlaceName[] {
  return [...(item.place === null ? [] : [item.place]), ...(item.alsoAt ?? [])];
}

function startsWith(path: PlaceName['path'], start: PlaceName['path']): boolean {
  return start.length <= path.length && start.every((step, index) => path[index] === step);
}
