/** Collects the faults and the looked-up names of one channel while its parts are resolved. */
import { sentence } from '../local-problem';
import { nearest } from '../nearest';
import type { Path } from '../place';
import type { ProblemCode } from '../reading';
import { scalarText } from '../scalar-text';
import type { SpecTable, TableUse } from '../tables/spec-table';
import { markOf } from '../tables/spec-table';
import type { DefinedSpace, Lookup, NameUse, ResolveProblem, Use } from './resolution';

/** A growing list of faults and uses. */
export class Report {
  readonly problems: ResolveProblem[] = [];
  private readonly used = new Map<string, Use>();
  private leansOnFaulty = false;

  /** Adds a fault of a value, with texts that could stand in its place. */
  fault(path: Path, code: ProblemCode, message: string, ...newTexts: readonly string[]): null {
    const cures = newTexts.map((newText) => ({ title: `Write it as \`${newText}\``, newText }));
    this.problems.push({ path, part: 'value', code, message: sentence(message), cures });
    return null;
  }

  /** Adds a fault of a key. */
  keyFault(path: Path, code: ProblemCode, message: string): null {
    this.problems.push({ path, part: 'key', code, message: sentence(message), cures: [] });
    return null;
  }

  /** Notes that something named is itself faulty: reported where it stands, but this channel cannot be whole. */
  leansOnFault(): null {
    this.leansOnFaulty = true;
    return null;
  }

  /** The same of something that may stand in another file, where nobody looks for it: then this channel's text says so. */
  leansOnFaultOf({ space, name }: { readonly space: DefinedSpace; readonly name: string }, path: Path, lookup: Lookup): null {
    const file = lookup.fileOf(space, name);
    if (file === null) return this.leansOnFault();
    return this.fault(path, 'file-not-read', `\`${name}\` of \`${file}\` is not whole: cure the faults of that file first`);
  }

  /** A table that the channel leans on; null where it could not be read. */
  table(use: TableUse, path: Path, lookup: Lookup): SpecTable | null {
    this.use('tables', markOf(use));
    const found = lookup.table(use);
    if (found !== null) return found;
    if (use.file === null) return this.leansOnFault();
    return this.fault(path, 'file-not-read', `\`${use.path}\`, which \`${use.file}\` names, could not be read`);
  }

  /** Notes a name that was looked up. */
  use(space: Use['space'], name: string): void {
    this.used.set(`${space} ${name}`, { space, name });
  }

  /** Adds a fault for a name that does not exist, with the nearest one that does. */
  unknownName(path: Path, use: NameUse, lookup: Lookup): null {
    const known = [...lookup.names(use.space)];
    const meant = nearest(use.name, known);
    const what = `there is no \`${use.name}\` among the \`${use.space}\` of this file`;
    if (meant === null) return this.fault(path, 'unknown-name', known.length === 0 ? `${what}, which names none` : what);
    return this.fault(path, 'unknown-name', `${what}; did you mean \`${meant}\`?`, scalarText(meant));
  }

  /** Whether nothing stands in the way of the channel. */
  get clean(): boolean {
    return this.problems.length === 0 && !this.leansOnFaulty;
  }

  /** Every name that was looked up, once. */
  get uses(): readonly Use[] {
    return [...this.used.values()];
  }
}
