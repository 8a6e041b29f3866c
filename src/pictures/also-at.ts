/** Finds the shared definitions behind an item, so that a cursor among `filters` or `clocks` lights it too. */
import type { Item, PanelPicture } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { exists, spanOf } from '../spec';
import type { DefinedName, Place, Reading } from '../spec';

/** The picture with every item's further places. */
export function withSharedPlaces(picture: PanelPicture, reading: Reading): PanelPicture {
  const used = reading.names.filter((name) => name.users.includes(picture.channel));
  if (used.length === 0) return picture;
  const shared = used.flatMap((name) => placesOf(name, reading));
  const extended = (item: Item): Item => {
    const alsoAt = item.place === null ? [] : furtherPlaces(item.place, used, shared, reading);
    return alsoAt.length === 0 ? item : { ...item, alsoAt };
  };
  const sections = picture.sections.map((section) => ({
    ...section,
    plots: section.plots.map((plot) => ({ ...plot, items: plot.items.map(extended) })),
  }));
  return { ...picture, sections };
}

/** A filter as a whole stands for all it names; a stage of it only for its own lines. */
function furtherPlaces(
  place: PlaceName,
  used: readonly DefinedName[],
  shared: readonly PlaceName[],
  reading: Reading,
): PlaceName[] {
  const [head] = place.path;
  if (place.path.length === 1) {
    const space = head === 'filter' ? 'filters' : head === 'rate' ? 'clocks' : null;
    return used.filter((name) => name.space === space).map((name) => ({ channel: null, path: [name.space, name.name] }));
  }
  if (head !== 'filter') return [];
  const own = spanOf(reading, place);
  return shared.filter((other) => {
    const span = spanOf(reading, other);
    return span.start === own.start && span.end === own.end;
  });
}

/** The stages of a shared filter, as far as they stand in the text. */
function placesOf({ space, name }: DefinedName, reading: Reading): PlaceName[] {
  if (space !== 'filters') return [];
  const places: Place[] = [];
  for (let index = 0; ; index += 1) {
    const place = { channel: null, path: [space, name, index] };
    if (!exists(reading, place)) return places;
    places.push(place);
  }
}
