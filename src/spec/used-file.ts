/** What a spec may take from another that it uses: the names that one offers, and the channels that take each. */
import { pathFrom } from './files/path-from';
import { insideOf } from './inside';
import type { DefinedName, Reading } from './reading';

/** A name that another spec defines. */
export interface OfferedName {
  readonly space: DefinedName['space'];
  readonly name: string;
  /** The channels of this spec that use it. */
  readonly users: readonly string[];
}

const spaces = ['clocks', 'filters', 'sources', 'masks'] as const;

/** The names of a used spec by its path as it is written under `use`; null where it has not been read. */
export function namesOffered(reading: Reading, written: string): readonly OfferedName[] | null {
  const { files, shelved, names, resolved } = insideOf(reading);
  const at = pathFrom(files.path, written);
  const spec = 'path' in at ? shelved.specs.get(at.path) : undefined;
  if (spec === undefined) return null;
  return spaces.flatMap((space) =>
    [...spec.names[space].keys()].map((name) => ({
      space,
      name,
      // A name of the file's own stands before one of the same spelling elsewhere.
      users: names[space].has(name)
        ? []
        : [...resolved].flatMap(([channel, { resolution }]) =>
            resolution.uses.some((use) => use.space === space && use.name === name) ? [channel] : [],
          ),
    })),
  );
}
