/** What may stand at one place of a spec: at most one thing for each of YAML's three forms, so a value's form alone decides. */
import type { Kind, Unit } from '../units/quantity';

/** The directions that a channel can have. */
export type Direction = 'capture' | 'generate' | 'relay';

/** Where names are defined. */
export type NameSpace = 'channels' | 'clocks' | 'filters' | 'sources' | 'masks';

/** A word or key and what it means, for hovers, completion and the reference page. */
export type Prose = Readonly<Record<string, string>>;

/** The shape of a value whose decoded type is T; `type` never exists, it only carries T. */
export interface Shape<out T> {
  readonly scalar?: Scalar;
  readonly list?: List;
  readonly map?: Fields | Entries;
  readonly type?: T;
}

/** What a scalar may be; where several are given, the text decides. */
export interface Scalar {
  readonly words?: Prose;
  /** Words of the language that are not computed yet. */
  readonly laterWords?: Prose;
  /** Words that are refused with an explanation. */
  readonly refusedWords?: Prose;
  readonly quantity?: readonly Kind[];
  readonly range?: readonly Kind[];
  /** Whether a tolerance may stand behind the quantity. */
  readonly tolerance?: true;
  /** Whether the upper end of the range may be left out. */
  readonly endless?: true;
  /** Bounds of this key, in place of the usual ones of a unit. */
  readonly bounds?: UnitBounds;
  readonly name?: NameSpace;
  readonly whole?: readonly [number, number];
  /** Whole numbers `A .. B`. */
  readonly wholeRange?: readonly [number, number];
  /** A plain number without a unit, such as a Q. */
  readonly number?: readonly [number, number];
  /** A pole or zero as a frequency; `pole`: left of the imaginary axis. */
  readonly root?: 'pole' | 'zero';
  readonly text?: true;
  /** A text that is the path of a file. */
  readonly path?: true;
}

/** The least and the largest value, in the base unit; zero stands outside unless it is within or `zero` admits it. */
export interface Bounds {
  readonly low: number;
  readonly high: number;
  readonly zero?: true;
}

/** Bounds by unit. */
export type UnitBounds = Readonly<Partial<Record<Unit, Bounds>>>;

/** A list of alike items. */
export interface List {
  readonly each: Shape<unknown>;
  readonly atLeast: number;
}

/** A map with known keys. */
export interface Fields {
  readonly fields: Readonly<Record<string, Key>>;
  /** What messages call such a map: "a stage". */
  readonly called: string;
  /** The keys that are required, some only beside others. */
  readonly needed: readonly string[];
  /** Exactly one of these keys must stand. */
  readonly decidedBy?: readonly string[];
  /** A key that brings in whatever is missing, such as `like`. */
  readonly completedBy?: string;
  /** What its values must hold between them; given the decoded map, where what is faulty is null. */
  readonly check?: (model: Readonly<Record<string, unknown>>) => Clash | null;
}

/** Two values of one map that cannot hold together. */
export interface Clash {
  /** The key that is to blame. */
  readonly key: string;
  readonly message: string;
}

/** A map with free names: clocks, filters, channels. */
export interface Entries {
  readonly each: Shape<unknown>;
  readonly called: string;
}

/** One key of a map. */
export interface Key {
  readonly shape: Shape<unknown>;
  readonly about: string;
  readonly required?: true;
  /** What holds where the key does not stand, in words. */
  readonly fallback?: string;
  readonly only?: readonly Direction[];
  /** Keys or words of the same map, one of which must stand beside this key. */
  readonly with?: readonly string[];
  /** Keys or words beside which this key cannot stand, and is not required. */
  readonly notWith?: readonly string[];
  /** Keys or words that ask for this key. */
  readonly requiredWith?: readonly string[];
  /** In the language, but not computed yet: using it is an error that says so. */
  readonly later?: true;
}

/** A name that is defined elsewhere. */
export interface Named {
  readonly refersTo: string;
}

/** Whole numbers from … to, both included. */
export interface WholeRange {
  readonly from: number;
  readonly to: number;
}

/** The decoded type of a shape. */
export type TypeOf<S> = S extends Shape<infer T> ? T : never;

/** The decoded form of a map: a key that is absent is absent, one that stands but is faulty is null. */
export type Model<F> = {
  readonly [K in keyof F as F[K] extends { later: true } ? never : K]?:
    (F[K] extends { shape: infer S } ? TypeOf<S> : never) | null;
};
