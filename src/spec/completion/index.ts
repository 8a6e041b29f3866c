/** Completion as the façade hands it on. */
export type { Completion } from './completion';
export { completionsAt } from './completions-at';
