/** The proved largest gain over every fold, to infinity. */
import type { FoldExtreme, FoldQuestion, SearchOptions } from './extreme';

export function largestOverFolds(question: FoldQuestion, options?: SearchOptions): FoldExtreme | null {
  throw new RangeError(`not yet ${String(question.firstFold)} ${String(options?.gapDb)}`);
}
