/** What a spec takes from other files: names of the specs it uses, tables, and the faults of both at the paths that name them. */
import type { Names, PlacedSlice } from '../inside';
import { errorAt, writeInstead } from '../local-problem';
import type { LocalProblem } from '../local-problem';
import { scalarText } from '../scalar-text';
import type { Span } from '../place';
import type { DefinedSpace } from '../resolve/resolution';
import type { SpecTable, TableUse } from '../tables/spec-table';
import { pathFrom } from './path-from';
import type { PathUse } from './path-uses';
import type { Shelf } from './shelf';
import type { UsedSpec } from './shelved';

/** The used specs in order, with the faults of all paths; offsets count from the file's start. */
export interface Outside {
  readonly specs: readonly UsedSpec[];
  /** Whether a spec could not be read, so that a name that seems to be missing may stand in it. */
  readonly lossy: boolean;
  readonly problems: readonly LocalProblem[];
}

/** Looks at every path of a spec, and through the specs it uses. */
export function outsideOf(slices: readonly PlacedSlice[], names: Names, shelf: Shelf): Outside {
  const outside = { specs: [] as UsedSpec[], lossy: false, problems: [] as LocalProblem[] };
  for (const { slice, reading } of slices) {
    for (const use of reading.paths) {
      const span = { start: slice.start + use.span.start, end: slice.start + use.span.end };
      if (use.role !== 'use') outside.problems.push(...tableProblems({ ...use, role: use.role }, span, shelf));
      else if (!addSpec(use.written, span, outside, names, shelf)) outside.lossy = true;
    }
  }
  return outside;
}

/** A table that a spec uses; null where it could not be read. */
export function tableOf({ role, file, path }: TableUse, shelf: Shelf): SpecTable | null {
  const at = pathFrom(file ?? shelf.files.path, path);
  const found = 'path' in at ? shelf.table(role, at.path) : null;
  return found !== null && 'table' in found ? found.table : null;
}

function tableProblems(
  { role, written }: PathUse & { readonly role: TableUse['role'] },
  span: Span,
  shelf: Shelf,
): LocalProblem[] {
  const at = pathFrom(shelf.files.path, written);
  if ('fault' in at) return [pathProblem(span, at)];
  const found = shelf.table(role, at.path);
  if ('problem' in found) return [errorAt(span, found.code, found.problem)];
  if ('table' in found) return [];
  const where = found.line === null ? '' : `, line ${found.line}`;
  return [errorAt(span, 'file-not-read', `\`${written}\`${where}: ${found.fault}`)];
}

function pathProblem(span: Span, { fault, meant }: { readonly fault: string; readonly meant: string | null }): LocalProblem {
  return errorAt(span, 'file-not-read', fault, meant === null ? [] : [writeInstead(span, scalarText(meant))]);
}

function addSpec(
  written: string,
  span: Span,
  outside: { readonly specs: UsedSpec[]; readonly problems: LocalProblem[] },
  names: Names,
  shelf: Shelf,
): boolean {
  const at = pathFrom(shelf.files.path, written);
  if ('fault' in at) return outside.problems.push(pathProblem(span, at)) === 0;
  const circle = circleFrom(at.path, [shelf.files.path], shelf);
  if (circle !== null) {
    const way = circle.map((path) => `\`${path}\``).join(' → ');
    return outside.problems.push(errorAt(span, 'contradiction', `\`use\` goes round in a circle: ${way}`)) === 0;
  }
  const spec = shelf.spec(at.path);
  if ('problem' in spec) return outside.problems.push(errorAt(span, spec.code, spec.problem)) === 0;
  if (outside.specs.includes(spec)) {
    outside.problems.push(errorAt(span, 'duplicate-name', `\`${written}\` stands twice in \`use\``));
    return true;
  }
  outside.problems.push(...twins(spec, span, names, outside.specs));
  outside.specs.push(spec);
  return true;
}

/** More files than this, one using the next, are a slip. */
const longestChain = 50;

/** The way round, where a spec leads back to one on the way to it. */
function circleFrom(path: string, way: readonly string[], shelf: Shelf): readonly string[] | null {
  const back = way.indexOf(path);
  if (back >= 0) return [...way.slice(back), path];
  if (way.length > longestChain) return [...way, path];
  const spec = shelf.spec(path);
  if ('problem' in spec) return null;
  for (const { reading } of spec.slices) {
    for (const { role, written } of reading.paths) {
      const next = role === 'use' ? pathFrom(path, written) : null;
      const circle = next !== null && 'path' in next ? circleFrom(next.path, [...way, path], shelf) : null;
      if (circle !== null) return circle;
    }
  }
  return null;
}

const spaces: readonly DefinedSpace[] = ['clocks', 'filters', 'sources', 'masks'];

/** A name that two files define would leave open which is meant. */
function twins(spec: UsedSpec, span: Span, names: Names, others: readonly UsedSpec[]): LocalProblem[] {
  return spaces.flatMap((space) =>
    [...spec.names[space].keys()].flatMap((name) => {
      const other = others.find((used) => used.names[space].has(name));
      if (other === undefined && !names[space].has(name)) return [];
      const where = other === undefined ? 'this file' : `\`${other.path}\``;
      return [
        errorAt(
          span,
          'duplicate-name',
          `\`${name}\` stands in \`${space}\` of \`${spec.path}\` and of ${where}: give one of them another name`,
        ),
      ];
    }),
  );
}
