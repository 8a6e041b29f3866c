/** Proved maxima over bands, folds and copies: the searches and what they are asked. */
export type { Extreme, FoldExtreme, FoldQuestion } from './extreme';
export { largestOverBands } from './largest-over-bands';
export { largestOverCopies, type CopyBound, type CopyExtreme, type CopyQuestion } from './largest-over-copies';
export { largestOverFolds } from './largest-over-folds';
