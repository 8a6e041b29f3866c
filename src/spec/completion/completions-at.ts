/** Completion: walks the declaration along the path to the cursor and offers what could stand there. */
import { declaration } from '../declaration/top-level';
import { insideOf } from '../inside';
import type { Reading } from '../reading';
import type { Direction, NameSpace, Shape } from '../shape';
import { sliceAt } from '../slices/slice-at';
import type { MapNode } from '../tree';
import type { Completion } from './completion';
import { cursorPlaces, otherKeys } from './cursor-place';
import type { CursorPlace } from './cursor-place';
import { cursorText } from './cursor-text';
import type { CursorText } from './cursor-text';
import { keyOffers, shapeAt, stageOffer, valueOffers } from './offers';
import type { Offer } from './offers';
import { stageNames } from './stage-names';

/** What could be written at an offset of a reading's text; keys that stand already and what is not computed yet are left out. */
export function completionsAt(reading: Reading, offset: number): readonly Completion[] {
  const cursor = cursorText(reading.text, offset);
  if (cursor === null) return [];
  const found = offersAt(reading, cursor);
  return found.map(({ text, ...offer }) => ({ ...offer, newText: written(offer.kind, text, cursor), span: cursor.span }));
}

function written(kind: Offer['kind'], text: string, cursor: CursorText): string {
  return `${cursor.gap}${text}${kind === 'key' && !cursor.hasColon ? ': ' : ''}`;
}

function offersAt(reading: Reading, cursor: CursorText): readonly Offer[] {
  const atTop = cursor.stands === 'line-start' && cursor.span.start === lineStartOf(reading.text, cursor.span.start);
  if (atTop) return topOffers(reading);
  const placed = sliceAt(insideOf(reading).slices, cursor.span.start);
  if (placed === null) return [];
  const seen = new Set<string>();
  const offers = cursorPlaces(placed.slice, cursor).flatMap((place) => offersIn(reading, place));
  return offers.filter(({ kind, label }) => !seen.has(`${kind} ${label}`) && seen.add(`${kind} ${label}`));
}

const lineStartOf = (text: string, offset: number) => text.lastIndexOf('\n', offset - 1) + 1;

function topOffers(reading: Reading): readonly Offer[] {
  const present = insideOf(reading)
    .slices.filter(({ slice }) => slice.kind === 'top')
    .flatMap(({ reading: slice }) => slice.pairs.map(({ key }) => key));
  const { map } = declaration;
  return map !== undefined && 'fields' in map ? keyOffers(map, present, [], null) : [];
}

function offersIn(reading: Reading, place: CursorPlace): readonly Offer[] {
  const shape: Shape<unknown> | null = shapeAt(declaration, place.path);
  if (shape === null) return [];
  if (place.as === 'value') {
    const [section, self] = place.path;
    const offers = valueOffers(shape.scalar, (space) =>
      namesOf(reading, space).filter((name) => !(section === space && name === self)),
    );
    return place.path.at(-1) === 'enters' ? [...offers, ...stageNames(reading, place.channel).map(stageOffer)] : offers;
  }
  const { map } = shape;
  if (place.map === null || map === undefined || !('fields' in map)) return [];
  return keyOffers(map, otherKeys(place.map), wordsOf(place.map), place.channel && directionOf(reading, place));
}

/** Names of a space, in the order of the file. */
function namesOf(reading: Reading, space: NameSpace): readonly string[] {
  return insideOf(reading).lists[space];
}

const wordsOf = (map: MapNode) => map.pairs.flatMap(({ value }) => (value?.form === 'scalar' ? [value.text] : []));

function directionOf(reading: Reading, { channel, path }: CursorPlace): Direction | null {
  const own = channel?.pairs.find(({ key }) => key === 'direction')?.value;
  if (own?.form === 'scalar' && (own.text === 'capture' || own.text === 'generate' || own.text === 'relay')) return own.text;
  return reading.entries.find(({ name }) => name === path[1])?.direction ?? null;
}
