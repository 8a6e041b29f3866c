/** The spec layer as the other layers see it: text in, a reading out, and ways from places to spans and edits. */
export type { Acceptance, ChannelEntry, DefinedName, Edit, Problem, ProblemCode, Reading } from './reading';
export type { Place, Path, Span } from './place';
export type { LineIndex } from './line-index';
export { lineIndexOf } from './inside';
export { read } from './read';
export { exists, spanOf } from './spans';
export { applyEdits, editValue } from './edit';
export { placeAt } from './place-at';
export type { PlaceAt } from './place-at';
export { declaration } from './declaration/top-level';
export * from './channel';
export type { Key } from './shape';
export { completionsAt } from './completion';
export type { Completion } from './completion';
export { symbolsOf } from './symbols';
export type { SpecSymbol } from './symbols';
