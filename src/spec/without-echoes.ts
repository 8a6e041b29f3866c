/** Drops what is only the echo of a slip in the text, so that one cause gives one finding. */
import type { LocalProblem } from './local-problem';
import type { SliceTree } from './slips/slice-tree';

/** The problems of a slice's values that do not follow from its syntax faults. */
export function withoutEchoes(problems: readonly LocalProblem[], { faults, lossy, unreadFrom }: SliceTree): LocalProblem[] {
  const errors = faults.filter(({ code }) => code === 'syntax');
  return problems.filter(({ code, span }) => {
    // Where something was passed over, what is missing may have stood there.
    if (lossy && code === 'missing-key') return false;
    if (span.start >= unreadFrom) return false;
    return !errors.some((fault) => fault.start < span.end && fault.end > span.start);
  });
}
