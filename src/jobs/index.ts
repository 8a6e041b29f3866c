/** How long work is run: in slices beside an editor, or straight to its end. */
export { checkText, type CheckOptions } from './check-text';
export { drain } from './drain';
export { runInSlices, sliceMilliseconds } from './run-in-slices';
export type { Outcome, SliceHost } from './run-in-slices';
