/** A fault found in a slice before its values are decoded: its span and cures are offsets into the text that was looked at. */
import type { LocalProblem } from '../local-problem';
import type { Mend } from '../mend';

/** A change of the text that puts a fault right. */
export interface CureText {
  readonly title: string;
  readonly mends: readonly Mend[];
}

/** One fault of the text. */
export interface Fault {
  readonly code: 'syntax' | 'text-cut-short';
  readonly start: number;
  readonly end: number;
  readonly message: string;
  readonly cures: readonly CureText[];
}

/** A `syntax` fault without a cure. */
export function fault(start: number, end: number, message: string, cures: readonly CureText[] = []): Fault {
  return { code: 'syntax', start, end, message, cures };
}

/** A fault with its offsets taken into another text. */
export function movedFault(found: Fault, move: (offset: number) => number): Fault {
  const mends = (cure: CureText): CureText => ({
    title: cure.title,
    mends: cure.mends.map(({ start, end, newText }) => ({ start: move(start), end: move(end), newText })),
  });
  return { ...found, start: move(found.start), end: move(found.end), cures: found.cures.map(mends) };
}

/** A fault as a problem of the text it was found in. */
export function problemOf({ code, start, end, message, cures }: Fault): LocalProblem {
  return {
    code,
    severity: code === 'text-cut-short' ? 'warning' : 'error',
    span: { start, end },
    message,
    cures: cures.map(({ title, mends }) => ({
      title,
      edits: mends.map((mend) => ({ span: { start: mend.start, end: mend.end }, newText: mend.newText })),
    })),
  };
}
