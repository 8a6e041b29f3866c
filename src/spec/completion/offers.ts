/** What the declaration admits at a place: keys that do not stand yet, words, and names. */
import type { Direction, Fields, Key, NameSpace, Scalar, Shape } from '../shape';
import { scalarText } from '../scalar-text';

/** Something to offer, before it is known what it replaces. */
export interface Offer {
  readonly label: string;
  readonly kind: 'key' | 'word' | 'name';
  readonly about: string;
  readonly text: string;
  readonly key: Key | null;
  readonly required: boolean;
}

/** The shape at a path below another; null where the path leads nowhere. */
export function shapeAt(shape: Shape<unknown>, path: readonly (string | number)[]): Shape<unknown> | null {
  let at: Shape<unknown> | null = shape;
  for (const step of path) {
    if (at === null) return null;
    at = typeof step === 'number' ? (at.list?.each ?? null) : below(at, step);
  }
  return at;
}

function below({ map }: Shape<unknown>, key: string): Shape<unknown> | null {
  if (map === undefined) return null;
  if (!('fields' in map)) return map.each;
  return Object.hasOwn(map.fields, key) ? (map.fields[key]?.shape ?? null) : null;
}

/** The keys that could be added to a map that has `present`; `words` are its values, which decide what goes with what. */
export function keyOffers(
  map: Fields,
  present: readonly string[],
  words: readonly string[],
  direction: Direction | null,
): readonly Offer[] {
  const company = new Set([...present, ...words]);
  const decided = map.decidedBy?.some((name) => company.has(name)) ?? false;
  const fits = ([name, key]: readonly [string, Key]) =>
    key.later !== true &&
    !present.includes(name) &&
    (direction === null || (key.only?.includes(direction) ?? true)) &&
    !(decided && map.decidedBy?.includes(name) === true) &&
    (key.with?.some((other) => company.has(other)) ?? true) &&
    !(key.notWith?.some((other) => company.has(other)) ?? false);
  return Object.entries(map.fields)
    .filter(fits)
    .map(([name, key]) => ({ label: name, kind: 'key', about: aboutKey(key), text: name, key, required: key.required === true }));
}

function aboutKey({ about, fallback }: Key): string {
  return fallback === undefined ? about : `${about} Default: ${fallback}.`;
}

/** The words and names that a scalar may be. */
export function valueOffers(scalar: Scalar | undefined, names: (space: NameSpace) => readonly string[]): readonly Offer[] {
  const words = Object.entries(scalar?.words ?? {}).map(([word, about]) => ({
    label: word,
    kind: 'word' as const,
    about,
    text: word,
    key: null,
    required: false,
  }));
  const space = scalar?.name;
  const named = space === undefined ? [] : names(space).map((name) => nameOffer(name, space));
  return [...named, ...words];
}

const nameOffer = (name: string, space: NameSpace): Offer => ({
  label: name,
  kind: 'name',
  about: `From \`${space}\`.`,
  text: scalarText(name),
  key: null,
  required: false,
});

/** The name of a stage, where a source enters. */
export function stageOffer(name: string): Offer {
  const about = 'In front of this stage.';
  return { label: name, kind: 'name', about, text: scalarText(name), key: null, required: false };
}
