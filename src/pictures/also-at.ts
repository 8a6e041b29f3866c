/** Finds the shared definitions behind an item, so that a cursor among `filters`, `clocks`, `sources` or `masks` lights it too. */
import type { Item, PanelPicture } from '../protocol/picture';
import type { PlaceName } from '../protocol/position';
import { exists, spanOf } from '../spec';
import type { DefinedName, Place, Reading } from '../spec';

/** The picture with every item's further places. */
export function withSharedPlaces(picture: PanelPicture, reading: Reading): PanelPicture {
  const used = reading.names.filter((name) => name.users.includes(picture.channel));
  if (used.length === 0) return picture;
  const parts = used.flatMap((name) => partsOf(name, reading));
  const extended = (item: Item): Item => {
    const alsoAt = item.place === null ? [] : furtherPlaces(item.place, used, parts, reading);
    return alsoAt.length === 0 ? item : { ...item, alsoAt };
  };
  const sections = picture.sections.map((section) => ({
    ...section,
    plots: section.plots.map((plot) => ({ ...plot, items: plot.items.map(extended) })),
  }));
  return { ...picture, sections };
}

/** What the values of a channel's keys may name. */
const spaces: Readonly<Record<string, DefinedName['space']>> = {
  filter: 'filters',
  'input-filter': 'filters',
  'output-filter': 'filters',
  unwanted: 'sources',
  limits: 'masks',
};

/** Where just a name stands, its definition as a whole; where a part of a definition is meant, that part. */
function furtherPlaces(
  place: PlaceName,
  used: readonly DefinedName[],
  parts: readonly PlaceName[],
  reading: Reading,
): PlaceName[] {
  const head = String(place.path[0]);
  if (head === 'rate') return wholeOf(used.filter(({ space }) => space === 'clocks'));
  const own = spanOf(reading, place);
  const said = reading.text.slice(own.start, own.end).replace(/^(["'])(.*)\1$/u, '$2');
  const named = used.filter(({ space, name }) => space === spaces[head] && name === said);
  if (named.length > 0) return wholeOf(named);
  return parts.filter((part) => {
    const span = spanOf(reading, part);
    return span.start === own.start && span.end === own.end;
  });
}

function wholeOf(names: readonly DefinedName[]): PlaceName[] {
  return names.map(({ space, name }) => ({ channel: null, path: [space, name] }));
}

/** The stages of a shared filter or the segments of a shared mask, as far as they stand in the text. */
function partsOf({ space, name }: DefinedName, reading: Reading): PlaceName[] {
  if (space !== 'filters' && space !== 'masks') return [];
  const places: Place[] = [];
  for (let index = 0; ; index += 1) {
    const place = { channel: null, path: [space, name, index] };
    if (!exists(reading, place)) return places;
    places.push(place);
  }
}
