/** Proved maxima over bands and folds: the searches and what they are asked. */
export type { Extreme, FoldQuestion } from './extreme';
export { largestOverBands } from './largest-over-bands';
export { largestOverFolds } from './largest-over-folds';
