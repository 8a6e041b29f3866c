/** The constructors that the declaration of the language is written with; the decoded types follow from them. */
import type { Kind, Quantity, QuantityRange } from '../units/quantity';
import type { RootPair } from '../units/read-root';
import type {
  Clash,
  Direction,
  Fields,
  Key,
  Model,
  Named,
  NameSpace,
  Prose,
  Scalar,
  Shape,
  TypeOf,
  UnitBounds,
  WholeRange,
} from './shape';

/** A physical value. */
export const quantity = (...kinds: readonly Kind[]): Shape<Quantity> => ({ scalar: { quantity: kinds } });

/** A physical value that may carry a tolerance. */
export const tolerated = (...kinds: readonly Kind[]): Shape<Quantity> => ({ scalar: { quantity: kinds, tolerance: true } });

/** `LOW .. HIGH` whose lower end may be left out. */
export const range = (...kinds: readonly Kind[]): Shape<QuantityRange> => ({ scalar: { range: kinds } });

/** `LOW .. HIGH` of which either end may be left out. */
export const endlessRange = (...kinds: readonly Kind[]): Shape<QuantityRange> => ({ scalar: { range: kinds, endless: true } });

/** The same shape with bounds of its own. */
export const within = <T>(shape: Shape<T>, bounds: UnitBounds): Shape<T> => ({ ...shape, scalar: { ...shape.scalar, bounds } });

/** One of a few words; `laterWords` are known but not computed yet. */
export const word = <const W extends string>(words: Readonly<Record<W, string>>, laterWords?: Prose): Shape<W> => ({
  scalar: laterWords === undefined ? { words } : { words, laterWords },
});

/** A name that is defined elsewhere in the file. */
export const nameOf = (space: NameSpace): Shape<Named> => ({ scalar: { name: space } });

/** A whole number. */
export const whole = (least: number, most: number): Shape<number> => ({ scalar: { whole: [least, most] } });

/** Whole numbers `A .. B`. */
export const wholeRange = (least: number, most: number): Shape<WholeRange> => ({ scalar: { wholeRange: [least, most] } });

/** A plain number. */
export const plainNumber = (least: number, most: number): Shape<number> => ({ scalar: { number: [least, most] } });

/** A pole or zero, or a pair of conjugates. */
export const root = (as: 'pole' | 'zero'): Shape<RootPair> => ({ scalar: { root: as } });

/** The path of a file, relative to the spec. */
export const path: Shape<string> = { scalar: { text: true, path: true } };

/** Free text. */
export const text: Shape<string> = { scalar: { text: true } };

/** A list; an item that is faulty is null in it. */
export const listOf = <T>(each: Shape<T>, atLeast = 0): Shape<readonly (T | null)[]> => ({ list: { each, atLeast } });

/** A map with known keys; `called` is what messages call it. */
export const fields = <const F extends Readonly<Record<string, Key>>>(
  called: string,
  keys: F,
  rules: Pick<Fields, 'decidedBy' | 'completedBy'> & { readonly check?: (model: Model<F>) => Clash | null } = {},
): Shape<Model<F>> => {
  const { check, ...others } = rules;
  // The decoder hands a map of these keys to the check, so the model's type holds.
  const needed = Object.entries<Key>(keys).flatMap(([name, key]) => (isNeeded(key) ? [name] : []));
  return { map: { fields: keys, called, needed, ...others, ...(check && { check: (model) => check(model as Model<F>) }) } };
};

const isNeeded = ({ required, requiredWith }: Key) => required === true || requiredWith !== undefined;

/** A map with free names. */
export const entries = <T>(called: string, each: Shape<T>): Shape<ReadonlyMap<string, T | null>> => ({ map: { each, called } });

/** Whatever one of the shapes admits. Two lists or two maps are a fault of the declaration. */
export function either<const S extends readonly Shape<unknown>[]>(...shapes: S): Shape<TypeOf<S[number]>> {
  const lists = shapes.flatMap((shape) => shape.list ?? []);
  const maps = shapes.flatMap((shape) => shape.map ?? []);
  if (lists.length > 1 || maps.length > 1) throw new RangeError('a shape holds at most one list and one map');
  const scalars = shapes.flatMap((shape) => shape.scalar ?? []);
  return {
    ...(scalars.length > 0 && { scalar: joined(scalars) }),
    ...(lists[0] && { list: lists[0] }),
    ...(maps[0] && { map: maps[0] }),
  };
}

/** A key of the language that is not computed yet. */
export const later = (about: string, only?: readonly Direction[]): Key & { readonly later: true } => ({
  shape: {},
  about,
  later: true,
  ...(only && { only }),
});

function joined(scalars: readonly Scalar[]): Scalar {
  const seen = new Set<string>();
  for (const part of scalars.flatMap((scalar) => Object.keys(scalar))) {
    if (part !== 'bounds' && seen.has(part)) throw new RangeError(`two shapes both give ${part}`);
    seen.add(part);
  }
  const bounds = Object.assign({}, ...scalars.map((scalar) => scalar.bounds ?? {})) as UnitBounds;
  return { ...(Object.assign({}, ...scalars) as Scalar), ...(Object.keys(bounds).length > 0 && { bounds }) };
}
